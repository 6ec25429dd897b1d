namespace FiberScope.Filtration.Cell;

/// <summary>How much each of up to four neighbouring nodes counts; the weights sum to 1.</summary>
/// <param name="First">Index of the first node.</param>
/// <param name="W0">Weight of the first node.</param>
/// <param name="W1">Weight of the second.</param>
/// <param name="W2">Weight of the third.</param>
/// <param name="W3">Weight of the fourth.</param>
public readonly record struct AxisWeights(int First, double W0, double W1, double W2, double W3)
{
    /// <summary>The weighted sum of values that stand <paramref name="stride"/> apart, the first node's at <paramref name="start"/>.</summary>
    public double Sum(ReadOnlySpan<double> values, int start, int stride)
    {
        var at = start + (First * stride);
        var sum = (W0 * values[at]) + (W1 * values[at + stride]);
        return W2 == 0 && W3 == 0 ? sum : sum + (W2 * values[at + (2 * stride)]) + (W3 * values[at + (3 * stride)]);
    }
}
