namespace FiberScope.Imaging.Edges;

/// <summary>The brightness across a cylinder before it is blurred, as steps that lie denser towards the edges.</summary>
/// <remarks>
/// Every step becomes a normal integral when blurred, so that model and derivatives are sums of table look-ups. The value of a step is
/// the mean of the law over it, which keeps the law's area.
/// </remarks>
internal static class EdgeShape
{
    /// <summary>Highest value of the secant: where the surface turns edge-on the escape depth rounds it off.</summary>
    public const double Cap = 3.3;

    /// <summary>Where steps begin, from the edge (0) to the axis (1), in half-widths.</summary>
    public static readonly double[] From = [0, 0.012, 0.035, 0.075, 0.14, 0.25, 0.4, 0.65, 1];

    /// <summary>The number of steps from an edge to the axis.</summary>
    public const int Steps = 8;

    /// <summary>min(cap, 1/√(1 − t²)) − 1, the secant law of secondary emission less its value on the axis.</summary>
    public static readonly double[] Rim = Means(t => Math.Min(Cap, 1 / Math.Sqrt(Math.Max(1e-9, 1 - (t * t)))) - 1);

    /// <summary>t, from −1 at the left edge to 1 at the right: the value on the right half.</summary>
    public static readonly double[] Tilt = Means(t => t);

    /// <summary>−t²: flanks darker than the middle.</summary>
    public static readonly double[] Dome = Means(t => -t * t);

    private static double[] Means(Func<double, double> law)
    {
        const int Points = 200;
        return [.. Enumerable.Range(0, Steps).Select(k => Enumerable.Range(0, Points).Average(i => law(1 - (From[k] + ((From[k + 1] - From[k]) * (i + 0.5) / Points)))))];
    }
}
