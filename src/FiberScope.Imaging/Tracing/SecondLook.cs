namespace FiberScope.Imaging.Tracing;

/// <summary>A look at every ribbon with the others known: weak, narrow ones in a picture of strong, wide ones are rims or noise.</summary>
/// <remarks>
/// A bright rim looks like a thin fibre, but the body of its own fibre lies on one side and the ground on the other, all along. A thin
/// fibre has that only here and there. So narrow ribbons that are mostly uneven outside are rims, all of them; where only some are,
/// those go that also have a matching far edge.
/// </remarks>
internal static class SecondLook
{
    private const double WeakShare = 0.6;
    private const double NarrowShare = 0.4;
    private const double RimShare = 0.3;
    private const double RimsMostly = 0.18, RimAlone = 0.15, FarEdge = 0.2;
    private const int LeastRibbons = 10;

    /// <summary>The ribbons that stand the second look, in the same order.</summary>
    public static List<Ribbon> At(List<Ribbon> ribbons, bool wantsRims)
    {
        if (ribbons.Count < LeastRibbons)
        {
            return ribbons;
        }

        var (contrast, width) = (ByArea(ribbons, r => r.Contrast), ByArea(ribbons, r => r.Width));
        var narrow = ribbons.Where(r => r.Width < RimShare * width).ToArray();
        var areRims = narrow.Length > 0 && Typical(narrow, r => Math.Abs(r.Asymmetry), Length) > RimsMostly;
        return
        [
            .. ribbons.Where(r => wantsRims || r.Width >= RimShare * width || !(areRims || (Math.Abs(r.Asymmetry) > RimAlone && r.Body > FarEdge)))
                .Where(r => r.Contrast >= WeakShare * contrast || r.Width >= NarrowShare * width),
        ];
    }

    /// <summary>The median by covered area, so that many specks do not outvote a few fibres.</summary>
    private static double ByArea(IReadOnlyList<Ribbon> ribbons, Func<Ribbon, double> figure) => Typical(ribbons, figure, r => Length(r) * r.Width);

    private static double Length(Ribbon ribbon) => ribbon.Accepted.Count(a => a) * ribbon.Strip.Step;

    private static double Typical(IReadOnlyList<Ribbon> ribbons, Func<Ribbon, double> figure, Func<Ribbon, double> weight) =>
        new Statistics.WeightedSample([.. ribbons.Select(figure)], [.. ribbons.Select(weight)]).Quantile(0.5);
}
