using CsCheck;
using UnitsNet;
using static FiberScope.Conformity.Tests.VerdictTests;

namespace FiberScope.Conformity.Tests;

public sealed class WayToDecideTests
{
    [Fact]
    public void The_needed_uncertainty_is_the_distance_over_the_normal_quantile()
    {
        // 0.10 below the limit at 5 %: 0.10 / 1.6449 = 0.0608 (normal table).
        var way = Verdict.On(AtMost(2.0), Found(1.9, 0.1)).WayToDecide!;
        Assert.Equal(0.0608, Characteristic.MeanDiameter.In(way.NeededStandardUncertainty!), tolerance: 0.0001);
        Assert.Equal(Decision.Pass, way.Outcome);
    }

    [Fact]
    public void Outside_the_limit_less_uncertainty_leads_to_a_fail() =>
        Assert.Equal(Decision.Fail, Verdict.On(AtMost(2.0), Found(2.1, 0.1)).WayToDecide!.Outcome);

    [Fact]
    public void The_fields_asked_for_decide_and_one_fewer_would_not()
    {
        var sampling = new SamplingShare(Length.FromMicrometers(0.09), 5);
        var found = Found(1.9, 0.1) with { Sampling = sampling, DegreesOfFreedom = 6.1 };
        var fields = Verdict.On(AtMost(2.0), found).WayToDecide!.FieldsNeeded!.Value;
        Assert.Equal(Decision.Pass, WithFields(fields).Decision);
        Assert.Equal(Decision.Undecided, WithFields(fields - 1).Decision);

        Verdict WithFields(int count)
        {
            var variable = 0.09 * 0.09 * 5 / count;
            var lasting = (0.1 * 0.1) - (0.09 * 0.09);
            var freedom = (count - 1) * Math.Pow((lasting + variable) / variable, 2);
            return Verdict.On(AtMost(2.0), Found(1.9, Math.Sqrt(lasting + variable)) with { DegreesOfFreedom = freedom });
        }
    }

    [Fact]
    public void Where_scale_alone_is_too_uncertain_more_fields_are_not_promised()
    {
        var found = Found(1.99, 0.1) with { Sampling = new SamplingShare(Length.FromMicrometers(0.02), 5) };
        var way = Verdict.On(AtMost(2.0), found).WayToDecide!;
        Assert.Null(way.FieldsNeeded);
        Assert.Contains("more fields alone cannot", way.Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void A_value_on_the_limit_is_decided_by_no_measurement() =>
        Assert.Null(Verdict.On(AtMost(2.0), Found(2.0, 0.1) with { ModelBand = (Length.FromMicrometers(1.9), Length.FromMicrometers(2.1)) }).WayToDecide!.NeededStandardUncertainty);

    [Fact]
    public void Risks_lie_between_zero_and_one_and_the_needed_uncertainty_decides() =>
        Gen.Select(Gen.Double[0.1, 5], Gen.Double[0.001, 2], Gen.Double[0.2, 2], Gen.Double[2.1, 4], Gen.Double[0.01, 0.4])
            .Sample((value, uncertainty, low, high, risk) =>
            {
                var limit = new Limit(Characteristic.MeanDiameter, Length.FromMicrometers(low), Length.FromMicrometers(high)) { MaximumRisk = risk };
                var verdict = Verdict.On(limit, Found(value, uncertainty));
                Assert.InRange(verdict.ConsumersRisk, 0, 1);
                Assert.Equal(1, verdict.ConsumersRisk + verdict.ProducersRisk, tolerance: 1e-12);
                if (verdict.WayToDecide is { NeededStandardUncertainty: { } needed } way)
                {
                    Assert.Equal(way.Outcome, Verdict.On(limit, new ObservedValue(Length.FromMicrometers(value), needed)).Decision);
                }
            });
}
