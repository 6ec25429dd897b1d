namespace FiberScope.Filtration.Correlations;

/// <summary>One layer in one state of air under one correlation set: its drag and what it takes out of the air.</summary>
/// <remarks>Everything in SI doubles. Immutable.</remarks>
internal sealed class LayerModel
{
    private readonly double[] _diameterMetres;
    private readonly double[] _weights;
    private readonly SingleFibre[] _fibres;

    public LayerModel(MediaLayer layer, AirProperties air, SingleFibreModel model)
    {
        var solidity = layer.Solidity.Fraction;
        var thicknessMetres = layer.Thickness.Meters;
        var unevenness = layer.InhomogeneityFactor is { } given ? given / KirschStechkinaModel.DaviesInhomogeneity(solidity) : 1;
        var classes = layer.Diameters.Classes;
        _diameterMetres = [.. classes.Select(c => c.Diameter.Meters)];
        var knudsen = Array.ConvertAll(_diameterMetres, d => 2 * air.MeanFreePathMetres / d);
        var meanSquare = classes.Sum(c => c.LengthFraction * c.Diameter.Meters * c.Diameter.Meters);

        // Fibre length per mat volume is 4 α / (π Σ n d²), whatever the distribution; each class has its share n of it.
        var perSquareMetre = 4 * solidity * thicknessMetres / (Math.PI * meanSquare * (model.CountsOpenVolumeOnly ? 1 - solidity : 1));
        _weights = [.. classes.Select(c => perSquareMetre * c.LengthFraction * c.Diameter.Meters)];
        _fibres = Array.ConvertAll(knudsen, kn => model.Fibre(solidity, kn, unevenness));
        var drag = classes.Select((c, i) => c.LengthFraction * model.DragFactor(solidity, knudsen[i], unevenness)).Sum();
        PascalsPerMetrePerSecond = air.PascalSeconds * thicknessMetres * drag / meanSquare;
    }

    /// <summary>Pressure drop per face velocity, Pa s/m.</summary>
    public double PascalsPerMetrePerSecond { get; }

    /// <summary>What each mechanism brings to −ln P of the layer.</summary>
    public MechanismEfficiencies Attenuation(Particle particle, double metresPerSecond, FlowDirection direction)
    {
        var sum = default(MechanismEfficiencies);
        for (var i = 0; i < _fibres.Length; i++)
        {
            var collected = SingleEfficiency(i, particle, metresPerSecond, direction);
            sum = sum.Add(collected.Scale(_weights[i]));
        }

        return sum;
    }

    private MechanismEfficiencies SingleEfficiency(int fibre, Particle particle, double metresPerSecond, FlowDirection direction)
    {
        var diameter = _diameterMetres[fibre];
        var encounter = new Encounter(
            metresPerSecond * diameter / particle.SquareMetresPerSecond,
            particle.DiameterMetres / diameter,
            particle.RelaxationSeconds * metresPerSecond / diameter,
            particle.RelaxationSeconds * Particle.Gravity / metresPerSecond);
        var mechanisms = _fibres[fibre].Collect(encounter) with
        {
            Gravity = Mechanisms.Settling.Efficiency(direction, encounter.SettlingRatio, encounter.Ratio),
        };
        var total = mechanisms.Total;
        return total > 0 ? mechanisms.Scale(_fibres[fibre].Limit(total) / total) : default;
    }
}
