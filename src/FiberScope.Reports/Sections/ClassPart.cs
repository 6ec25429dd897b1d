using FiberScope.Filtration;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>The classes of the published standards that the forecast points to, with their probabilities.</summary>
internal static class ClassPart
{
    private const double Worthwhile = 0.01;

    public static Markup Render(IEnumerable<ClassForecast> classes)
    {
        var table = new Table("text", "standard", "points to", "probability", "others", "not judged");
        foreach (var forecast in classes)
        {
            table.Row(
                "",
                [
                    Markup.Of($"{forecast.Standard}<br><span class=\"fine\">{forecast.Edition}; {forecast.Provenance}</span>"),
                    Markup.Of($"<b>{forecast.Class ?? "none"}</b>"),
                    Markup.Of($"{(forecast.Class is null ? "–" : Wording.Probability(forecast.Probability))}"),
                    Markup.Of($"{Others(forecast)}"),
                    Markup.Of($"{forecast.NotJudged}"),
                ]);
        }

        var rows = table.Finish();
        return rows.IsEmpty ? rows : Markup.Of($"<h3>Classes it points to</h3><p>{ClassForecast.Caution}</p>{rows}<p class=\"fine\">Probability that the limits of the class would be kept: the published models counted as equally likely, each with the uncertainty of the measured inputs.</p>");
    }

    /// <summary>The classes next to the one pointed to that are still worth a thought.</summary>
    private static string Others(ClassForecast forecast)
    {
        var at = forecast.All.Select(c => c.Name).ToList().IndexOf(forecast.Class ?? "");
        var near = forecast.All.Where((c, i) => i != at && Math.Abs(i - at) <= 2 && c.Probability is >= Worthwhile and <= 1 - Worthwhile);
        return string.Join(", ", near.Select(c => $"{c.Name} {Wording.Probability(c.Probability)}"));
    }
}
