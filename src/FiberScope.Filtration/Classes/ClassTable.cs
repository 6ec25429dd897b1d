using System.Reflection;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace FiberScope.Filtration.Classes;

/// <summary>The published classes as they stand in classes.json: limits, tests, editions and where each number is from.</summary>
internal sealed record ClassTable(IReadOnlyList<ClassTest> Tests, IReadOnlyList<ClassStandard> Standards)
{
    private static readonly JsonSerializerOptions Options = new()
    {
        PropertyNameCaseInsensitive = true,
        Converters = { new JsonStringEnumConverter() },
    };

    public static ClassTable Published { get; } = Read();

    private static ClassTable Read()
    {
        using var stream = Assembly.GetExecutingAssembly().GetManifestResourceStream("FiberScope.Filtration.Classes.classes.json")
            ?? throw new InvalidOperationException("The table of classes is not part of the program.");
        return JsonSerializer.Deserialize<ClassTable>(stream, Options) ?? throw new InvalidOperationException("The table of classes is empty.");
    }
}

/// <summary>One standard's classes, lowest first.</summary>
internal sealed record ClassStandard(string Standard, string Edition, string Provenance, string NotJudged, IReadOnlyList<MediaClass> Classes);

/// <summary>One class and all that it asks for.</summary>
internal sealed record MediaClass(string Name, IReadOnlyList<ClassLimit> Limits);

/// <summary>A limit: an efficiency that must be reached, or a pressure drop (Pa) that must not be passed.</summary>
internal sealed record ClassLimit(string Test, double? AtLeast = null, double? AtMost = null);

/// <summary>How the quantity behind a limit is found.</summary>
internal sealed record ClassTest
{
    public required string Id { get; init; }

    public required string Kind { get; init; }

    public required string Provenance { get; init; }

    public double CountMedianNanometres { get; init; }

    public double Gsd { get; init; } = 1;

    public AerosolBasis CountedBy { get; init; }

    public double Density { get; init; } = 1000;

    public double Permittivity { get; init; } = 6.1;

    public double RefractiveIndex { get; init; } = 1.5;

    public double? LitresPerMinute { get; init; }

    public double? SquareCentimetres { get; init; }

    public bool PerSquareCentimetre { get; init; }

    public bool Discharged { get; init; }

    public double LowMicrometres { get; init; }

    public double UpperMicrometres { get; init; }
}
