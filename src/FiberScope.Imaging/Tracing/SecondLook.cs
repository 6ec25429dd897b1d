namespace FiberScope.Imaging.Tracing;

/// <summary>A look at every ribbon with the others known: weak, narrow ones in a picture of strong, wide ones are rims or noise.</summary>
internal static class SecondLook
{
    private const double WeakShare = 0.6;
    private const double NarrowShare = 0.4;
    private const int LeastRibbons = 10;

    /// <summary>The ribbons that stand the second look, in the same order.</summary>
    public static List<Ribbon> At(List<Ribbon> ribbons)
    {
        if (ribbons.Count < LeastRibbons)
        {
            return ribbons;
        }

        var (contrast, width) = (Typical(ribbons, r => r.Contrast), Typical(ribbons, r => r.Width));
        return [.. ribbons.Where(r => r.Contrast >= WeakShare * contrast || r.Width >= NarrowShare * width)];
    }

    /// <summary>The median by covered area, so that many specks do not outvote a few fibres.</summary>
    private static double Typical(List<Ribbon> ribbons, Func<Ribbon, double> figure)
    {
        double[] values = [.. ribbons.Select(figure)];
        double[] areas = [.. ribbons.Select(r => r.Accepted.Count(a => a) * r.Strip.Step * r.Width)];
        return new Statistics.WeightedSample(values, areas).Quantile(0.5);
    }
}
