namespace FiberScope.Filtration.Correlations;

/// <summary>All layers of a medium in one state of air under one correlation set.</summary>
internal sealed class MediumModel
{
    private readonly LayerModel[] _layers;
    private readonly OperatingPoint _point;
    private readonly AirProperties _air;

    public MediumModel(IReadOnlyList<MediaLayer> layers, OperatingPoint point, SingleFibreModel model)
    {
        _point = point;
        _air = point.Air.Properties;
        _layers = [.. layers.Select(layer => new LayerModel(layer, _air, model))];
        Model = model;
    }

    public SingleFibreModel Model { get; }

    public double PascalsPerMetrePerSecond => _layers.Sum(l => l.PascalsPerMetrePerSecond);

    public double PressureDropPascals(double metresPerSecond) => PascalsPerMetrePerSecond * metresPerSecond;

    /// <summary>What each mechanism brings to −ln P of all layers at one size.</summary>
    public MechanismEfficiencies Mechanisms(double particleMetres)
    {
        var particle = new Particle(UnitsNet.Length.FromMeters(particleMetres), _point.ParticleDensity, _air);
        var sum = default(MechanismEfficiencies);
        foreach (var layer in _layers)
        {
            sum = sum.Add(layer.Attenuation(particle, _point.FaceVelocity.MetersPerSecond, _point.Direction));
        }

        return sum;
    }

    /// <summary>−ln P at one size; zero or above.</summary>
    public double Attenuation(double particleMetres) => Mechanisms(particleMetres).Total;
}
