using FiberScope.Statistics;

namespace FiberScope.Filtration;

/// <summary>What a medium lets through of an aerosol, summed as the instrument sums it.</summary>
/// <param name="Penetration">By the central set; dimensionless, 0 to 1.</param>
/// <param name="ModelBand">Lowest and highest by the published sets.</param>
/// <param name="MeasurementBand">95 % interval from the uncertain inputs; null when none were given.</param>
public sealed record ChallengeResult(double Penetration, Interval ModelBand, Interval? MeasurementBand)
{
    /// <summary>Averages a curve over shares of its sizes; bands are averaged as if all sizes moved together.</summary>
    internal static ChallengeResult Over(MediaForecast forecast, IReadOnlyList<double> shares)
    {
        double Sum(Func<CurvePoint, double> value) => Math.Clamp(forecast.Curve.Zip(shares, (c, s) => s * value(c)).Sum(), 0, 1);
        var measured = forecast.Curve.All(c => c.MeasurementBand is not null)
            ? new Interval(Sum(c => c.MeasurementBand!.Value.Low), Sum(c => c.MeasurementBand!.Value.High))
            : (Interval?)null;
        return new ChallengeResult(Sum(c => c.Penetration), new Interval(Sum(c => c.ModelBand.Low), Sum(c => c.ModelBand.High)), measured);
    }
}
