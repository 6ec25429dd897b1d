using System.Collections.Immutable;
using System.Text.Json.Serialization;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Json;

/// <summary>A prediction file, or the prediction inside an assessment file.</summary>
internal sealed record PredictionEntry(
    string Schema,
    string Correlations,
    double FaceVelocityMPerS,
    double PressureDropPa,
    double[]? PressureDropBandPa,
    double? MppsUm,
    double PenetrationAtMpps,
    double QualityFactorPerPa,
    CurveEntry[] Curve,
    MeasurementBandsEntry? MeasurementBands,
    PermeabilityEntry[] AirPermeability,
    IReadOnlyDictionary<string, double> PressureDropByLawPa,
    ChallengeEntry[] Challenges,
    SizeBandEntry[] SizeBands,
    LeakageEntry Leakage,
    ClassEntry[] Classes,
    string ClassCaution,
    ImmutableArray<Caveat> Warnings)
{
    public static PredictionEntry Of(MediaPrediction prediction)
    {
        var forecast = prediction.Forecast;
        return new(
            Schemas.Prediction,
            Words.Of(Words.Correlations, forecast.Correlations),
            forecast.OperatingPoint.FaceVelocity.MetersPerSecond,
            forecast.PressureDrop.Pascals,
            StatisticsEntry.EndsOf(forecast.PressureDropModelBandPascals),
            forecast.MostPenetratingSize?.Micrometers,
            forecast.PenetrationAtMostPenetratingSize,
            forecast.QualityFactorPerPascal,
            [.. forecast.Curve.Select(CurveEntry.Of)],
            forecast.Uncertainty is { } open ? MeasurementBandsEntry.Of(open) : null,
            [.. prediction.Permeabilities.Select(PermeabilityEntry.Of)],
            prediction.PressureDropLaws.ToImmutableSortedDictionary(l => l.Key, l => l.Value.Pascals, StringComparer.Ordinal),
            [.. prediction.Challenges.Select(ChallengeEntry.Of)],
            [.. prediction.Bands.Select(SizeBandEntry.Of)],
            LeakageEntry.Of(prediction),
            [.. prediction.Classes.Select(ClassEntry.Of)],
            ClassForecast.Caution,
            forecast.Caveats);
    }
}

/// <summary>One particle size: the band is the spread between the published correlations.</summary>
internal sealed record CurveEntry(double ParticleUm, double Penetration, double[] Band, double[]? MeasurementBand, IReadOnlyDictionary<string, double> ByMechanism)
{
    public static CurveEntry Of(CurvePoint point) => new(
        point.Particle.Micrometers,
        point.Penetration,
        StatisticsEntry.Ends(point.ModelBand),
        StatisticsEntry.EndsOf(point.MeasurementBand),
        point.ByMechanism);
}

/// <summary>What the uncertain inputs leave open, and which of them costs most.</summary>
internal sealed record MeasurementBandsEntry(
    int Draws,
    int Seed,
    [property: JsonPropertyName("pressure_drop_ci95_pa")] double[] PressureDrop,
    [property: JsonPropertyName("mpps_ci95_um")] double[]? MostPenetratingSize,
    [property: JsonPropertyName("penetration_at_mpps_ci95")] double[] Penetration,
    [property: JsonPropertyName("quality_factor_ci95_per_pa")] double[] QualityFactor,
    InputShareEntry[] Ranking)
{
    public static MeasurementBandsEntry Of(MeasurementUncertainty open) => new(
        open.Draws,
        open.Seed,
        StatisticsEntry.Ends(open.PressureDropPascals),
        open.MostPenetratingSize is { } size ? StatisticsEntry.Ends(size) : null,
        StatisticsEntry.Ends(open.PenetrationAtMostPenetratingSize),
        StatisticsEntry.Ends(open.QualityFactorPerPascal),
        [.. open.Ranking.Select(InputShareEntry.Of)]);
}

/// <summary>One uncertain input and its share of the variance.</summary>
internal sealed record InputShareEntry(string Input, int? Layer, double PenetrationShare, double PressureDropShare, double LogPenetrationDeviation, double PressureDropDeviation)
{
    public static InputShareEntry Of(InputContribution c) =>
        new(c.Input, c.Layer, c.PenetrationShare, c.PressureDropShare, c.LogPenetrationDeviation, c.PressureDropDeviation);
}

/// <summary>What passes of an aerosol.</summary>
internal sealed record ChallengeEntry(
    string Name,
    double CountMedianUm,
    double Gsd,
    string By,
    bool Discharged,
    double FaceVelocityMPerS,
    double Penetration,
    double[] Band,
    double[]? MeasurementBand,
    double? TotalInwardLeakage)
{
    public static ChallengeEntry Of(ChallengeFinding c) => new(
        c.Name,
        c.Aerosol.CountMedian.Micrometers,
        c.Aerosol.GeometricStandardDeviation,
        Words.Of(Words.AerosolBases, c.Aerosol.CountedBy),
        c.Discharged,
        c.FaceVelocity.MetersPerSecond,
        c.Result.Penetration,
        StatisticsEntry.Ends(c.Result.ModelBand),
        StatisticsEntry.EndsOf(c.Result.MeasurementBand),
        c.TotalInwardLeakage);
}

/// <summary>What passes in a band of particle size.</summary>
internal sealed record SizeBandEntry(double FromUm, double ToUm, double Penetration, double[] Band, double[]? MeasurementBand)
{
    public static SizeBandEntry Of(BandFinding b) => new(
        b.From.Micrometers,
        b.To.Micrometers,
        b.Result.Penetration,
        StatisticsEntry.Ends(b.Result.ModelBand),
        StatisticsEntry.EndsOf(b.Result.MeasurementBand));
}

/// <summary>What goes past the medium, and what that does.</summary>
internal sealed record LeakageEntry(double HalvingShare, double EdgeShare, ImmutableArray<double> HoleShares, double? TotalInwardLeakage)
{
    public static LeakageEntry Of(MediaPrediction p) => new(
        p.Forecast.LeakShareThatHalvesProtection,
        p.Forecast.EdgeLeakShare,
        p.Forecast.HoleShares.IsDefault ? [] : p.Forecast.HoleShares,
        p.TotalInwardLeakage);
}

/// <summary>The class of one standard that the forecast points to.</summary>
internal sealed record ClassEntry(string Standard, string Edition, string Provenance, string? Class, double Probability, ClassChanceEntry[] All, string NotJudged)
{
    public static ClassEntry Of(ClassForecast c) => new(
        c.Standard,
        c.Edition,
        c.Provenance,
        c.Class,
        c.Probability,
        [.. c.All.Select(a => new ClassChanceEntry(a.Name, a.Probability, a.Kept))],
        c.NotJudged);
}

/// <summary>One class and the probability that its judged limits are kept.</summary>
internal sealed record ClassChanceEntry(string Class, double Probability, bool Kept);
