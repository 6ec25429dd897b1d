using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Predicting;

/// <summary>The forecast of one swatch and everything that is asked of it besides.</summary>
internal sealed class SwatchPrediction(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastRequest request, ForecastSettings settings, CancellationToken cancellation)
{
    /// <summary>For figures that are shown without a band of the inputs: nothing is drawn.</summary>
    private readonly ForecastSettings _central = settings with { Draws = 0 };

    public MediaPrediction Prediction { get; } = Predictor.Predict(layers, operation, request, settings, cancellation);

    public MediaForecast Forecast => Prediction.Forecast;

    public ImmutableArray<VelocityPoint> Sweep() => Predictor.Sweep(layers, operation, _central, cancellation);

    public ImmutableArray<RigPoint> Compare(IEnumerable<RigTest> tests) => Predictor.Compare(tests, layers, operation, _central, cancellation);

    /// <summary>What the rig's pressure drop says about the diameters in the pictures; a swatch of several layers tells nothing.</summary>
    public ImmutableArray<Caveat> FlowCaveats(IEnumerable<RigPoint> rig) => layers is [var only] ? FlowDiameter.Compare(only, rig) : [];

    public ForecastFindings Findings() => new(Forecast, At, pressure => MediaModel.AirPermeability(layers, operation, pressure, _central));

    private CurvePoint At(Length particle) =>
        Predictor.Forecast(layers, operation with { Particles = [particle] }, settings, cancellation).Curve[0];
}
