using FiberScope.Statistics;

namespace FiberScope.Fibres;

/// <summary>A mat of long straight fibres laid at random in a plane: what chance alone makes of its evenness.</summary>
public static class RandomMat
{
    private const int Turns = 24, Steps = 48;

    /// <summary>The standard deviation of the cover of square windows.</summary>
    /// <param name="cover">C, the mean cover; dimensionless, in (0, 1).</param>
    /// <param name="diameters">The fibres' diameters, length-weighted; any unit.</param>
    /// <param name="side">The window's side, in the same unit; above zero.</param>
    /// <remarks>
    /// For a Poisson process of lines with length L per area, widened to diameters d, two points a distance r apart are both open with
    /// probability (1 − C)² exp(L ⟨(d − r |sin θ|)₊⟩) over directions θ and diameters, where L ⟨d⟩ = −ln(1 − C) (the Boolean model;
    /// G. Matheron 1975, Random Sets and Integral Geometry, from memory). The variance of a window's cover is the mean of that covariance
    /// over pairs of points in it, whose differences (x, y) have the density (1 − |x|/s)(1 − |y|/s) / s².
    /// </remarks>
    public static double CoverDeviation(double cover, WeightedSample diameters, double side)
    {
        ArgumentNullException.ThrowIfNull(diameters);
        Require.Inside(cover, 0, 1, nameof(cover));
        Require.Positive(side, nameof(side));
        double[] widths = [.. Enumerable.Range(0, 9).Select(i => diameters.Quantile((i + 0.5) / 9))];
        var lengthPerArea = -Math.Log(1 - cover) / widths.Average();
        var sum = 0.0;
        for (var i = 0; i < Steps; i++)
        {
            for (var j = 0; j < Steps; j++)
            {
                // Squared places crowd the steps where the covariance is steep, near no distance at all.
                var (u, v) = ((i + 0.5) / Steps, (j + 0.5) / Steps);
                var (x, y) = (u * u, v * v);
                var density = 4 * (1 - x) * (1 - y) * (2 * u) * (2 * v) / (Steps * Steps);
                sum += density * (Math.Exp(lengthPerArea * Shared(widths, side * Math.Sqrt((x * x) + (y * y)))) - 1);
            }
        }

        return (1 - cover) * Math.Sqrt(sum);
    }

    private static double Shared(double[] widths, double distance)
    {
        var sum = 0.0;
        for (var t = 0; t < Turns; t++)
        {
            var across = distance * Math.Sin((t + 0.5) * Math.PI / 2 / Turns);
            foreach (var width in widths)
            {
                sum += Math.Max(0, width - across);
            }
        }

        return sum / Turns / widths.Length;
    }
}
