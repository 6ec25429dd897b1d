namespace FiberScope.Filtration;

/// <summary>Searches variation and open area together: a grid, then ever smaller steps about the best.</summary>
/// <remarks>The two lie in one valley, so one after the other would crawl; and counting noise makes derivatives useless.</remarks>
internal static class UnevennessSearch
{
    /// <summary>Variation is held to what webs have; common practice, no source. Left free, noise drives it to any bound.</summary>
    private const double LargestVariation = 0.5;

    private const double SmallestOpenArea = 1e-6;
    private const double LargestOpenArea = 1e-2;
    private const int Cells = 6;
    private const int Rounds = 6;

    /// <summary>The pair with the least misfit.</summary>
    public static (double Variation, double OpenArea) Best(Func<double, double, double> misfit)
    {
        double At((double X, double Y) p) => misfit(Variation(p.X), OpenArea(p.Y));
        var points = from i in Enumerable.Range(0, Cells + 1) from j in Enumerable.Range(0, Cells + 1) select ((double)i / Cells, (double)j / Cells);
        var best = points.Select(p => (Point: p, Misfit: At(p))).MinBy(p => p.Misfit);
        var step = 1.0 / Cells;
        for (var round = 0; round < Rounds; round++)
        {
            step /= 2;
            (double X, double Y) centre = best.Point;
            var around = from i in new[] { -step, 0, step }
                         from j in new[] { -step, 0, step }
                         where i != 0 || j != 0
                         select (X: Math.Clamp(centre.X + i, 0, 1), Y: Math.Clamp(centre.Y + j, 0, 1));
            var nearest = around.Select(p => (Point: p, Misfit: At(p))).MinBy(p => p.Misfit);
            best = nearest.Misfit < best.Misfit ? nearest : best;
        }

        return (Variation(best.Point.Item1), OpenArea(best.Point.Item2));
    }

    private static double Variation(double share) => LargestVariation * share;

    /// <summary>None at the low end, then even in the logarithm.</summary>
    private static double OpenArea(double share) => share <= 0 ? 0 : SmallestOpenArea * Math.Pow(LargestOpenArea / SmallestOpenArea, share);
}
