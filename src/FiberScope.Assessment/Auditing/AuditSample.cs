using System.Collections.Immutable;
using FiberScope.Statistics;
using MathNet.Numerics.Random;

namespace FiberScope.Assessment.Auditing;

/// <summary>Draws the readings that a person is to measure.</summary>
public static class AuditSample
{
    private const int Strata = 6;

    /// <summary>The fewest readings worth comparing.</summary>
    public const int Fewest = 3;

    /// <summary>Draws at random from strata of diameter that hold equally many readings, so that thin and thick are both looked at.</summary>
    /// <param name="readings">All readings.</param>
    /// <param name="count">How many to draw, at least 3; fewer come back where there are not as many.</param>
    /// <param name="seed">The same seed draws the same readings.</param>
    /// <returns>In random order, so that neither order nor number tells anything.</returns>
    /// <remarks>Within a stratum each fibre comes once before any comes twice, as readings on one fibre are not independent.</remarks>
    public static ImmutableArray<AuditReading> Draw(IReadOnlyList<AuditReading> readings, int count, int seed)
    {
        Require.Within(count, Fewest, int.MaxValue);
        var random = new MersenneTwister(seed, threadSafe: false);
        AuditReading[] ascending = [.. readings.OrderBy(r => r.Diameter.Meters).ThenBy(r => r.Field).ThenBy(r => r.Trace).ThenBy(r => r.X).ThenBy(r => r.Y)];
        var strata = Math.Min(Strata, count);
        var drawn = new List<AuditReading>();
        for (var s = 0; s < strata; s++)
        {
            var stratum = ascending[(s * ascending.Length / strata)..((s + 1) * ascending.Length / strata)];
            Shuffle(stratum, random);
            var wanted = ((s + 1) * count / strata) - (s * count / strata);
            drawn.AddRange(stratum.GroupBy(r => (r.Layer, r.Field, r.Trace)).SelectMany(fibre => fibre.Select((r, turn) => (Reading: r, Turn: turn)))
                .OrderBy(pair => pair.Turn).Take(wanted).Select(pair => pair.Reading));
        }

        var sample = drawn.ToArray();
        Shuffle(sample, random);
        return [.. sample];
    }

    /// <summary>Every order equally likely; Fisher and Yates (1938), from memory.</summary>
    private static void Shuffle(AuditReading[] items, MersenneTwister random)
    {
        for (var i = items.Length - 1; i > 0; i--)
        {
            var j = random.Next(i + 1);
            (items[i], items[j]) = (items[j], items[i]);
        }
    }
}
