using System.Collections.Immutable;
using FiberScope.Fibres;
using UnitsNet;

namespace FiberScope.Filtration.Tests;

/// <summary>Short ways to write a medium and an operating point in SI numbers.</summary>
internal static class Media
{
    public static MediaLayer Layer(double fibreMetres, double solidity, double thicknessMetres) => new()
    {
        Diameters = DiameterDistribution.OfOneDiameter(Length.FromMeters(fibreMetres)),
        Solidity = new Solidity(solidity),
        Thickness = Length.FromMeters(thicknessMetres),
    };

    public static OperatingPoint At(double metresPerSecond, params double[] particleMetres) => new()
    {
        FaceVelocity = Speed.FromMetersPerSecond(metresPerSecond),
        Particles = [.. particleMetres.Select(d => Length.FromMeters(d))],
    };

    public static ForecastSettings By(CorrelationSet set) => new() { Correlations = set };

    public static double MinusLogP(this MediaForecast forecast, int index = 0) => -Math.Log(forecast.Curve[index].Penetration);

    public static ImmutableArray<double> Penetrations(this MediaForecast forecast) => [.. forecast.Curve.Select(c => c.Penetration)];
}
