namespace FiberScope.Imaging.Edges;

/// <summary>The normal density and its integral, tabulated: they are asked for tens of millions of times a picture.</summary>
internal static class GaussianTable
{
    private const double Reach = 6;
    private const int PerUnit = 256;

    private static readonly double[] Densities = [.. Places().Select(z => Math.Exp(-0.5 * z * z) / Math.Sqrt(2 * Math.PI))];
    private static readonly double[] Shares = [.. Places().Select(z => MathNet.Numerics.Distributions.Normal.CDF(0, 1, z))];

    /// <summary>The standard normal density at z.</summary>
    public static double Density(double z) => Look(Densities, z, 0);

    /// <summary>The standard normal share below z.</summary>
    public static double Share(double z) => Look(Shares, z, 1);

    private static IEnumerable<double> Places() => Enumerable.Range(0, (int)(2 * Reach * PerUnit) + 2).Select(i => (i / (double)PerUnit) - Reach);

    private static double Look(double[] table, double z, double above)
    {
        if (z <= -Reach)
        {
            return 0;
        }

        if (z >= Reach)
        {
            return above;
        }

        var place = (z + Reach) * PerUnit;
        var index = (int)place;
        return table[index] + ((place - index) * (table[index + 1] - table[index]));
    }
}
