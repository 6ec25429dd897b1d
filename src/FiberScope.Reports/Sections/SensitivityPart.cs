using FiberScope.Filtration;
using FiberScope.Reports.Figures;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>Which input's uncertainty costs the forecast most: what to measure better next.</summary>
internal static class SensitivityPart
{
    private const double LeastShare = 0.005;

    public static Markup Render(MediaForecast forecast)
    {
        if (forecast.Uncertainty is not { Ranking.IsEmpty: false } uncertainty)
        {
            return Markup.Empty;
        }

        InputContribution[] notable = [.. uncertainty.Ranking.Where(c => c.PenetrationShare >= LeastShare || c.PressureDropShare >= LeastShare)];
        if (notable.Length == 0)
        {
            return Markup.Empty;
        }

        var several = uncertainty.Ranking.Select(c => c.Layer).OfType<int>().Distinct().Skip(1).Any();
        var figure = RankingFigure.Draw(notable.Select(c => (Name(c, several), c.PenetrationShare)), "share of the variance of ln P at the MPPS (%)", "ranking", "Share of the forecast's measurement uncertainty that each input brings.");
        var table = new Table("figures", "input", "share for penetration", "share for pressure drop", "alone: pressure drop ±");
        foreach (var cause in notable)
        {
            table.Row(Name(cause, several), Share(cause.PenetrationShare), Share(cause.PressureDropShare), Wording.Percent(cause.PressureDropDeviation, 2));
        }

        var first = uncertainty.Ranking.MaxBy(c => c.PenetrationShare)!;
        return Markup.Of(
            $"""
            <h3>What to measure better next</h3>
            <p>The uncertainty of <b>{Name(first, several)}</b> costs the forecast of penetration most.</p>
            <figure>{Markup.OfSvg(figure)}</figure>
            {table.Finish()}
            <p class="fine">From {Wording.Count(uncertainty.Draws)} draws of the inputs, seed {Wording.Count(uncertainty.Seed)}; the spread of the published models is not in it. ± is one standard deviation.</p>
            """);
    }

    private static string Share(double share) => $"{Wording.Fixed(share * 100, 0)} %";

    private static string Name(InputContribution cause, bool several) => several && cause.Layer is { } layer
        ? $"{Wording.Words(cause.Input)}, layer {Wording.Count(layer)}"
        : Wording.Words(cause.Input);
}
