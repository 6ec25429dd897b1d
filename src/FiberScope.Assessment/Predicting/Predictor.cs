using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;
using FiberScope.Filtration.Drag;
using UnitsNet;

namespace FiberScope.Assessment.Predicting;

/// <summary>From layers to what a rig would show.</summary>
public static class Predictor
{
    /// <summary>Face velocities of a sweep over that of use: even in the logarithm, with that of use in the middle.</summary>
    private static readonly double[] VelocityFactors = [.. Enumerable.Range(-7, 15).Select(i => Math.Pow(5, i / 7.0))];

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

    /// <summary>The forecast of a media file with everything that it asks besides.</summary>
    /// <param name="media">The checked media file.</param>
    /// <param name="chosen">The correlations to use whatever the file says; null to leave it to the file.</param>
    /// <param name="standard">Draws and seed.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="InputException">The correlations chosen are not the calibration's.</exception>
    public static MediaPrediction Predict(MediaFile media, CorrelationSet? chosen, ForecastSettings standard, CancellationToken cancellation)
    {
        var settings = Settings(media.Request, chosen ?? media.Correlations, standard);
        return Predict(Prepared(media.Layers, media.Operation, media.Request, settings), media.Operation, media.Request, settings, cancellation);
    }

    /// <summary>The layers with what a calibration teaches and the charge that two penetrations tell.</summary>
    public static IReadOnlyList<MediaLayer> Prepared(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastRequest request, ForecastSettings settings)
    {
        var calibrated = Calibrated(layers, request);
        return request.ChargePair is { } pair ? ChargeFromPair.PutInto(calibrated, operation, pair, settings) : calibrated;
    }

    /// <summary>The layers with what the calibration teaches; as they are without one.</summary>
    public static IReadOnlyList<MediaLayer> Calibrated(IReadOnlyList<MediaLayer> layers, ForecastRequest request) =>
        request.Calibration is { } calibration ? calibration.Apply(layers) : layers;

    /// <summary>The settings with the correlations asked for, or those that the calibration holds for.</summary>
    /// <exception cref="InputException">Others were asked for than the calibration's.</exception>
    public static ForecastSettings Settings(ForecastRequest request, CorrelationSet? asked, ForecastSettings standard)
    {
        if (request.Calibration is not { } calibration)
        {
            return standard with { Correlations = asked ?? standard.Correlations };
        }

        return asked is null || asked == calibration.Correlations
            ? standard with { Correlations = calibration.Correlations }
            : throw new InputException($"The calibration of grade {calibration.Grade} holds for the correlations {Words.Of(Words.Correlations, calibration.Correlations)}; leave the choice of others out, or calibrate again with them.");
    }

    /// <summary>The forecast at the operating point with everything that is asked besides.</summary>
    /// <param name="layers">The layers, upstream first, already with what a calibration teaches.</param>
    /// <param name="operation">How the medium is used.</param>
    /// <param name="request">What is asked.</param>
    /// <param name="settings">Correlations, uncertainties and draws.</param>
    /// <param name="cancellation">Stops the work.</param>
    public static MediaPrediction Predict(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastRequest request, ForecastSettings settings, CancellationToken cancellation)
    {
        var forecast = Forecast(layers, operation, settings, cancellation);
        Caveat[] calibrated = request.Calibration is { } calibration ? [calibration.Note, .. calibration.Caveats] : [];
        forecast = forecast with { Caveats = [.. calibrated, .. ChargeFromPair.Notes(layers, operation, request, settings), .. forecast.Caveats] };

        var findings = new RequestedFindings(layers, operation, request, settings);
        cancellation.ThrowIfCancellationRequested();
        return new MediaPrediction
        {
            Forecast = forecast,
            Permeabilities = Permeabilities(layers, operation, settings),
            PressureDropLaws = PressureDropLaws.All(layers, operation),
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
                test.Particle is { } size ? forecast?.Curve.MinBy(c => Math.Abs((c.Particle - size).Meters))?.Penetration : null)
            {
                EffectiveDiameter = layers is [var only] && operation is not null && test.PressureDrop is { } drop ? FlowDiameter.Of(only, operation, test.FaceVelocity, drop) : null,
            };
        }),
    ];

    private static MediaForecast At(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, Speed velocity, ForecastSettings settings, CancellationToken cancellation) =>
        Forecast(layers, operation with { FaceVelocity = velocity }, settings, cancellation);
}
