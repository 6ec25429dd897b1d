using System.Text.Json.Serialization;
using FiberScope.Fibres;
using FiberScope.Statistics;

namespace FiberScope.Assessment.Json;

/// <summary>The figures of a distribution, in micrometres.</summary>
internal sealed record StatisticsEntry(
    double MeanUm,
    double SdUm,
    double Cv,
    double GeometricMeanUm,
    double Gsd,
    [property: JsonPropertyName("d10_um")] double D10,
    [property: JsonPropertyName("d50_um")] double D50,
    [property: JsonPropertyName("d90_um")] double D90)
{
    [JsonPropertyName("mean_ci95_um")]
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double[]? MeanInterval { get; init; }

    [JsonPropertyName("sd_ci95_um")]
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double[]? SdInterval { get; init; }

    [JsonPropertyName("d10_ci95_um")]
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double[]? D10Interval { get; init; }

    [JsonPropertyName("d50_ci95_um")]
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double[]? D50Interval { get; init; }

    [JsonPropertyName("d90_ci95_um")]
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double[]? D90Interval { get; init; }

    public static StatisticsEntry Of(DiameterStatistics s) => new(
        s.Mean.Micrometers,
        s.StandardDeviation.Micrometers,
        s.CoefficientOfVariation,
        s.GeometricMean.Micrometers,
        s.GeometricStandardDeviation,
        s.D10.Micrometers,
        s.D50.Micrometers,
        s.D90.Micrometers);

    public static double[] Ends(LengthInterval interval) => [interval.Low.Micrometers, interval.High.Micrometers];

    public static double[]? EndsOf(Interval? interval) => interval is { } known ? Ends(known) : null;

    public static double[] Ends(Interval interval) => [interval.Low, interval.High];
}
