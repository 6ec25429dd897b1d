using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;

namespace FiberScope.Filtration.Uncertainty;

/// <summary>All layers of a medium as a fast function of the uncertain inputs.</summary>
internal sealed class MediumResponse
{
    private readonly OperatingPoint _point;
    private readonly SingleFibreModel _model;
    private readonly AirProperties _air;
    private readonly SizeTraits[] _sizes;
    private readonly LayerPassage[] _passages;
    private readonly LayerResponse[] _layers;
    private readonly double[] _nominalVelocities;

    public MediumResponse(IReadOnlyList<MediaLayer> layers, OperatingPoint point, SingleFibreModel model, double[] particleMetres)
    {
        _point = point;
        _model = model;
        _air = point.Air.Properties;
        var charged = point.Charging != ParticleCharging.Neutral && layers.Any(l => l.Charge is { CoulombsPerSquareMetre: > 0 });
        _sizes = Array.ConvertAll(particleMetres, metres =>
        {
            var particle = new Particle(UnitsNet.Length.FromMeters(metres), point.ParticleDensity, _air);
            return new SizeTraits(particle, charged ? ChargeStates.Of(particle, _air) : ChargeStates.None);
        });
        _passages = [.. layers.Select(l => new LayerPassage(l))];
        var nominal = MediumFlow.At(
            point.FaceVelocity.MetersPerSecond, [.. layers.Select(l => new EvenLayer(LayerModel.Resistance(LayerFigures.Of(l), _air, model), l.Thickness.Meters))], _passages, point.Leak, _air);
        _nominalVelocities = [.. nominal.Layers.Select(l => nominal.MetresPerSecond * (1 - l.LeakShare))];
        _layers = [.. layers.Select((l, i) => new LayerResponse(l, point, model, _passages[i].Velocities, _nominalVelocities[i], _sizes))];
    }

    public int SizeCount => _sizes.Length;

    /// <summary>Pressure drop and −ln P of one draw.</summary>
    /// <param name="draw">The inputs.</param>
    /// <param name="only">The one size wanted; null for all.</param>
    /// <param name="attenuations">Takes −ln P of each size.</param>
    /// <returns>Pressure drop, Pa.</returns>
    public double Evaluate(InputDraw draw, int? only, double[] attenuations)
    {
        var air = DrawnAir.Of(_point.Air, draw.KelvinsAbove, draw.LogPressure);
        var even = new EvenLayer[_layers.Length];
        var weights = new double[_layers.Length][];
        for (var i = 0; i < _layers.Length; i++)
        {
            var drawn = _layers[i].Drawn(draw.Layers[i]);
            even[i] = new EvenLayer(LayerModel.Resistance(drawn, air, _model), drawn.ThicknessMetres);
            weights[i] = _layers[i].NodeWeights(draw.Layers[i]);
        }

        var flow = MediumFlow.At(_point.FaceVelocity.MetersPerSecond * Math.Exp(draw.LogVelocity), even, _passages, _point.Leak, air);
        var (first, end) = only is { } one ? (one, one + 1) : (0, _sizes.Length);
        for (var size = first; size < end; size++)
        {
            attenuations[size] = Attenuation(size, draw, flow, weights);
        }

        return flow.Pascals;
    }

    private double Attenuation(int size, InputDraw draw, MediumFlow flow, double[][] weights)
    {
        Span<double> states = stackalloc double[_sizes[size].States.Nodes.Length];
        Span<double> logarithms = stackalloc double[16];
        for (var state = 0; state < states.Length; state++)
        {
            for (var i = 0; i < _layers.Length; i++)
            {
                var leak = flow.Layers[i].LeakShare;
                var logVelocity = Math.Log(flow.MetresPerSecond * (1 - leak) / _nominalVelocities[i]);
                var nodes = logarithms[.._layers[i].Velocities.Relative.Length];
                _layers[i].Logarithms(weights[i], size, state, draw, draw.Layers[i], logVelocity, nodes);
                states[state] += _passages[i].Attenuation(nodes, leak, _sizes[size].Particle.DiameterMetres);
            }
        }

        return Mixing.WithLeak(_sizes[size].States.Average(states), flow.EdgeLeakShare);
    }
}
