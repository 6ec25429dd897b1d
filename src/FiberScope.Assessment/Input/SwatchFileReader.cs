using System.Collections.Immutable;
using FiberScope.Conformity;
using FiberScope.Filtration;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Turns the text of a swatch file into a <see cref="SwatchFile"/>, gathering every problem on the way.</summary>
internal static class SwatchFileReader
{
    public static SwatchFile Read(InputText file, string folder)
    {
        var map = new MapReader(file, file.Root);
        var identity = Identity(map, file.Name);
        var operation = OperatingReader.Read(map);
        var request = RequestReader.Read(map);
        if (!map.Has("face_velocity") && !map.Has("flow"))
        {
            foreach (var key in RequestReader.Keys.Where(map.Has))
            {
                map.Complain(key, "asks for a forecast, which needs 'face_velocity'; add it or delete this line");
            }
        }

        var correlations = map.Choice("correlations", Words.Correlations);
        var layers = Layers(map, map.Has("face_velocity") || map.Has("flow"));
        var tests = RigTests(map, operation);
        var hashes = ImmutableSortedDictionary.CreateBuilder<string, string>(StringComparer.Ordinal);
        hashes[file.Name] = file.Sha256;
        var (grade, ofGrade) = ReadGrade(map, folder, hashes, correlations);
        var calibration = CalibrationKey.Read(map, folder, correlations) ?? ofGrade;
        if (calibration is not null)
        {
            hashes[calibration.Name] = calibration.Sha256;
        }

        map.RejectUnknownKeys();
        file.ThrowIfProblems();
        return new SwatchFile
        {
            Name = file.Name,
            Folder = folder,
            Identity = identity,
            Layers = layers,
            Operation = operation,
            Request = request with { Calibration = calibration?.Calibration },
            Correlations = correlations,
            RigTests = tests,
            Grade = grade,
            Entries = [.. Entries(file.Root, "")],
            FileHashes = hashes.ToImmutable(),
        };
    }

    /// <summary>The grade that the file names; its own problems join those of the swatch file.</summary>
    private static (Grade? Grade, CalibrationKey? Calibration) ReadGrade(MapReader map, string folder, ImmutableSortedDictionary<string, string>.Builder hashes, CorrelationSet? correlations)
    {
        if (map.Text("grade") is not { } path)
        {
            return (null, null);
        }

        try
        {
            var text = InputText.FromFile(Path.Combine(folder, path), Path.Combine(Path.GetDirectoryName(map.File.Name) ?? "", path));
            hashes[path] = text.Sha256;
            return GradeReader.Read(text, Path.GetDirectoryName(Path.Combine(folder, path))!, correlations);
        }
        catch (InputException e)
        {
            map.File.Report(e.Problems);
            return (null, null);
        }
    }

    private static SwatchIdentity Identity(MapReader map, string file)
    {
        var position = map.Map("position");
        var identity = new SwatchIdentity
        {
            Material = map.Text("material") ?? "",
            Lot = map.Text("lot") ?? "",
            Roll = map.Text("roll") ?? "",
            Swatch = map.Text("swatch") ?? "",
            MachineDirectionPosition = position?.Text("md") ?? "",
            CrossDirectionPosition = position?.Text("cd") ?? "",
            Note = map.Text("note") ?? "",
            Title = "",
        };
        position?.RejectUnknownKeys();
        var parts = new[]
        {
            identity.Material,
            identity.Lot.Length > 0 ? "lot " + identity.Lot : "",
            identity.Roll.Length > 0 ? "roll " + identity.Roll : "",
            identity.Swatch.Length > 0 ? "swatch " + identity.Swatch : "",
        };
        var title = string.Join(", ", parts.Where(p => p.Length > 0));
        return identity with { Title = title.Length > 0 ? title : Path.GetFileNameWithoutExtension(file) };
    }

    private static ImmutableArray<SwatchLayer> Layers(MapReader map, bool forForecast)
    {
        if (!map.Has("layers"))
        {
            return [LayerReader.Read(map, "", forForecast)];
        }

        foreach (var key in LayerReader.Keys.Where(map.Has))
        {
            map.Complain(key, "belongs into each layer when there are 'layers'");
        }

        var items = map.Items("layers");
        if (items.Count == 0)
        {
            map.Complain("layers", "is empty; list at least one layer");
        }

        return [.. items.Select((item, i) => Layer(map, item, i, forForecast)).OfType<SwatchLayer>()];
    }

    private static SwatchLayer? Layer(MapReader map, YamlNode item, int index, bool forForecast)
    {
        if (map.AsMap(item, "layers") is not { } inner)
        {
            return null;
        }

        var name = inner.Text("name") ?? FormattableString.Invariant($"layer {index + 1}");
        var layer = LayerReader.Read(inner, name, forForecast);
        inner.RejectUnknownKeys();
        return layer;
    }

    private static ImmutableArray<RigTest> RigTests(MapReader map, OperatingPoint? operation)
    {
        var tests = ImmutableArray.CreateBuilder<RigTest>();
        foreach (var item in map.Items("measured"))
        {
            if (map.AsMap(item, "measured") is { } inner && RigTest(inner, operation) is { } test)
            {
                tests.Add(test);
            }
        }

        return tests.ToImmutable();
    }

    private static RigTest? RigTest(MapReader map, OperatingPoint? operation)
    {
        var velocity = map.Positive("face_velocity", Kinds.Speed)?.Value ?? operation?.FaceVelocity;
        var pressureDrop = map.Positive("pressure_drop", Kinds.Pressure)?.Value;
        var particle = map.Positive("particle", Kinds.Length)?.Value;
        var penetration = map.Within("penetration", 0, 1);
        map.RejectUnknownKeys();
        if (map.Has("particle") != map.Has("penetration"))
        {
            map.Complain(map.Has("particle") ? "particle" : "penetration", "particle and penetration go together, such as {particle: 0.3 um, penetration: 12 %}");
        }
        else if (!map.Has("pressure_drop") && !map.Has("penetration"))
        {
            map.File.Report(map.Line, "measured: give pressure_drop, or particle with penetration");
        }

        if (velocity is null && !map.Has("face_velocity"))
        {
            map.File.Report(map.Line, "measured: needs face_velocity, here or at the top of the file");
        }

        return velocity is null ? null : new RigTest(velocity.Value, pressureDrop, particle, penetration);
    }

    private static IEnumerable<RecipeEntry> Entries(YamlNode node, string path) => node switch
    {
        YamlMappingNode map => map.Children.SelectMany(pair => Entries(pair.Value, path.Length == 0 ? pair.Key.ToString() : $"{path}.{pair.Key}")),
        YamlSequenceNode list => list.Children.SelectMany((item, i) => Entries(item, FormattableString.Invariant($"{path}[{i + 1}]"))),
        YamlScalarNode scalar => [new RecipeEntry(path, scalar.Value ?? "", FormattableString.Invariant($"line {scalar.Start.Line}"))],
        _ => [],
    };
}
