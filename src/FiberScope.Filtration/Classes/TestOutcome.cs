namespace FiberScope.Filtration.Classes;

/// <summary>What a test would show, on a scale where uncertainties are about even: ln(−ln P), or ln Δp.</summary>
/// <param name="Central">By the central set.</param>
/// <param name="BySet">By each published set.</param>
/// <param name="Deviation">Standard deviation from the uncertain inputs.</param>
internal sealed record TestOutcome(double Central, double[] BySet, double Deviation)
{
    private const double LeastDeviation = 1e-3;

    public static double OfPenetration(double penetration) => Math.Log(Math.Max(1e-12, -Math.Log(Math.Clamp(penetration, 1e-300, 1))));

    /// <summary>Whether the central value keeps a limit.</summary>
    public bool Keeps(ClassLimit limit) => Margin(Central, limit) >= 0;

    /// <summary>The probability that one set's value keeps a limit.</summary>
    public double Probability(ClassLimit limit, int set) =>
        MathNet.Numerics.Distributions.Normal.CDF(0, Math.Max(LeastDeviation, Deviation), Margin(BySet[set], limit));

    private static double Margin(double value, ClassLimit limit) => limit.AtLeast is { } efficiency
        ? value - OfPenetration(1 - efficiency)
        : Math.Log(limit.AtMost!.Value) - value;
}
