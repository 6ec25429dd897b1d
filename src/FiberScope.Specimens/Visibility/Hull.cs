using System.Collections.Immutable;

namespace FiberScope.Specimens.Visibility;

/// <summary>The convex hull of points (Andrew's monotone chain, 1979; from memory).</summary>
internal static class Hull
{
    public static ImmutableArray<(double X, double Y)> Of(IEnumerable<(double X, double Y)> points)
    {
        var sorted = points.Distinct().OrderBy(p => p.X).ThenBy(p => p.Y).ToArray();
        return sorted.Length < 3 ? [.. sorted] : [.. Half(sorted), .. Half(Enumerable.Reverse(sorted))];
    }

    private static IEnumerable<(double X, double Y)> Half(IEnumerable<(double X, double Y)> points)
    {
        var chain = new List<(double X, double Y)>();
        foreach (var point in points)
        {
            while (chain.Count >= 2 && Cross(chain[^2], chain[^1], point) <= 0)
            {
                chain.RemoveAt(chain.Count - 1);
            }

            chain.Add(point);
        }

        return chain.SkipLast(1);
    }

    private static double Cross((double X, double Y) o, (double X, double Y) a, (double X, double Y) b) =>
        ((a.X - o.X) * (b.Y - o.Y)) - ((a.Y - o.Y) * (b.X - o.X));
}
