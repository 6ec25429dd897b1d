using FiberScope.Filtration.Mechanisms;

namespace FiberScope.Filtration.Passage;

/// <summary>A layer as it is: uneven, bonded, with holes. Shares the air out and adds the streams up again.</summary>
internal sealed class LayerPassage
{
    private readonly MediaLayer _layer;

    public LayerPassage(MediaLayer layer)
    {
        _layer = layer;
        Places = Places.Of(layer.BasisWeightVariation, layer.BondedArea);
        Velocities = new VelocityNodes(Places);
    }

    public Places Places { get; }

    public VelocityNodes Velocities { get; }

    /// <summary>Pressure drop and the holes' share of the air at one mean velocity.</summary>
    /// <param name="even">The even layer.</param>
    /// <param name="metresPerSecond">Velocity over the whole layer.</param>
    /// <param name="air">The air.</param>
    public LayerFlow Flow(EvenLayer even, double metresPerSecond, AirProperties air)
    {
        var resistance = even.PascalsPerMetrePerSecond * Places.ResistanceFactor;
        if (_layer.Holes.IsDefaultOrEmpty)
        {
            return new LayerFlow(resistance * metresPerSecond, 0);
        }

        var pascals = RisingRoot.Solve(p => (p / resistance) + Holes(p, even.ThicknessMetres, air), metresPerSecond, resistance * metresPerSecond);
        return new LayerFlow(pascals, Math.Clamp(1 - (pascals / resistance / metresPerSecond), 0, 1));
    }

    /// <summary>−ln P of the layer from ln K of the even layer at the velocity nodes.</summary>
    public double Attenuation(ReadOnlySpan<double> logarithms, double leakShare, double particleMetres)
    {
        var mat = Places.FlowShares.Length == 1 ? Math.Exp(logarithms[0]) : OverPlaces(logarithms);
        return Mixing.WithLeak(mat + Strained(particleMetres), leakShare);
    }

    /// <summary>What straining adds to −ln P at one size.</summary>
    public double Strained(double particleMetres) => _layer.Openings is { } openings
        ? Straining.Attenuation(particleMetres / openings.Median.Meters, openings.GeometricStandardDeviation)
        : 0;

    private double OverPlaces(ReadOnlySpan<double> logarithms)
    {
        Span<double> values = stackalloc double[Places.FlowShares.Length];
        for (var place = 0; place < values.Length; place++)
        {
            var weights = Velocities.ForPlace[place];
            var logarithm = 0.0;
            for (var n = 0; n < weights.Length; n++)
            {
                logarithm += weights[n] * logarithms[n];
            }

            values[place] = Places.RelativeWeights[place] * Math.Exp(logarithm);
        }

        return Mixing.Attenuation(Places.FlowShares, values);
    }

    private double Holes(double pascals, double thicknessMetres, AirProperties air)
    {
        var sum = 0.0;
        foreach (var holes in _layer.Holes)
        {
            sum += holes.MetresPerSecond(thicknessMetres, pascals, air);
        }

        return sum;
    }
}
