using CsCheck;
using MathNet.Numerics.Statistics;

namespace FiberScope.Statistics.Tests;

public sealed class WeightedSampleTests
{
    // MathNet.Numerics is the general-purpose reference library here.
    private static readonly Gen<double[]> Values = Gen.Double[0.1, 100].Array[2, 40];

    [Fact]
    public void Mean_and_deviation_match_the_values_NIST_certifies()
    {
        // NIST Statistical Reference Datasets, univariate summary statistics, NumAcc1: mean 10000002, SD (n - 1) 1.
        var sample = WeightedSample.Even([10000001, 10000003, 10000002]);
        Assert.Equal(10000002, sample.Mean);
        Assert.Equal(1, sample.StandardDeviation * Math.Sqrt(3.0 / 2), 1e-12);
    }

    [Fact]
    public void Quantiles_of_equal_weights_are_definition_five() =>
        Gen.Select(Values, Gen.Double[0, 1]).Sample((values, p) =>
            Assert.Equal(values.QuantileCustom(p, QuantileDefinition.R5), WeightedSample.Even(values).Quantile(p), 1e-9));

    [Fact]
    public void Geometric_mean_matches_the_reference_library() =>
        Values.Sample(values => Assert.Equal(values.GeometricMean(), WeightedSample.Even(values).GeometricMean, 1e-9));

    [Fact]
    public void A_weight_of_two_counts_like_two_values() =>
        Gen.Select(Values, Gen.Double[0.1, 100]).Sample((values, extra) =>
        {
            var doubled = WeightedSample.Even([.. values, extra, extra]);
            var weighted = new WeightedSample([.. values, extra], [.. values.Select(_ => 1.0), 2.0]);
            Assert.Equal(doubled.Mean, weighted.Mean, 1e-9);
            Assert.Equal(doubled.StandardDeviation, weighted.StandardDeviation, 1e-6);
        });

    [Fact]
    public void The_order_of_the_input_changes_no_digit() =>
        Values.Sample(values => Assert.Equal(WeightedSample.Even(values).Mean, WeightedSample.Even([.. values.Reverse()]).Mean));

    [Fact]
    public void Equal_weights_have_as_many_effective_values_as_values() =>
        Assert.Equal(4, WeightedSample.Even([1, 2, 3, 9]).EffectiveCount, 1e-12);

    [Theory]
    [InlineData(double.NaN, 1)]
    [InlineData(1, 0)]
    [InlineData(1, -1)]
    [InlineData(1, double.PositiveInfinity)]
    public void Numbers_that_mean_nothing_are_refused(double value, double weight) =>
        Assert.Throws<ArgumentException>(() => new WeightedSample([value], [weight]));

    [Fact]
    public void Nothing_at_all_is_refused() => Assert.Throws<ArgumentException>(() => WeightedSample.Even([]));

    [Fact]
    public void A_sample_is_no_distance_from_itself() =>
        Values.Sample(values => Assert.Equal(0, KolmogorovSmirnov.Distance(WeightedSample.Even(values), WeightedSample.Even(values))));

    [Fact]
    public void Samples_that_do_not_overlap_are_wholly_apart() =>
        Assert.Equal(1, KolmogorovSmirnov.Distance(WeightedSample.Even([1, 2]), WeightedSample.Even([3, 4])), 1e-12);
}
