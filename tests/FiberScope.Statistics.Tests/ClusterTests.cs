using CsCheck;
using MathNet.Numerics.Statistics;

namespace FiberScope.Statistics.Tests;

public sealed class ClusterTests
{
    [Fact]
    public void Clusters_of_one_give_the_usual_standard_error() =>
        Gen.Double[0, 10].Array[3, 30].Sample(values =>
        {
            var found = ClusteredMean.Of(values, [.. values.Select(_ => 1.0)], [.. Enumerable.Range(0, values.Length)]);
            Assert.Equal(values.StandardDeviation() / Math.Sqrt(values.Length), found.StandardError, 1e-9);
        });

    [Fact]
    public void Repeating_every_reading_inside_its_cluster_adds_no_certainty()
    {
        double[] values = [1, 2, 4, 7];
        var once = ClusteredMean.Of(values, [1, 1, 1, 1], [0, 1, 2, 3]);
        var twice = ClusteredMean.Of([.. values, .. values], [1, 1, 1, 1, 1, 1, 1, 1], [0, 1, 2, 3, 0, 1, 2, 3]);
        Assert.Equal(once.StandardError, twice.StandardError, 1e-12);
    }

    [Theory]
    [InlineData(1, 12.706)]
    [InlineData(4, 2.776)]
    [InlineData(10, 2.228)]
    [InlineData(double.PositiveInfinity, 1.960)]
    public void Students_factor_is_that_of_the_tables(double freedom, double factor) =>
        // Any table of Student's t, two-sided 95 %; for example GUM, table G.2 (95 % column).
        Assert.Equal(factor, ClusteredMean.StudentFactor95(freedom), 5e-4);

    [Fact]
    public void The_same_seed_gives_the_same_draws() => Assert.Equal(Draws(3), Draws(3));

    [Fact]
    public void Another_seed_gives_other_draws() => Assert.NotEqual(Draws(3), Draws(4));

    [Fact]
    public void Estimates_that_agree_are_averaged_by_their_weights()
    {
        // Weighted mean and its uncertainty worked by hand: weights 1 and 1/4.
        var found = AgreedEstimate.Of([10, 12], [1, 2]);
        Assert.Equal(10.4, found.Value, 1e-12);
        Assert.Equal(Math.Sqrt(0.8), found.StandardUncertainty, 1e-12);
        Assert.True(found.Agrees);
    }

    [Fact]
    public void A_quarrel_widens_the_result_and_is_named()
    {
        var found = AgreedEstimate.Of([10, 10.1, 14], [0.1, 0.1, 0.1]);
        Assert.False(found.Agrees);
        Assert.Equal(2, found.FurthestOff);
        Assert.True(found.StandardUncertainty > 0.5);
    }

    private static string Draws(int seed)
    {
        var draws = new List<string>();
        ClusterBootstrap.Draw([0, 0, 1, 1], [0, 1, 0, 1], 5, seed, counts => draws.Add(string.Join(' ', counts)));
        return string.Join('|', draws);
    }
}
