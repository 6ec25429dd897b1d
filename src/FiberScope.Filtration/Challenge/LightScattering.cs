using System.Numerics;
using FiberScope.Statistics;

namespace FiberScope.Filtration;

/// <summary>Light scattered by a sphere that does not absorb.</summary>
public static class LightScattering
{
    /// <summary>Q_sca, scattered light over geometric cross-section.</summary>
    /// <param name="sizeParameter">x = π d / wavelength; dimensionless, above zero, below about 1000.</param>
    /// <param name="refractiveIndex">m, real; above 0.</param>
    /// <returns>Q_sca; dimensionless.</returns>
    /// <remarks>Mie's series with the logarithmic derivative by downward recurrence; Bohren and Huffman (1983), eqs. 4.61, 4.88, 4.89 (from memory).</remarks>
    public static double Efficiency(double sizeParameter, double refractiveIndex)
    {
        var x = Require.Inside(sizeParameter, 0, 2000);
        var m = Require.Positive(refractiveIndex);
        var last = (int)Math.Ceiling(x + (4 * Math.Cbrt(x)) + 2);
        var derivative = LogarithmicDerivative(m * x, last);
        var (psi0, psi1, chi0, chi1) = (Math.Cos(x), Math.Sin(x), -Math.Sin(x), Math.Cos(x));
        var sum = 0.0;
        for (var n = 1; n <= last; n++)
        {
            var psi = (((2 * n) - 1) * psi1 / x) - psi0;
            var chi = (((2 * n) - 1) * chi1 / x) - chi0;
            var (xi, xi1) = (new Complex(psi, -chi), new Complex(psi1, -chi1));
            var electric = (derivative[n] / m) + (n / x);
            var magnetic = (derivative[n] * m) + (n / x);
            var a = ((electric * psi) - psi1) / ((electric * xi) - xi1);
            var b = ((magnetic * psi) - psi1) / ((magnetic * xi) - xi1);
            sum += ((2 * n) + 1) * ((a.Magnitude * a.Magnitude) + (b.Magnitude * b.Magnitude));
            (psi0, psi1, chi0, chi1) = (psi1, psi, chi1, chi);
        }

        return 2 * sum / (x * x);
    }

    private static double[] LogarithmicDerivative(double argument, int last)
    {
        var from = Math.Max(last, (int)Math.Ceiling(argument)) + 15;
        var derivative = new double[from + 1];
        for (var n = from; n > 0; n--)
        {
            var share = n / argument;
            derivative[n - 1] = share - (1 / (derivative[n] + share));
        }

        return derivative;
    }
}
