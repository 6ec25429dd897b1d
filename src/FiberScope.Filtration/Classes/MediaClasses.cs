using System.Collections.Immutable;
using FiberScope.Filtration.Classes;
using FiberScope.Filtration.Correlations;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The classes of the published standards that a medium points to.</summary>
public static class MediaClasses
{
    /// <summary>Judges a medium against the limits of every standard in the table.</summary>
    /// <param name="layers">The layers, upstream first.</param>
    /// <param name="point">How the medium is used. Tests that name a flow run at that flow where the area is known, else at this velocity.</param>
    /// <param name="settings">How the forecast is made; the defaults when null.</param>
    /// <param name="mediaArea">The area of medium in the product; without it, limits on pressure drop at a flow are not judged.</param>
    /// <returns>One forecast per standard. Each probability stands beside <see cref="ClassForecast.Caution"/>.</returns>
    /// <remarks>
    /// The published sets count as equally likely; about each, the uncertain inputs spread ln(−ln P) or ln Δp normally. Limits of one
    /// class are taken to be kept or missed together, so the least probable decides.
    /// </remarks>
    public static ImmutableArray<ClassForecast> Judge(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ForecastSettings? settings = null, Area? mediaArea = null)
    {
        var bench = new TestBench(layers, point, settings ?? new ForecastSettings(), mediaArea);
        var tests = ClassTable.Published.Tests.ToDictionary(t => t.Id, StringComparer.Ordinal);
        return [.. ClassTable.Published.Standards.Select(standard => Judge(standard, tests, bench, mediaArea))];
    }

    private static ClassForecast Judge(ClassStandard standard, Dictionary<string, ClassTest> tests, TestBench bench, Area? mediaArea)
    {
        var all = standard.Classes.Select(c => Probability(c, tests, bench)).ToImmutableArray();
        var best = all.LastOrDefault(c => c.Kept);
        var missing = standard.Classes.SelectMany(c => c.Limits).Any(l => bench.Outcome(tests[l.Test]) is null);
        var assumed = mediaArea is null && standard.Classes.SelectMany(c => c.Limits).Select(l => tests[l.Test]).Any(t => t is { LitresPerMinute: not null, SquareCentimetres: null, Kind: "aerosol" });
        return new ClassForecast
        {
            Standard = standard.Standard,
            Edition = standard.Edition,
            Provenance = standard.Provenance,
            Class = best?.Name,
            Probability = best?.Probability ?? 0,
            All = all,
            NotJudged = string.Join("; ", new[]
            {
                standard.NotJudged,
                missing ? "pressure drop at the standard's flow, for want of the medium's area" : "",
                assumed ? "the standard's flow itself: tested at the operating point's velocity" : "",
            }.Where(s => s.Length > 0)),
        };
    }

    private static ClassProbability Probability(MediaClass wanted, Dictionary<string, ClassTest> tests, TestBench bench)
    {
        var judged = wanted.Limits.Select(limit => (Limit: limit, Outcome: bench.Outcome(tests[limit.Test])))
            .Where(pair => pair.Outcome is not null).Select(pair => (pair.Limit, Outcome: pair.Outcome!)).ToArray();
        if (judged.Length == 0)
        {
            return new ClassProbability(wanted.Name, 0, false);
        }

        var probability = Enumerable.Range(0, SingleFibreModel.Published.Count).Average(set => judged.Min(j => j.Outcome.Probability(j.Limit, set)));
        return new ClassProbability(wanted.Name, probability, judged.All(j => j.Outcome.Keeps(j.Limit)));
    }
}
