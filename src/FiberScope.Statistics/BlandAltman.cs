namespace FiberScope.Statistics;

/// <summary>How two methods that measured the same things agree.</summary>
/// <remarks>Source: Bland and Altman (1986), The Lancet 327(8476), 307–310.</remarks>
/// <param name="Count">How many pairs; at least 3.</param>
/// <param name="Bias">The mean of first − second, in the unit of the values.</param>
/// <param name="StandardDeviation">The standard deviation of the differences (n − 1).</param>
/// <param name="BiasInterval95">The 95 % interval of the bias (Student's t).</param>
/// <param name="LowerLimit">The lower limit of agreement, bias − 1.96 SD.</param>
/// <param name="UpperLimit">The upper limit of agreement, bias + 1.96 SD.</param>
/// <param name="LimitStandardError">The standard error of either limit, √(3 / n) SD, the source's approximation.</param>
public sealed record BlandAltman(
    int Count, double Bias, double StandardDeviation, Interval BiasInterval95, double LowerLimit, double UpperLimit, double LimitStandardError)
{
    /// <summary>Compares pairs.</summary>
    /// <exception cref="ArgumentException">There are fewer than three pairs, or the lists differ in length.</exception>
    public static BlandAltman Of(ReadOnlySpan<double> first, ReadOnlySpan<double> second)
    {
        if (first.Length < 3 || first.Length != second.Length)
        {
            throw new ArgumentException("Needs at least three pairs.", nameof(first));
        }

        var n = first.Length;
        double sum = 0, squares = 0;
        for (var i = 0; i < n; i++)
        {
            sum += first[i] - second[i];
        }

        var bias = sum / n;
        for (var i = 0; i < n; i++)
        {
            var d = first[i] - second[i] - bias;
            squares += d * d;
        }

        var deviation = Math.Sqrt(squares / (n - 1));
        var half = ClusteredMean.StudentFactor95(n - 1) * deviation / Math.Sqrt(n);
        return new BlandAltman(
            n, bias, deviation, new Interval(bias - half, bias + half), bias - (1.96 * deviation), bias + (1.96 * deviation), Math.Sqrt(3.0 / n) * deviation);
    }
}
