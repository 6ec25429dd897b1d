using System.Collections.Immutable;
using System.Text.Json;
using System.Text.Json.Serialization;
using FiberScope.Fibres;
using FiberScope.Imaging;
using FiberScope.Statistics;

namespace FiberScope.Assessment.Json;

/// <summary>A measurement file, or the measurement of one layer inside an assessment file.</summary>
internal sealed record MeasurementEntry(
    string Schema,
    FieldEntry[] Fields,
    PooledEntry? Pooled,
    SolidityEntry? Solidity,
    StructureEntry Structure,
    ImmutableSortedDictionary<string, int> DefectCodes,
    ImmutableArray<Caveat> Caveats)
{
    private static readonly ImmutableSortedDictionary<string, int> Codes = Enum.GetValues<DefectKind>()
        .ToImmutableSortedDictionary(kind => kind.ToString().ToLowerInvariant(), kind => (int)kind, StringComparer.Ordinal);

    public static MeasurementEntry Of(IEnumerable<FieldFinding> fields, DiameterSurvey? survey, SolidityFinding? solidity, MatStructure structure, ImmutableArray<Caveat> caveats) => new(
        Schemas.Measurement,
        [.. fields.Select(FieldEntry.Of)],
        survey is null ? null : PooledEntry.Of(survey),
        solidity is null ? null : SolidityEntry.Of(solidity),
        StructureEntry.Of(structure),
        Codes,
        caveats);
}

/// <summary>The pooled figures of the fields that count.</summary>
internal sealed record PooledEntry(
    StatisticsEntry LengthWeighted,
    StatisticsEntry NumberWeighted,
    int Fibres,
    int Readings,
    int Fields,
    BudgetEntry[] Budget,
    ShapeEntry[] Shapes,
    bool Bimodal)
{
    public static PooledEntry Of(DiameterSurvey survey) => new(
        StatisticsEntry.Of(survey.LengthWeighted) with
        {
            MeanInterval = StatisticsEntry.Ends(survey.MeanInterval95),
            SdInterval = StatisticsEntry.Ends(survey.StandardDeviationInterval95),
            D10Interval = StatisticsEntry.Ends(survey.D10Interval95),
            D50Interval = StatisticsEntry.Ends(survey.D50Interval95),
            D90Interval = StatisticsEntry.Ends(survey.D90Interval95),
        },
        StatisticsEntry.Of(survey.NumberWeighted) with { MeanInterval = StatisticsEntry.Ends(survey.NumberMeanInterval95) },
        survey.FibreCount,
        survey.Readings.Length,
        survey.FieldCount,
        [.. survey.Budget.Parts.Select(p => new BudgetEntry(p.Name, p.StandardUncertainty.Micrometers, p.DegreesOfFreedom))],
        survey.Shapes is null ? [] : [.. survey.Shapes.Ranked.Select(ShapeEntry.Of)],
        survey.Shapes?.IsBimodal ?? false);
}

/// <summary>One part of the uncertainty of the mean; null degrees of freedom are unlimited.</summary>
internal sealed record BudgetEntry(string Name, double UUm, double DegreesOfFreedom);

/// <summary>One fitted shape, best supported first.</summary>
internal sealed record ShapeEntry(string Family, double BayesianCriterion, ShapePartEntry[] Parts)
{
    public static ShapeEntry Of(DistributionShape shape) => new(
        shape.Family == ShapeFamily.Normal ? "normal" : shape.Parts.Length == 1 ? "log-normal" : "two-log-normals",
        shape.BayesianCriterion,
        [.. shape.Parts.Select(p => shape.Family == ShapeFamily.Normal
            ? new ShapePartEntry(p.Fraction, MeanUm: p.Location * 1e6, SdUm: p.Spread * 1e6, MedianUm: null, Gsd: null)
            : new ShapePartEntry(p.Fraction, MeanUm: null, SdUm: null, MedianUm: p.Location * 1e6, Gsd: p.Spread))]);
}

/// <summary>One part of a shape: mean and SD of a normal one, median and GSD of a log-normal one.</summary>
internal sealed record ShapePartEntry(double Fraction, double? MeanUm, double? SdUm, double? MedianUm, double? Gsd);

/// <summary>A solidity with its routes.</summary>
internal sealed record SolidityEntry(double Value, double U, [property: JsonPropertyName("ci95")] double[] Interval, double AgreementProbability, SolidityRouteEntry[] Routes)
{
    public static SolidityEntry Of(SolidityFinding finding) => new(
        finding.Combined.Value.Fraction,
        finding.Combined.StandardUncertainty,
        StatisticsEntry.Ends(finding.Combined.Interval95),
        finding.AgreementProbability,
        [.. finding.Routes.Select(r => new SolidityRouteEntry(RouteWord(r.Route), r.Value.Fraction, r.StandardUncertainty, r.Explanation))]);

    private static string RouteWord(SolidityRoute route) => JsonNamingPolicy.KebabCaseLower.ConvertName(route.ToString());
}

/// <summary>A solidity by one route.</summary>
internal sealed record SolidityRouteEntry(string Route, double Value, double U, string Explanation);
