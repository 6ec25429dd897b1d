using System.Runtime.InteropServices;
using System.Security.Cryptography;
using System.Text;
using FiberScope.Specimens;
using FiberScope.Specimens.Files;

namespace FiberScope.Validation.Imaging;

/// <summary>A specimen's picture and truth, kept on disk between runs: making one takes longer than many a measurement.</summary>
internal sealed class SpecimenCase
{
    private readonly byte[] _pixels, _defects;

    private SpecimenCase(SpecimenTruth truth, byte[] pixels, byte[] defects) => (Truth, _pixels, _defects) = (truth, pixels, defects);

    public SpecimenTruth Truth { get; }

    public SpecimenRecipe Recipe => Truth.Recipe;

    public int Width => Recipe.WidthPixels;

    public int Height => Recipe.HeightPixels;

    public ReadOnlySpan<byte> Pixels => _pixels;

    public ReadOnlySpan<byte> DefectMask => _defects;

    /// <summary>The specimen of a recipe and seed, from disk when it is there.</summary>
    public static SpecimenCase Of(SpecimenRecipe recipe, ulong seed)
    {
        var folder = Repository.Locate(".artifacts", "validation-imaging", "specimens");
        var path = Path.Combine(folder, FormattableString.Invariant($"{recipe.Name}-{seed}-{Key(recipe, seed)}.v2.bin"));
        if (File.Exists(path))
        {
            using var kept = new BinaryReader(File.OpenRead(path));
            return Read(kept, recipe, seed);
        }

        var specimen = VirtualSpecimen.Make(recipe, seed);
        var made = new SpecimenCase(specimen.Truth, specimen.Pixels.ToArray(), specimen.DefectMask.ToArray());
        Directory.CreateDirectory(folder);
        var draft = path + FormattableString.Invariant($".{Environment.ProcessId}");
        using (var file = new BinaryWriter(File.Create(draft)))
        {
            made.Write(file);
        }

        File.Move(draft, path, overwrite: true);
        return made;
    }

    // A thumbnail of the same recipe and seed is part of the key, so that a change of the renderer makes new pictures.
    private static string Key(SpecimenRecipe recipe, ulong seed)
    {
        var thumbnail = VirtualSpecimen.Make(recipe with { WidthPixels = 96, HeightPixels = 96, Strip = null }, seed);
        var hash = SHA256.HashData([.. Encoding.UTF8.GetBytes(RecipeFile.Write(recipe)), .. thumbnail.Pixels, .. MemoryMarshal.AsBytes(thumbnail.Truth.Stations.AsSpan())]);
        return Convert.ToHexStringLower(hash)[..16];
    }

    private void Write(BinaryWriter file)
    {
        Put<byte>(file, _pixels);
        Put<byte>(file, _defects);
        Put(file, Truth.Stations.AsSpan());
        Put(file, Truth.Sections.AsSpan());
        file.Write(Truth.Solidity);
        file.Write(Truth.LaidSolidity);
        file.Write(Truth.Cover);
        file.Write(Truth.Defects.Length);
        foreach (var defect in Truth.Defects)
        {
            file.Write((int)defect.Kind);
            file.Write(defect.AreaPixels);
            Put(file, defect.Outline.AsSpan());
        }
    }

    private static SpecimenCase Read(BinaryReader file, SpecimenRecipe recipe, ulong seed)
    {
        var (pixels, mask) = (Take<byte>(file), Take<byte>(file));
        var (stations, sections) = (Take<TrueStation>(file), Take<TrueSection>(file));
        var (solidity, laid, cover) = (file.ReadDouble(), file.ReadDouble(), file.ReadDouble());
        var defects = new TrueDefect[file.ReadInt32()];
        for (var i = 0; i < defects.Length; i++)
        {
            defects[i] = new TrueDefect((DefectForm)file.ReadInt32(), file.ReadDouble(), [.. Take<(double, double)>(file)]);
        }

        var none = TrueDiameters.Of([], []);
        var turned = TrueOrientation.Of(stations.Select(s => ((double)s.Direction, (double)s.Length)));
        var truth = new SpecimenTruth
        {
            Recipe = recipe,
            Seed = seed,
            FibreDiameters = [],
            Stations = [.. stations],
            Sections = [.. sections],
            Visible = none,
            BothEdges = none,
            Mat = none,
            Orientation = turned,
            MatOrientation = turned,
            Solidity = solidity,
            LaidSolidity = laid,
            Cover = cover,
            Defects = [.. defects],
            VisibleDepth = UnitsNet.Length.Zero,
        };
        return new SpecimenCase(truth, pixels, mask);
    }

    private static void Put<T>(BinaryWriter file, ReadOnlySpan<T> values)
        where T : struct
    {
        file.Write(values.Length);
        file.Write(MemoryMarshal.AsBytes(values));
    }

    private static T[] Take<T>(BinaryReader file)
        where T : struct
    {
        var values = new T[file.ReadInt32()];
        file.BaseStream.ReadExactly(MemoryMarshal.AsBytes(values.AsSpan()));
        return values;
    }
}
