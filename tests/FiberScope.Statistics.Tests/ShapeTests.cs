using MathNet.Numerics.Distributions;

namespace FiberScope.Statistics.Tests;

public sealed class ShapeTests
{
    [Fact]
    public void A_log_normal_sample_is_called_log_normal_and_one_hump()
    {
        var found = ShapeComparison.Of(WeightedSample.Even(Quantiles(2, 1.6, 800)), 300);
        Assert.Equal(ShapeFamily.LogNormal, found.Ranked[0].Family);
        Assert.False(found.IsBimodal);
        Assert.Equal(2, found.LogNormal.Parts[0].Location, 0.01);
        Assert.Equal(1.6, found.LogNormal.Parts[0].Spread, 0.01);
    }

    [Fact]
    public void Two_well_separated_parts_are_found_where_they_are()
    {
        double[] values = [.. Quantiles(1, 1.3, 700), .. Quantiles(8, 1.3, 300)];
        var found = ShapeComparison.Of(WeightedSample.Even(values), 200);
        Assert.True(found.IsBimodal);
        Assert.Equal(0.7, found.TwoLogNormals!.Parts[0].Fraction, 0.01);
        Assert.Equal(1, found.TwoLogNormals.Parts[0].Location, 0.02);
        Assert.Equal(8, found.TwoLogNormals.Parts[1].Location, 0.1);
    }

    [Fact]
    public void The_same_two_parts_are_not_called_on_a_handful_of_fibres()
    {
        double[] values = [.. Quantiles(1, 1.3, 700), .. Quantiles(8, 1.3, 300)];
        Assert.False(ShapeComparison.Of(WeightedSample.Even(values), 6).IsBimodal);
    }

    [Fact]
    public void A_normal_sample_is_called_normal()
    {
        double[] values = [.. Enumerable.Range(0, 500).Select(i => Normal.InvCDF(10, 2.5, (i + 0.5) / 500))];
        Assert.Equal(ShapeFamily.Normal, ShapeComparison.Of(WeightedSample.Even(values), 400).Ranked[0].Family);
    }

    [Fact]
    public void Equal_values_have_no_shape() =>
        Assert.Throws<ArgumentException>(() => ShapeComparison.Of(WeightedSample.Even([2, 2, 2]), 3));

    private static double[] Quantiles(double median, double spread, int count) =>
        [.. Enumerable.Range(0, count).Select(i => LogNormal.InvCDF(Math.Log(median), Math.Log(spread), (i + 0.5) / count))];
}
