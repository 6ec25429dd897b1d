using FiberScope.Filtration.Correlations;

namespace FiberScope.Filtration.Passage;

/// <summary>All layers of a medium in one state of air under one correlation set.</summary>
internal sealed class MediumModel
{
    private readonly LayerModel[] _layers;
    private readonly LayerPassage[] _passages;
    private readonly OperatingPoint _point;
    private readonly AirProperties _air;
    private readonly bool _charged;
    private readonly MediumFlow _flow;

    public MediumModel(IReadOnlyList<MediaLayer> layers, OperatingPoint point, SingleFibreModel model)
    {
        _point = point;
        _air = point.Air.Properties;
        _layers = [.. layers.Select(layer => new LayerModel(LayerFigures.Of(layer), _air, point, model))];
        _passages = [.. layers.Select(layer => new LayerPassage(layer))];
        _charged = point.Charging != ParticleCharging.Neutral && _layers.Any(l => l.IsCharged);
        Model = model;
        _flow = FlowAt(point.FaceVelocity.MetersPerSecond);
    }

    public SingleFibreModel Model { get; }

    /// <summary>Pressure drop at the operating point's velocity.</summary>
    public double Pascals => _flow.Pascals;

    /// <summary>Share of the air that goes past the medium.</summary>
    public double EdgeLeakShare => _flow.EdgeLeakShare;

    /// <summary>Share of each layer's air that goes through its holes.</summary>
    public IEnumerable<double> HoleShares => _flow.Layers.Select(l => l.LeakShare);

    /// <summary>Flow through all layers, and past them, at a face velocity.</summary>
    public MediumFlow FlowAt(double metresPerSecond) =>
        MediumFlow.At(metresPerSecond, Array.ConvertAll(_layers, l => l.Even), _passages, _point.Leak, _air);

    /// <summary>What each mechanism brings to −ln P at one size: of even layers, at the mean velocity, over the charges' mean.</summary>
    public MechanismEfficiencies Mechanisms(double particleMetres)
    {
        var particle = InAir(particleMetres);
        var sum = default(MechanismEfficiencies);
        var shares = _charged ? EquilibriumCharge.Shares(particle.Diameter, _air.Temperature) : [1];
        var mean = shares.Select((s, n) => s * n).Sum();
        for (var i = 0; i < _layers.Length; i++)
        {
            sum = sum.Add(_layers[i].Mechanisms(particle, MatVelocity(i), mean));
            sum = sum with { Straining = sum.Straining + _passages[i].Strained(particleMetres) };
        }

        return sum;
    }

    /// <summary>−ln P at one size, of all streams together; zero or above.</summary>
    public double Attenuation(double particleMetres)
    {
        var particle = InAir(particleMetres);
        var states = _charged ? ChargeStates.Of(particle, _air) : ChargeStates.None;
        Span<double> attenuations = stackalloc double[states.Nodes.Length];
        Span<double> logarithms = stackalloc double[16];
        for (var state = 0; state < attenuations.Length; state++)
        {
            for (var i = 0; i < _layers.Length; i++)
            {
                var nodes = _passages[i].Velocities.Relative;
                for (var n = 0; n < nodes.Length; n++)
                {
                    logarithms[n] = Math.Log(Math.Max(1e-300, _layers[i].Attenuation(particle, MatVelocity(i) * nodes[n], states.Nodes[state])));
                }

                attenuations[state] += _passages[i].Attenuation(logarithms[..nodes.Length], _flow.Layers[i].LeakShare, particleMetres);
            }
        }

        return Mixing.WithLeak(states.Average(attenuations), _flow.EdgeLeakShare);
    }

    private double MatVelocity(int layer) => _flow.MetresPerSecond * (1 - _flow.Layers[layer].LeakShare);

    private Particle InAir(double metres) => new(UnitsNet.Length.FromMeters(metres), _point.ParticleDensity, _air);
}
