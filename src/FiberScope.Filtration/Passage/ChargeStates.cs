namespace FiberScope.Filtration.Passage;

/// <summary>The charges of particles of one size: how many carry each number, and at which few numbers the capture is worked out.</summary>
/// <remarks>Capture is smooth in the number of charges, so large particles with dozens need no more than seven.</remarks>
internal sealed class ChargeStates
{
    private const int MostNodes = 7;

    private readonly double[] _shares;
    private readonly double[][]? _weights;

    private ChargeStates(double[] shares)
    {
        _shares = shares;
        var largest = shares.Length - 1;
        if (shares.Length <= MostNodes)
        {
            Nodes = [.. Enumerable.Range(0, shares.Length).Select(n => (double)n)];
            return;
        }

        Nodes = [.. Enumerable.Range(0, MostNodes).Select(i => 0.5 * largest * (1 - Math.Cos(Math.PI * i / (MostNodes - 1))))];
        _weights = [.. Enumerable.Range(0, shares.Length).Select(n => Lagrange.Weights(Nodes, n))];
    }

    /// <summary>Particles without charge, or a medium that does not care.</summary>
    public static ChargeStates None { get; } = new([1]);

    /// <summary>The numbers of charges at which attenuation is wanted.</summary>
    public double[] Nodes { get; }

    public static ChargeStates Of(Particle particle, AirProperties air) =>
        new([.. EquilibriumCharge.Shares(particle.Diameter, air.Temperature)]);

    /// <summary>−ln of the penetration averaged over the charges; never exp of a mean.</summary>
    /// <param name="attenuation">−ln P at each node.</param>
    public double Average(ReadOnlySpan<double> attenuation)
    {
        if (_shares.Length == 1)
        {
            return attenuation[0];
        }

        Span<double> values = stackalloc double[_shares.Length];
        for (var n = 0; n < values.Length; n++)
        {
            values[n] = _weights is null ? attenuation[n] : Dot(_weights[n], attenuation);
        }

        return Mixing.Attenuation(_shares, values);
    }

    private static double Dot(double[] weights, ReadOnlySpan<double> values)
    {
        var sum = 0.0;
        for (var i = 0; i < weights.Length; i++)
        {
            sum += weights[i] * values[i];
        }

        return sum;
    }
}
