using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Mechanisms;

namespace FiberScope.Filtration.Passage;

/// <summary>One even layer in one state of air under one correlation set: its drag and what it takes out of the air.</summary>
/// <remarks>Everything in SI doubles. Immutable.</remarks>
internal sealed class LayerModel
{
    private readonly AirProperties _air;
    private readonly OperatingPoint _point;
    private readonly LayerFigures _layer;
    private readonly double[] _weights;
    private readonly SingleFibre[] _fibres;
    private readonly double _wallFactor;

    public LayerModel(in LayerFigures layer, AirProperties air, OperatingPoint point, SingleFibreModel model)
    {
        var solidity = layer.Solidity;
        var unevenness = layer.Unevenness;
        var knudsen = Array.ConvertAll(layer.DiameterMetres, d => 2 * air.MeanFreePathMetres / d);
        _layer = layer;
        _air = air;
        _point = point;
        _weights = Weights(layer, model);
        _fibres = Array.ConvertAll(knudsen, kn => model.Fibre(solidity, kn, unevenness));
        _wallFactor = KuwabaraCell.WallFactor(solidity);
        Even = new EvenLayer(Resistance(layer, air, model), layer.ThicknessMetres);
    }

    /// <summary>What the flow through the layer rests on.</summary>
    public EvenLayer Even { get; }

    public bool IsCharged => _layer.CoulombsPerSquareMetre > 0;

    /// <summary>Drag summed over the distribution: each class has its share of the fibre length and its own Knudsen number.</summary>
    public static double Resistance(in LayerFigures layer, AirProperties air, SingleFibreModel model)
    {
        double drag = 0, square = 0;
        var unevenness = layer.Unevenness;
        for (var i = 0; i < layer.DiameterMetres.Length; i++)
        {
            var d = layer.DiameterMetres[i];
            drag += layer.LengthFractions[i] * model.DragFactor(layer.Solidity, 2 * air.MeanFreePathMetres / d, unevenness);
            square += layer.LengthFractions[i] * d * d;
        }

        return air.PascalSeconds * layer.ThicknessMetres * drag / square;
    }

    /// <summary>
    /// What −ln P gets per unit of single-fibre efficiency of each class: 4 α t / π · n d / Σ n d². Fibre length per mat volume is
    /// 4 α / (π Σ n d²), whatever the distribution.
    /// </summary>
    public static double[] Weights(in LayerFigures layer, SingleFibreModel model)
    {
        var square = 0.0;
        for (var i = 0; i < layer.DiameterMetres.Length; i++)
        {
            square += layer.LengthFractions[i] * layer.DiameterMetres[i] * layer.DiameterMetres[i];
        }

        var open = model.CountsOpenVolumeOnly ? 1 - layer.Solidity : 1;
        var perMetre = 4 * layer.Solidity * layer.ThicknessMetres / (Math.PI * square * open);
        var weights = new double[layer.DiameterMetres.Length];
        for (var i = 0; i < weights.Length; i++)
        {
            weights[i] = perMetre * layer.LengthFractions[i] * layer.DiameterMetres[i];
        }

        return weights;
    }

    /// <summary>−ln P of the even layer for particles of one size and charge.</summary>
    public double Attenuation(Particle particle, double metresPerSecond, double charges)
    {
        var sum = 0.0;
        for (var i = 0; i < _fibres.Length; i++)
        {
            sum += _weights[i] * SingleEfficiency(i, particle, metresPerSecond, charges);
        }

        return sum;
    }

    /// <summary>E of one class, all mechanisms, within the set's limit.</summary>
    public double SingleEfficiency(int fibre, Particle particle, double metresPerSecond, double charges)
    {
        var total = Single(fibre, particle, metresPerSecond, charges).Total;
        return total > 0 ? _fibres[fibre].Limit(total) : 0;
    }

    /// <summary>What each mechanism brings to −ln P of the even layer.</summary>
    public MechanismEfficiencies Mechanisms(Particle particle, double metresPerSecond, double charges)
    {
        var sum = default(MechanismEfficiencies);
        for (var i = 0; i < _fibres.Length; i++)
        {
            var mechanisms = Single(i, particle, metresPerSecond, charges);
            var total = mechanisms.Total;
            if (total > 0)
            {
                sum = sum.Add(mechanisms.Scale(_weights[i] * _fibres[i].Limit(total) / total));
            }
        }

        return sum;
    }

    private MechanismEfficiencies Single(int fibre, Particle particle, double metresPerSecond, double charges)
    {
        var diameter = _layer.DiameterMetres[fibre];
        var encounter = new Encounter(
            metresPerSecond * diameter / particle.SquareMetresPerSecond,
            particle.DiameterMetres / diameter,
            particle.RelaxationSeconds * metresPerSecond / diameter);
        var settling = particle.RelaxationSeconds * Particle.Gravity / metresPerSecond;
        return _fibres[fibre].Collect(encounter) with
        {
            Gravity = Settling.Efficiency(_point.Direction, settling, encounter.Ratio),
            Electrostatic = IsCharged ? Charged(diameter, particle, metresPerSecond, charges) : 0,
        };
    }

    private double Charged(double diameter, Particle particle, double metresPerSecond, double charges)
    {
        var neutral = Electrostatic.PolarisationNumber(
            _point.ParticlePermittivity, particle.Slip, particle.DiameterMetres, _layer.CoulombsPerSquareMetre, _layer.FibrePermittivity, _air.PascalSeconds, diameter, metresPerSecond);
        var one = Electrostatic.CoulombNumber(particle.SecondsPerKilogram, _layer.CoulombsPerSquareMetre, _layer.FibrePermittivity, metresPerSecond);
        return Electrostatic.Polarisation(neutral, _wallFactor) + Electrostatic.Coulomb(charges * one);
    }
}
