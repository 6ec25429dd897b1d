using System.CommandLine;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Measuring;
using FiberScope.Filtration;

namespace FiberScope.Cli.Commands;

/// <summary>Options that several commands share.</summary>
internal static class CommonOptions
{
    public static Option<string> Correlations() => new Option<string>("--correlations")
    {
        Description = "The published correlations to predict with; overrides the file.",
    }.AcceptOnlyFromAmong([.. Words.Correlations.Keys]);

    public static CorrelationSet? Chosen(ParseResult parsed, Option<string> option) =>
        parsed.GetValue(option) is { } word ? Words.Correlations[word] : null;

    public static Option<bool> IncludeUnfit() => new("--include-unfit") { Description = "Count fields that are unfit for measuring all the same." };

    public static Option<int> Seed() => new("--seed") { Description = "Seed of every random number; the same seed gives the same result.", DefaultValueFactory = _ => new MeasuringSettings().Seed };
}
