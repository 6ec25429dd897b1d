using FiberScope.Statistics;

namespace FiberScope.Fibres.Tests;

/// <summary>The closed form for straight random fibres beside fibres thrown here.</summary>
public sealed class RandomMatTests
{
    [Theory]
    [InlineData(0.4, 6)]
    [InlineData(0.4, 24)]
    [InlineData(0.7, 12)]
    public void The_spread_of_cover_is_that_of_fibres_thrown_at_random(double cover, double side)
    {
        const double diameter = 3;
        var expected = RandomMat.CoverDeviation(cover, WeightedSample.Even([diameter, diameter]), side);
        Assert.Equal(expected, Thrown(cover, diameter, side, windows: 1500), 0.06 * expected);
    }

    [Fact]
    public void A_tiny_window_is_covered_or_not() =>
        Assert.Equal(Math.Sqrt(0.3 * 0.7), RandomMat.CoverDeviation(0.3, WeightedSample.Even([5.0, 5.0]), 0.01), 0.003);

    [Fact]
    public void Larger_windows_are_more_alike()
    {
        double[] spreads = [.. new[] { 2.0, 8, 32, 128 }.Select(side => RandomMat.CoverDeviation(0.5, WeightedSample.Even([3.0, 5.0]), side))];
        Assert.Equal(spreads.OrderDescending(), spreads);
    }

    /// <summary>Covers of single windows: lines at random that meet the circle about the window, widened; a grid of points is looked at.</summary>
    private static double Thrown(double cover, double diameter, double side, int windows)
    {
        const int grid = 12;
        uint state = 12345;
        double Next()
        {
            state = unchecked((state * 1664525) + 1013904223);
            return state / 4294967296.0;
        }

        var reach = (side / Math.Sqrt(2)) + diameter;
        var mean = -Math.Log(1 - cover) / diameter * 2 * reach;
        var covers = new double[windows];
        for (var w = 0; w < windows; w++)
        {
            var hit = new bool[grid * grid];
            for (var t = -Math.Log(1 - Next()); t < mean; t -= Math.Log(1 - Next()))
            {
                var (sin, cos) = Math.SinCos(Math.PI * Next());
                var offset = ((2 * Next()) - 1) * reach;
                for (var i = 0; i < hit.Length; i++)
                {
                    var (x, y) = ((((i % grid) + 0.5) / grid * side) - (side / 2), (((i / grid) + 0.5) / grid * side) - (side / 2));
                    hit[i] |= Math.Abs((x * cos) + (y * sin) - offset) < diameter / 2;
                }
            }

            covers[w] = hit.Count(h => h) / (double)hit.Length;
        }

        return WeightedSample.Even(covers).StandardDeviation;
    }
}
