using System.Numerics;

namespace FiberScope.Validation.Filtration.Reference;

/// <summary>A linear system with a symmetric band, solved directly without exchange of rows.</summary>
/// <remarks>The systems here come from flux balances and are (nearly) diagonally dominant; the caller checks the residual.</remarks>
internal sealed class BandedSystem(int size, int halfBand)
{
    private readonly int _width = (2 * halfBand) + 1;
    private readonly double[] _band = new double[size * ((2 * halfBand) + 1)];

    /// <summary>The right-hand side; holds the solution after <see cref="Solve"/>.</summary>
    public double[] RightHandSide { get; } = new double[size];

    /// <summary>Adds to one entry of the matrix.</summary>
    public void Add(int row, int column, double value) => _band[(row * _width) + halfBand + column - row] += value;

    /// <summary>Eliminates and substitutes in place; the matrix is spent afterwards.</summary>
    public double[] Solve()
    {
        for (var pivot = 0; pivot < size; pivot++)
        {
            Eliminate(pivot);
        }

        for (var row = size - 1; row >= 0; row--)
        {
            var start = (row * _width) + halfBand;
            var reach = Math.Min(halfBand, size - 1 - row);
            var sum = RightHandSide[row];
            for (var k = 1; k <= reach; k++)
            {
                sum -= _band[start + k] * RightHandSide[row + k];
            }

            RightHandSide[row] = sum / _band[start];
        }

        return RightHandSide;
    }

    private void Eliminate(int pivot)
    {
        var reach = Math.Min(halfBand, size - 1 - pivot);
        var source = _band.AsSpan((pivot * _width) + halfBand + 1, reach);
        var diagonal = _band[(pivot * _width) + halfBand];
        for (var k = 1; k <= reach; k++)
        {
            var row = pivot + k;
            var at = (row * _width) + halfBand - k;
            if (_band[at] == 0)
            {
                continue;
            }

            var factor = _band[at] / diagonal;
            Subtract(_band.AsSpan(at + 1, reach), source, factor);
            RightHandSide[row] -= factor * RightHandSide[pivot];
        }
    }

    private static void Subtract(Span<double> target, ReadOnlySpan<double> source, double factor)
    {
        var lanes = Vector<double>.Count;
        var multiplier = new Vector<double>(factor);
        var i = 0;
        for (; i <= source.Length - lanes; i += lanes)
        {
            (new Vector<double>(target[i..]) - (multiplier * new Vector<double>(source[i..]))).CopyTo(target[i..]);
        }

        for (; i < source.Length; i++)
        {
            target[i] -= factor * source[i];
        }
    }
}
