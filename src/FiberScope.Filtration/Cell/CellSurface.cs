namespace FiberScope.Filtration.Cell;

/// <summary>A table at one solidity and fibre Knudsen number: values over its two remaining axes.</summary>
public sealed class CellSurface
{
    private readonly TableAxis _rows;
    private readonly TableAxis _columns;
    private readonly double[] _values;

    internal CellSurface(TableAxis rows, TableAxis columns, double[] values) => (_rows, _columns, _values) = (rows, columns, values);

    /// <summary>The value between the nodes by cubic interpolation both ways; outside the nodes that of the nearest end.</summary>
    public double Smooth(double row, double column) => Sum(_rows.Cubic(row), _columns.Cubic(column));

    /// <summary>The value cubic along the rows and linear along the columns, for values that bend sharply along them.</summary>
    public double Kinked(double row, double column) => Sum(_rows.Cubic(row), _columns.Linear(column));

    private double Sum(AxisWeights rows, AxisWeights columns)
    {
        var width = _columns.Nodes.Length;
        var at = rows.First * width;
        return (rows.W0 * columns.Sum(_values, at, 1))
            + (rows.W1 * columns.Sum(_values, at + width, 1))
            + (rows.W2 * columns.Sum(_values, at + (2 * width), 1))
            + (rows.W3 * columns.Sum(_values, at + (3 * width), 1));
    }
}
