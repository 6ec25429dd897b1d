using System.Collections.Immutable;

namespace FiberScope.Conformity;

/// <summary>What can be said about a swatch against a whole grade.</summary>
/// <param name="Grade">The grade.</param>
/// <param name="Verdicts">The verdict on each limit, in the grade's order.</param>
public sealed record GradeVerdict(Grade Grade, ImmutableArray<Verdict> Verdicts)
{
    /// <summary>Fail when a limit is broken, pass when every limit is kept, undecided otherwise.</summary>
    public Decision Decision =>
        Verdicts.Any(v => v.Decision == Decision.Fail) ? Decision.Fail
        : Verdicts.All(v => v.Decision == Decision.Pass) ? Decision.Pass
        : Decision.Undecided;

    /// <summary>Whether a limit on a forecast had a say in the decision.</summary>
    public bool RestsOnForecast => Decision switch
    {
        Decision.Fail => Verdicts.Where(v => v.Decision == Decision.Fail).All(v => v.Limit.Characteristic.IsForecast),
        Decision.Undecided => Verdicts.Where(v => v.Decision == Decision.Undecided).All(v => v.Limit.Characteristic.IsForecast),
        _ => Verdicts.Any(v => v.Limit.Characteristic.IsForecast),
    };

    /// <summary>
    /// The most that the risk of breaking any limit can be: the sum of the limits' risks, at most 1. It holds however the
    /// characteristics hang together (Bonferroni's inequality).
    /// </summary>
    public double HighestConsumersRisk => Math.Min(1, Verdicts.Sum(v => v.ConsumersRisk));

    /// <summary>The whole verdict in one sentence for people.</summary>
    public string Sentence
    {
        get
        {
            var (failed, open) = (Count(Decision.Fail), Count(Decision.Undecided));
            var text = Decision switch
            {
                Decision.Pass => FormattableString.Invariant($"Pass: every limit of {Grade.Name} is kept at the agreed risk."),
                Decision.Fail => FormattableString.Invariant($"Fail: {failed} of {Verdicts.Length} limits of {Grade.Name} broken at the agreed risk."),
                _ => FormattableString.Invariant($"Undecided: {open} of {Verdicts.Length} limits of {Grade.Name} cannot be decided at the agreed risk."),
            };
            return RestsOnForecast ? text + " It rests on a forecast in part; only the standard's own test decides." : text;
        }
    }

    private int Count(Decision decision) => Verdicts.Count(v => v.Decision == decision);
}
