using System.Collections.Immutable;
using System.Text.Json.Serialization;
using FiberScope.Assessment.Auditing;

namespace FiberScope.Assessment.Json;

/// <summary>How the machine agrees with a person's eye.</summary>
internal sealed record AuditEntry(
    string Schema,
    string Software,
    string Source,
    string SourceSha256,
    int Seed,
    string Sentence,
    int Pairs,
    ImmutableArray<string> Unfilled,
    AgreementEntry Difference,
    RelativeAgreementEntry Relative,
    LineEntry Deming,
    AuditPairEntry[] Crops)
{
    public static AuditEntry Of(AuditFinding f) => new(
        Schemas.Audit,
        Assessment.Software.Version,
        f.Key.Source,
        f.Key.SourceSha256,
        f.Key.Seed,
        f.Sentence,
        f.Pairs.Length,
        f.Unfilled,
        new AgreementEntry(
            f.Micrometres.Bias,
            StatisticsEntry.Ends(f.Micrometres.BiasInterval95),
            f.Micrometres.StandardDeviation,
            [f.Micrometres.LowerLimit, f.Micrometres.UpperLimit],
            f.Micrometres.LimitStandardError),
        new RelativeAgreementEntry(f.RelativeBias.Value, StatisticsEntry.Ends(f.RelativeBias.Interval95), StatisticsEntry.Ends(f.RelativeLimits)),
        new LineEntry(f.Line.Slope, StatisticsEntry.Ends(f.Line.SlopeInterval95), f.Line.Intercept, StatisticsEntry.Ends(f.Line.InterceptInterval95)),
        [.. f.Pairs.Select(AuditPairEntry.Of)]);
}

/// <summary>Machine minus person; Bland and Altman (1986).</summary>
internal sealed record AgreementEntry(
    double BiasUm,
    [property: JsonPropertyName("bias_ci95_um")] double[] BiasInterval,
    double SdUm,
    double[] LimitsUm,
    double LimitUUm);

/// <summary>Machine over person − 1, worked out on logarithms.</summary>
internal sealed record RelativeAgreementEntry(double Bias, [property: JsonPropertyName("bias_ci95")] double[] BiasInterval, double[] Limits);

/// <summary>The machine against the person with errors in both alike.</summary>
internal sealed record LineEntry(
    double Slope,
    [property: JsonPropertyName("slope_ci95")] double[] SlopeInterval,
    double InterceptUm,
    [property: JsonPropertyName("intercept_ci95_um")] double[] InterceptInterval);

/// <summary>One crop, read by both.</summary>
internal sealed record AuditPairEntry(string Crop, string Layer, string Image, double XPx, double YPx, double MachineUm, double MachineUUm, double PersonUm)
{
    public static AuditPairEntry Of(AuditPair p)
    {
        var r = p.Crop.Reading;
        return new(p.Crop.Name, r.Layer, r.Image, r.X, r.Y, p.MachineMicrometres, r.StandardUncertainty.Micrometers, p.PersonMicrometres);
    }
}
