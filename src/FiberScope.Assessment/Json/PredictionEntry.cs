using System.Collections.Immutable;
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
    ImmutableArray<Caveat> Warnings)
{
    public static PredictionEntry Of(MediaForecast forecast) => new(
        Schemas.Prediction,
        Words.Of(Words.Correlations, forecast.Correlations),
        forecast.OperatingPoint.FaceVelocity.MetersPerSecond,
        forecast.PressureDrop.Pascals,
        forecast.PressureDropModelBandPascals is { } band ? StatisticsEntry.Ends(band) : null,
        forecast.MostPenetratingSize?.Micrometers,
        forecast.PenetrationAtMostPenetratingSize,
        forecast.QualityFactorPerPascal,
        [.. forecast.Curve.Select(CurveEntry.Of)],
        forecast.Caveats);
}

/// <summary>One particle size: the band is the spread between the published correlations.</summary>
internal sealed record CurveEntry(double ParticleUm, double Penetration, double[] Band, double[]? MeasurementBand, IReadOnlyDictionary<string, double> ByMechanism)
{
    public static CurveEntry Of(CurvePoint point) => new(
        point.Particle.Micrometers,
        point.Penetration,
        StatisticsEntry.Ends(point.ModelBand),
        point.MeasurementBand is { } band ? StatisticsEntry.Ends(band) : null,
        point.ByMechanism);
}
