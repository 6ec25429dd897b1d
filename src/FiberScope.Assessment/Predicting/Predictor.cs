using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Predicting;

/// <summary>From layers to what a rig would show.</summary>
public static class Predictor
{
    private static readonly double[] VelocityFactors = [0.2, 0.35, 0.5, 0.7, 1, 1.4, 2, 3, 5];
    private static readonly double[] PermeabilityTests = [125, 200];

    /// <summary>The forecast at the operating point.</summary>
    /// <param name="layers">The layers, upstream first.</param>
    /// <param name="operation">How the medium is used.</param>
    /// <param name="settings">Correlations, uncertainties and draws.</param>
    /// <param name="cancellation">Stops the work.</param>
    public static MediaForecast Forecast(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastSettings settings, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        return MediaModel.Forecast(layers, operation, settings);
    }

    /// <summary>The forecast at the operating point with everything that is asked besides.</summary>
    /// <param name="layers">The layers, upstream first.</param>
    /// <param name="operation">How the medium is used.</param>
    /// <param name="request">What is asked.</param>
    /// <param name="settings">Correlations, uncertainties and draws.</param>
    /// <param name="cancellation">Stops the work.</param>
    public static MediaPrediction Predict(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastRequest request, ForecastSettings settings, CancellationToken cancellation)
    {
        var forecast = Forecast(layers, operation, settings, cancellation);
        var findings = new RequestedFindings(layers, operation, request, settings);
        cancellation.ThrowIfCancellationRequested();
        return new MediaPrediction
        {
            Forecast = forecast,
            Permeabilities = Permeabilities(layers, operation, settings),
            Classes = findings.Classes(),
            Challenges = findings.Challenges(),
            Bands = findings.Bands(),
            TotalInwardLeakage = findings.TotalInward(forecast.PenetrationAtMostPenetratingSize),
        };
    }

    /// <summary>The forecast over face velocity, from a fifth to five times the operating point's.</summary>
    public static ImmutableArray<VelocityPoint> Sweep(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastSettings settings, CancellationToken cancellation) =>
    [
        .. VelocityFactors.Select(factor => At(layers, operation, operation.FaceVelocity * factor, settings, cancellation))
            .Select(f => new VelocityPoint(f.OperatingPoint.FaceVelocity, f.PressureDrop, f.MostPenetratingSize, f.PenetrationAtMostPenetratingSize, f.QualityFactorPerPascal)),
    ];

    /// <summary>Air permeability at the pressure drops of the usual textile tests, 125 Pa and 200 Pa.</summary>
    /// <remarks>ISO 9237:1995 names 100 Pa and 200 Pa, ASTM D737 125 Pa (from memory).</remarks>
    public static ImmutableArray<AirPermeability> Permeabilities(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastSettings settings) =>
        [.. PermeabilityTests.Select(p => Pressure.FromPascals(p)).Select(p => new AirPermeability(p, MediaModel.AirPermeability(layers, operation, p, settings)))];

    /// <summary>Rig results beside the forecast for the same conditions.</summary>
    public static ImmutableArray<RigPoint> Compare(IEnumerable<RigTest> tests, IReadOnlyList<MediaLayer>? layers, OperatingPoint? operation, ForecastSettings settings, CancellationToken cancellation) =>
    [
        .. tests.Select(test =>
        {
            var forecast = layers is null || operation is null
                ? null
                : At(layers, operation with { Particles = test.Particle is { } p ? [p] : [] }, test.FaceVelocity, settings, cancellation);
            return new RigPoint(
                test.FaceVelocity,
                test.PressureDrop,
                test.Particle,
                test.Penetration,
                test.PressureDrop is null ? null : forecast?.PressureDrop,
                test.Particle is { } size ? forecast?.Curve.MinBy(c => Math.Abs((c.Particle - size).Meters))?.Penetration : null);
        }),
    ];

    private static MediaForecast At(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, Speed velocity, ForecastSettings settings, CancellationToken cancellation) =>
        Forecast(layers, operation with { FaceVelocity = velocity }, settings, cancellation);
}
