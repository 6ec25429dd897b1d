namespace FiberScope.Filtration.Passage;

/// <summary>The few velocities at which a layer is worked out, and how the places between them are read.</summary>
/// <remarks>ln K is smooth in ln u: Chebyshev nodes over the places' velocities and Lagrange's polynomial between.</remarks>
internal sealed class VelocityNodes
{
    private const int Most = 7;

    public VelocityNodes(Places places)
    {
        var (low, high) = (places.RelativeVelocities.Min(), places.RelativeVelocities.Max());
        Relative = places.RelativeVelocities.Length == 1
            ? [low]
            : [.. Enumerable.Range(0, Most).Select(i => Math.Exp((0.5 * Math.Log(low * high)) - (0.5 * Math.Log(high / low) * Math.Cos(Math.PI * (i + 0.5) / Most))))];
        ForPlace = Array.ConvertAll(places.RelativeVelocities, u => Lagrange.Weights(Array.ConvertAll(Relative, Math.Log), Math.Log(u)));
    }

    /// <summary>Velocities over the layer's mean velocity.</summary>
    public double[] Relative { get; }

    /// <summary>For each place the weights of the nodes.</summary>
    public double[][] ForPlace { get; }
}
