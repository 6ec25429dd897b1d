using MathNet.Numerics.LinearAlgebra;

namespace FiberScope.Filtration.Passage;

/// <summary>Places of unlike basis weight that share the air of a layer at the same pressure drop.</summary>
/// <remarks>
/// Local weight w (mean 1) is gamma-distributed with coefficient of variation c; solidity is the same everywhere, so thin places are
/// open: u ∝ 1/w. Seen by the air, w is again gamma, with one less in its shape 1/c², and the mean of 1/w is 1/(1 − c²): the layer's
/// resistance is lower by 1 − c² than that of an even one. The places are the nodes of a Gauss–Laguerre rule for that distribution, so
/// that the mean over the air of exp(−K w) is right. Bonds that close a share b of the area speed the air up by 1/(1 − b).
/// </remarks>
internal sealed class Places
{
    private const int Nodes = 16;
    private const double LeastShare = 1e-10;

    private Places(double[] weights, double[] flowShares, double variation, double bonded)
    {
        RelativeWeights = weights;
        FlowShares = flowShares;
        ResistanceFactor = (1 - (variation * variation)) / (1 - bonded);
        RelativeVelocities = Array.ConvertAll(weights, w => ResistanceFactor / w);
    }

    /// <summary>Basis weight of each place over the mean.</summary>
    public double[] RelativeWeights { get; }

    /// <summary>Share of the air that goes through each place; they sum to one.</summary>
    public double[] FlowShares { get; }

    /// <summary>Local velocity over the layer's mean velocity.</summary>
    public double[] RelativeVelocities { get; }

    /// <summary>Resistance over that of an even layer without bonds.</summary>
    public double ResistanceFactor { get; }

    public static Places Of(double variation, double bonded)
    {
        if (variation < 1e-3)
        {
            return new Places([1], [1], 0, bonded);
        }

        var shape = (1 / (variation * variation)) - 1;
        var rule = GaussLaguerre(shape - 1);
        var kept = rule.Where(n => n.Share > LeastShare).ToArray();
        var sum = kept.Sum(n => n.Share);
        return new Places(
            [.. kept.Select(n => n.Node * variation * variation)],
            [.. kept.Select(n => n.Share / sum)],
            variation,
            bonded);
    }

    /// <summary>Nodes and shares for the weight x^a e^−x, from the eigenvalues of its Jacobi matrix; Golub and Welsch (1969), from memory.</summary>
    private static (double Node, double Share)[] GaussLaguerre(double a)
    {
        var jacobi = Matrix<double>.Build.Dense(Nodes, Nodes);
        for (var i = 0; i < Nodes; i++)
        {
            jacobi[i, i] = (2 * i) + 1 + a;
            if (i > 0)
            {
                jacobi[i, i - 1] = jacobi[i - 1, i] = Math.Sqrt(i * (i + a));
            }
        }

        var evd = jacobi.Evd(Symmetricity.Symmetric);
        return [.. Enumerable.Range(0, Nodes).Select(i => (evd.EigenValues[i].Real, evd.EigenVectors[0, i] * evd.EigenVectors[0, i]))];
    }
}
