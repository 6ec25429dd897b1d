using MathNet.Numerics.Random;

namespace FiberScope.Statistics;

/// <summary>Resampling of clustered values, for intervals of any figure.</summary>
public static class ClusterBootstrap
{
    /// <summary>Draws weights for every value: outer clusters are drawn with replacement, then inner clusters inside them.</summary>
    /// <param name="outer">For each value the outer cluster (field), any integers.</param>
    /// <param name="inner">For each value the inner cluster (fibre) inside its outer one, any integers.</param>
    /// <param name="replicates">How many draws, at least 1.</param>
    /// <param name="seed">The seed; the same seed gives the same draws.</param>
    /// <param name="visit">
    /// Called once a draw with, for each value, how often it was drawn (0 or more). The array is reused: copy what you keep.
    /// </param>
    /// <remarks>
    /// When there is one outer cluster, or inner clusters vary most, both stages matter; drawing both keeps the variance between
    /// outer clusters a little too large rather than too small. Source: Davison and Hinkley (1997), Bootstrap Methods and their
    /// Application, section 3.8 (from memory).
    /// </remarks>
    public static void Draw(ReadOnlySpan<int> outer, ReadOnlySpan<int> inner, int replicates, int seed, Action<int[]> visit)
    {
        var fields = Group(outer, inner);
        var random = new Xoshiro256StarStar(seed, threadSafe: false);
        var counts = new int[outer.Length];
        for (var r = 0; r < replicates; r++)
        {
            Array.Clear(counts);
            for (var f = 0; f < fields.Length; f++)
            {
                var fibres = fields[random.Next(fields.Length)];
                for (var k = 0; k < fibres.Length; k++)
                {
                    foreach (var i in fibres[random.Next(fibres.Length)])
                    {
                        counts[i]++;
                    }
                }
            }

            visit(counts);
        }
    }

    private static int[][][] Group(ReadOnlySpan<int> outer, ReadOnlySpan<int> inner)
    {
        var tree = new SortedDictionary<int, SortedDictionary<int, List<int>>>();
        for (var i = 0; i < outer.Length; i++)
        {
            if (!tree.TryGetValue(outer[i], out var fibres))
            {
                tree[outer[i]] = fibres = [];
            }

            if (!fibres.TryGetValue(inner[i], out var members))
            {
                fibres[inner[i]] = members = [];
            }

            members.Add(i);
        }

        return [.. tree.Values.Select(fibres => fibres.Values.Select(members => members.ToArray()).ToArray())];
    }
}
