using System.Runtime.CompilerServices;

namespace FiberScope.Imaging.Edges;

/// <summary>The normal density and its integral, tabulated: they are asked for tens of millions of times a picture.</summary>
internal static class GaussianTable
{
    /// <summary>Beyond so many standard deviations nothing is left.</summary>
    public const double Reach = 5;
    private const int PerUnit = 200;

    // Share and density side by side: one place in memory for both.
    private static readonly double[] Table = Fill();

    /// <summary>The standard normal share below z and the density at z, each right to 1e-5.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static (double Share, double Density) At(double z)
    {
        if (!(z > -Reach))
        {
            return (0, 0);
        }

        if (z >= Reach)
        {
            return (1, 0);
        }

        unchecked
        {
            var place = (z + Reach) * PerUnit;
            var index = (int)place;
            var part = place - index;
            var four = Table.AsSpan(2 * index, 4);
            return (four[0] + (part * (four[2] - four[0])), four[1] + (part * (four[3] - four[1])));
        }
    }

    private static double[] Fill()
    {
        var count = (int)(2 * Reach * PerUnit) + 2;
        var table = new double[2 * count];
        for (var i = 0; i < count; i++)
        {
            var z = (i / (double)PerUnit) - Reach;
            table[2 * i] = MathNet.Numerics.Distributions.Normal.CDF(0, 1, z);
            table[(2 * i) + 1] = MathNet.Numerics.Distributions.Normal.PDF(0, 1, z);
        }

        return table;
    }
}
