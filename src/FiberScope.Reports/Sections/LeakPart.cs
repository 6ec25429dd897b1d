using FiberScope.Filtration;
using FiberScope.Reports.Figures;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>What a leak past the medium does to its protection: holes, edges, the seal of a mask.</summary>
internal static class LeakPart
{
    private static readonly double[] Shares = [0, 0.001, 0.003, 0.01, 0.03, 0.10];

    public static Markup Render(MediaForecast forecast, double? totalInward)
    {
        var worst = forecast.PenetrationAtMostPenetratingSize;
        var table = new Table("figures", "share of the air through the leak", "penetration at the MPPS", "times the medium alone");
        foreach (var share in Shares)
        {
            var total = Leakage.Total(worst, share);
            table.Row(share == 0 ? "none" : Wording.Percent(share, 1), Wording.Percent(total), worst > 0 ? Wording.Number(total / worst, 2) : "–");
        }

        return Markup.Of(
            $"""
            <h3>What a leak does</h3>
            <p>{Halving(worst)} {Own(forecast)} {Inward(totalInward)}</p>
            {Figure(worst)}
            {table.Finish()}
            <p class="fine">A leak lets all sizes through alike. For a mask the air past the face seal and the exhalation valve counts as the leak, and the total is its total inward leakage; it cannot be foretold from the medium, and fit testing decides.</p>
            """);
    }

    private static string Halving(double worst)
    {
        var share = Leakage.HalvingShare(worst);
        return share < 1
            ? $"A leak that takes {Wording.Percent(share, 2)} of the air doubles the penetration at the MPPS: it halves the protection."
            : "This medium lets through so much that no leak can halve its protection.";
    }

    private static string Inward(double? total) => total is { } share
        ? $"With the leaks told in the swatch file, the total inward leakage at the MPPS would be {Wording.Percent(share, 3)}."
        : "";

    private static Markup Figure(double worst) => worst > 0 ? Markup.Of($"<figure>{Markup.OfSvg(LeakFigure.Draw(worst))}</figure>") : Markup.Empty;

    private static string Own(MediaForecast forecast)
    {
        var holes = forecast.HoleShares.IsDefaultOrEmpty ? 0 : forecast.HoleShares.Max();
        string[] parts =
        [
            .. forecast.EdgeLeakShare > 0 ? [$"{Wording.Percent(forecast.EdgeLeakShare, 2)} of the air goes past the edge"] : Array.Empty<string>(),
            .. holes > 0 ? [$"{Wording.Percent(holes, 2)} of a layer's air goes through holes"] : Array.Empty<string>(),
        ];
        return parts.Length == 0 ? "The forecast itself counts no leak." : $"In the forecast, {string.Join(" and ", parts)}.";
    }
}
