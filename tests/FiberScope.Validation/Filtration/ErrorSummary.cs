namespace FiberScope.Validation.Filtration;

/// <summary>Relative errors in short: median and worst size, and the mean with its sign.</summary>
internal readonly record struct ErrorSummary(int Count, double Median, double NinetyPercent, double Worst, double Bias)
{
    public static ErrorSummary Of(IEnumerable<double> errors)
    {
        var all = errors.ToArray();
        var sizes = all.Select(Math.Abs).Order().ToArray();
        double Quantile(double share) => sizes[Math.Min(sizes.Length - 1, (int)(share * sizes.Length))];
        return sizes.Length == 0 ? default : new ErrorSummary(sizes.Length, Quantile(0.5), Quantile(0.9), sizes[^1], all.Average());
    }
}
