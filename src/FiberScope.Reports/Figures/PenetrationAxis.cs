using OxyPlot.Axes;

namespace FiberScope.Reports.Figures;

/// <summary>The axis that suits penetrations: logarithmic when they span more than a factor of ten, straight from zero otherwise.</summary>
internal sealed record PenetrationAxis(double Low, double High, bool IsLogarithmic)
{
    private const int LowestDecade = -6;
    private const int MostDecades = 4;

    /// <summary>The axis for penetrations in per cent.</summary>
    public static PenetrationAxis For(IEnumerable<double> percents)
    {
        double[] all = [.. percents.Where(p => p > 0)];
        var (low, high) = all.Length == 0 ? (1, 100) : (all.Min(), Math.Min(100, all.Max()));
        if (high / low < 10)
        {
            return new PenetrationAxis(0, Math.Min(100, Nice(high * 1.15)), false);
        }

        var top = Math.Min(2, (int)Math.Ceiling(Math.Log10(high * 1.05)));
        var bottom = Math.Max(Math.Max(LowestDecade, top - MostDecades), (int)Math.Floor(Math.Log10(low)));
        return new PenetrationAxis(Decade(Math.Min(bottom, top - 1)), Decade(top), true);
    }

    /// <summary>The drawn axis.</summary>
    public Axis Drawn(string title) => IsLogarithmic
        ? FigureStyle.Logarithmic(AxisPosition.Left, title, Low * 0.999, High)
        : FigureStyle.Straight(AxisPosition.Left, title, Low, High);

    /// <summary>A value brought onto the drawing, so that a curve that leaves it is cut at the edge and not lost.</summary>
    public double Clip(double percent) => Math.Clamp(percent, IsLogarithmic ? Low * 0.5 : Low, High);

    /// <summary>A power of ten to the last digit, so that the axis shows its end.</summary>
    private static double Decade(int exponent) => exponent >= 0 ? Math.Pow(10, exponent) : 1 / Math.Pow(10, -exponent);

    private static double Nice(double value)
    {
        var scale = Math.Pow(10, Math.Floor(Math.Log10(value)));
        double[] steps = [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10];
        return Array.Find(steps, step => step * scale >= value) * scale;
    }
}
