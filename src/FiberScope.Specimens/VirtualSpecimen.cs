using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Numbers;
using FiberScope.Specimens.Rendering;
using FiberScope.Specimens.Visibility;

namespace FiberScope.Specimens;

/// <summary>Makes virtual specimens: a mat of curved fibres laid at random, its micrograph, and the truth about it.</summary>
public static class VirtualSpecimen
{
    /// <summary>Makes a specimen.</summary>
    /// <param name="recipe">What to make.</param>
    /// <param name="seed">Any number. The same recipe and seed give the same bytes on every machine, however many processors it has.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="ArgumentException">The recipe asks for something that cannot be made; the message says what.</exception>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static Specimen Make(SpecimenRecipe recipe, ulong seed, CancellationToken cancellation = default)
    {
        Check(recipe);
        return recipe.Kind switch
        {
            SpecimenKind.SecondaryElectron => Electrons(recipe, seed, cancellation),
            SpecimenKind.Transmitted => Light(recipe, seed, cancellation),
            _ => Section(recipe, seed, cancellation),
        };
    }

    private static Specimen Electrons(SpecimenRecipe recipe, ulong seed, CancellationToken cancellation)
    {
        var mat = Lay(recipe, seed);
        var scene = ElectronPainter.Paint(mat, seed, cancellation);
        var grey = Camera.Expose(scene.Light, recipe.Camera);
        var truth = ElectronTruth.Of(mat, scene, grey, seed);
        var bytes = Finish(grey, recipe, seed);
        return new Specimen(truth.Truth, bytes, grey, truth.DefectMask, scene.TopFibre);
    }

    private static Specimen Light(SpecimenRecipe recipe, ulong seed, CancellationToken cancellation)
    {
        var mat = Lay(recipe, seed);
        var scene = LightPainter.Paint(mat, seed, cancellation);
        var truth = LightTruth.Of(mat, scene, seed);
        var bytes = Finish(scene.Light, recipe, seed);
        return new Specimen(truth, bytes, scene.Light, new byte[scene.Light.Length], scene.TopFibre);
    }

    private static Specimen Section(SpecimenRecipe recipe, ulong seed, CancellationToken cancellation)
    {
        var cut = CutMat.Lay(new MatScale(recipe), new SeededRandom(seed, 3), cancellation);
        var grey = SectionPainter.Paint(cut, seed, cancellation);
        var truth = SectionTruth.Of(cut, seed);
        var bytes = Finish(grey, recipe, seed);
        return new Specimen(truth, bytes, grey, new byte[grey.Length], []);
    }

    private static MatModel Lay(SpecimenRecipe recipe, ulong seed)
    {
        var scale = new MatScale(recipe);
        var (fibres, ropes) = new FibreLayer(scale, new SeededRandom(seed, 1)).Lay();
        var (bodies, films) = new DefectLayer(scale, fibres, new SeededRandom(seed, 2)).Lay();
        return new MatModel(scale, fibres, bodies, films, ropes);
    }

    private static byte[] Finish(float[] grey, SpecimenRecipe recipe, ulong seed)
    {
        var (width, rows) = (recipe.WidthPixels, recipe.FieldRows);
        var charged = (float[])grey.Clone();
        Camera.Charge(charged, width, rows, recipe.Camera, seed);
        var field = Camera.Detect(charged, width, rows, recipe.Camera, seed);
        var bytes = new byte[width * recipe.HeightPixels];
        field.CopyTo(bytes, 0);
        InformationStrip.Draw(bytes, recipe, seed);
        JpegArtefacts.Apply(bytes, width, recipe.HeightPixels, recipe.Camera.JpegQuality);
        return bytes;
    }

    private static void Check(SpecimenRecipe recipe)
    {
        if (recipe.Mat.Fibres.IsDefaultOrEmpty)
        {
            throw new ArgumentException("A mat needs at least one fibre population.", nameof(recipe));
        }

        Statistics.Require.Positive(recipe.PixelSize.Meters, nameof(recipe.PixelSize));
        Statistics.Require.Positive(recipe.Mat.Thickness.Meters, nameof(recipe.Mat.Thickness));
        if (recipe.FieldRows < 32)
        {
            throw new ArgumentException("The information strip leaves fewer than 32 rows for the field.", nameof(recipe));
        }

        var scale = new MatScale(recipe);
        if (scale.MeanDiameter is < 1.5 or > 2000)
        {
            throw new ArgumentException(
                FormattableString.Invariant($"The mean fibre diameter is {scale.MeanDiameter:0.##} pixels; it must be from 1.5 to 2000. Change the pixel size or the fibres."),
                nameof(recipe));
        }
    }
}
