namespace FiberScope.Filtration.Passage;

/// <summary>Lagrange's interpolation: the weights of known points at one abscissa.</summary>
internal static class Lagrange
{
    /// <summary>The weights of the values at <paramref name="nodes"/> for the polynomial through all of them at <paramref name="x"/>; they sum to one.</summary>
    public static double[] Weights(double[] nodes, double x)
    {
        var weights = new double[nodes.Length];
        for (var i = 0; i < nodes.Length; i++)
        {
            weights[i] = 1;
            for (var j = 0; j < nodes.Length; j++)
            {
                if (j != i)
                {
                    weights[i] *= (x - nodes[j]) / (nodes[i] - nodes[j]);
                }
            }
        }

        return weights;
    }
}
