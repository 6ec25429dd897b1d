using System.Collections.Immutable;
using FiberScope.Statistics;

namespace FiberScope.Filtration.Cell;

/// <summary>One axis of a table: its nodes, and the stretched coordinate ln(x + offset) in which values vary evenly.</summary>
public sealed class TableAxis
{
    private readonly double[] _coordinates;

    /// <summary>Makes an axis.</summary>
    /// <param name="name">What the axis is.</param>
    /// <param name="offset">Added before the logarithm, so that an axis may begin at zero; 0 or above.</param>
    /// <param name="nodes">Where values are known, ascending; at least four.</param>
    /// <exception cref="ArgumentException">There are fewer than four nodes, or they do not ascend.</exception>
    public TableAxis(string name, double offset, ImmutableArray<double> nodes)
    {
        if (nodes.Length < 4 || !nodes.Zip(nodes.Skip(1)).All(pair => pair.First < pair.Second))
        {
            throw new ArgumentException("An axis needs at least four ascending nodes.", nameof(nodes));
        }

        Name = name;
        Offset = Require.NotNegative(offset);
        Nodes = nodes;
        _coordinates = [.. nodes.Select(x => Math.Log(x + offset))];
    }

    /// <summary>What the axis is.</summary>
    public string Name { get; }

    /// <summary>Added before the logarithm.</summary>
    public double Offset { get; }

    /// <summary>Where values are known, ascending.</summary>
    public ImmutableArray<double> Nodes { get; }

    /// <summary>The four nodes around <paramref name="x"/> and their Lagrange weights; outside the nodes the nearest end is taken.</summary>
    public AxisWeights Cubic(double x)
    {
        var u = Math.Log(Math.Clamp(x, Nodes[0], Nodes[^1]) + Offset);
        var first = Math.Clamp(Interval(u) - 1, 0, _coordinates.Length - 4);
        var (a, b, c, d) = (_coordinates[first], _coordinates[first + 1], _coordinates[first + 2], _coordinates[first + 3]);
        var (ua, ub, uc, ud) = (u - a, u - b, u - c, u - d);
        return new AxisWeights(
            first,
            ub * uc * ud / ((a - b) * (a - c) * (a - d)),
            ua * uc * ud / ((b - a) * (b - c) * (b - d)),
            ua * ub * ud / ((c - a) * (c - b) * (c - d)),
            ua * ub * uc / ((d - a) * (d - b) * (d - c)));
    }

    /// <summary>The two nodes around <paramref name="x"/> and their linear weights; outside the nodes the nearest end is taken.</summary>
    public AxisWeights Linear(double x)
    {
        var u = Math.Log(Math.Clamp(x, Nodes[0], Nodes[^1]) + Offset);
        var k = Interval(u);
        var share = (u - _coordinates[k]) / (_coordinates[k + 1] - _coordinates[k]);
        return new AxisWeights(k, 1 - share, share, 0, 0);
    }

    private int Interval(double u)
    {
        var found = Array.BinarySearch(_coordinates, u);
        return Math.Clamp(found >= 0 ? found : ~found - 1, 0, _coordinates.Length - 2);
    }
}
