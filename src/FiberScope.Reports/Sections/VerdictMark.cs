using FiberScope.Conformity;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>A decision as a word with a mark, told apart without colour.</summary>
internal static class VerdictMark
{
    /// <summary>The mark for a decision.</summary>
    /// <param name="decision">The decision.</param>
    /// <param name="byForecast">Whether it rests on a forecast.</param>
    public static Markup Of(Decision decision, bool byForecast)
    {
        var (style, sign, word) = decision switch
        {
            Decision.Pass => ("pass", "✓", "Pass"),
            Decision.Fail => ("fail", "✕", "Fail"),
            _ => ("open", "?", "Undecided"),
        };
        var suffix = byForecast ? Markup.Of($" <small>by forecast</small>") : Markup.Empty;
        return Markup.Of($"<span class=\"mark {style}\"><span aria-hidden=\"true\">{sign}</span> {word}{suffix}</span>");
    }
}
