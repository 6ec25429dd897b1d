using System.Globalization;
using UnitsNet;
using static FiberScope.Conformity.Tests.VerdictTests;

namespace FiberScope.Conformity.Tests;

public sealed class GradeTests
{
    private static readonly Grade Grade = new("invented grade", [AtMost(2.0), new Limit(Characteristic.PressureDrop, null, Pressure.FromPascals(60))]);

    [Theory]
    [InlineData(1.5, 40, Decision.Pass)]
    [InlineData(1.99, 40, Decision.Undecided)]
    [InlineData(2.5, 40, Decision.Fail)]
    [InlineData(2.5, 59, Decision.Fail)]
    [InlineData(1.5, 59, Decision.Undecided)]
    public void A_broken_limit_fails_the_grade_and_an_open_one_leaves_it_open(double micrometres, double pascals, Decision decision) =>
        Assert.Equal(decision, Judge(micrometres, pascals).Decision);

    [Fact]
    public void A_pass_that_rests_on_a_forecast_says_so() =>
        Assert.Contains("only the standard's own test decides", Judge(1.5, 40).Sentence, StringComparison.Ordinal);

    [Fact]
    public void A_fail_on_a_measured_limit_rests_on_no_forecast() =>
        Assert.False(Judge(2.5, 40).RestsOnForecast);

    [Fact]
    public void The_risk_of_the_whole_is_at_most_the_sum_of_the_parts()
    {
        var verdict = Judge(1.9, 52);
        Assert.Equal(verdict.Verdicts.Sum(v => v.ConsumersRisk), verdict.HighestConsumersRisk, tolerance: 1e-12);
    }

    [Fact]
    public void Limits_without_a_bound_or_upside_down_are_refused()
    {
        Assert.Throws<ArgumentException>(() => new Limit(Characteristic.MeanDiameter, null, null));
        Assert.Throws<ArgumentException>(() => new Limit(Characteristic.MeanDiameter, Length.FromMicrometers(2), Length.FromMicrometers(1)));
        Assert.Throws<ArgumentException>(() => new Limit(Characteristic.MeanDiameter, null, Pressure.FromPascals(1)));
        Assert.Throws<ArgumentException>(() => new Grade("empty", []));
    }

    [Fact]
    public void Every_characteristic_is_found_by_its_key_and_prints_the_same_in_German()
    {
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo("de-DE");
            Assert.All(Characteristic.Known, c => Assert.Same(c, Characteristic.Find(c.Key)));
            Assert.Equal(Characteristic.Known.Length, Characteristic.Known.Select(c => c.Key).Distinct(StringComparer.Ordinal).Count());
            Assert.Equal("1.834 µm", Characteristic.MeanDiameter.Format(Length.FromNanometers(1834.2)));
            Assert.Equal("2.5 %", Characteristic.PenetrationAtMpps.Format(Ratio.FromDecimalFractions(0.025)));
            Assert.Equal("1.2E-5 %", Characteristic.PenetrationAtMpps.Format(Ratio.FromPercent(0.000012)));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Names_and_bounds_read_as_people_write_them()
    {
        var limit = new Limit(Characteristic.PenetrationAtSize, null, Ratio.FromPercent(3)) { Particle = Length.FromNanometers(300) };
        Assert.Equal("penetration at 0.3 µm", limit.Name);
        Assert.Equal("at most 3 %", limit.Bounds);
        Assert.Equal("1.5 µm to 2.1 µm", new Limit(Characteristic.MeanDiameter, Length.FromMicrometers(1.5), Length.FromMicrometers(2.1)).Bounds);
    }

    private static GradeVerdict Judge(double micrometres, double pascals) => Grade.Judge(limit => limit.Characteristic == Characteristic.MeanDiameter
        ? Found(micrometres, 0.08)
        : new ObservedValue(Pressure.FromPascals(pascals), Pressure.FromPascals(4)));
}
