namespace FiberScope.Statistics.Tests;

public sealed class ComparisonOfMethodsTests
{
    // Bland and Altman (1986), The Lancet 327, 307-310, table of peak expiratory flow (l/min) by two meters, first readings.
    private static readonly double[] LargeMeter = [494, 395, 516, 434, 476, 557, 413, 442, 650, 433, 417, 656, 267, 478, 178, 423, 427];
    private static readonly double[] SmallMeter = [512, 430, 520, 428, 500, 600, 364, 380, 658, 445, 432, 626, 260, 477, 259, 350, 451];

    // Pearson (1901), Phil. Mag. 2, 559-572: the worked example of the line of closest fit.
    private static readonly double[] PearsonX = [0.0, 0.9, 1.8, 2.6, 3.3, 4.4, 5.2, 6.1, 6.5, 7.4];
    private static readonly double[] PearsonY = [5.9, 5.4, 4.4, 4.6, 3.5, 3.7, 2.8, 2.8, 2.4, 1.5];

    [Fact]
    public void Limits_of_agreement_are_those_of_the_paper()
    {
        var found = BlandAltman.Of(LargeMeter, SmallMeter);
        Assert.Equal(-2.1, found.Bias, 0.05);
        Assert.Equal(38.8, found.StandardDeviation, 0.05);
        // The paper works with 2 SD: limits -79.7 and 75.5.
        Assert.Equal(-79.7, found.Bias - (2 * found.StandardDeviation), 0.1);
        Assert.Equal(75.5, found.Bias + (2 * found.StandardDeviation), 0.1);
    }

    [Fact]
    public void The_line_of_closest_fit_is_that_of_the_worked_example()
    {
        var line = DemingRegression.Fit(PearsonX, PearsonY);
        Assert.Equal(-0.54556, line.Slope, 5e-5);
        Assert.Equal(5.78403, line.Intercept, 5e-5);
        Assert.True(line.SlopeInterval95.Contains(line.Slope));
    }

    [Fact]
    public void Swapping_the_methods_inverts_the_slope()
    {
        var there = DemingRegression.Fit(PearsonX, PearsonY, 2);
        var back = DemingRegression.Fit(PearsonY, PearsonX, 0.5);
        Assert.Equal(1, there.Slope * back.Slope, 1e-9);
    }

    [Fact]
    public void Points_without_a_trend_are_refused() =>
        Assert.Throws<ArgumentException>(() => DemingRegression.Fit([1, 1, 1], [1, 2, 3]));
}
