using UnitsNet;

namespace FiberScope.Conformity.Tests;

/// <summary>
/// Check values: JCGM 106:2012, section 7, table 1 and its Zener diode example (from memory); the tables of the normal law and of
/// Student's t in the NIST/SEMATECH e-Handbook of Statistical Methods, sections 1.3.6.7.1 and 1.3.6.7.2.
/// </summary>
public sealed class VerdictTests
{
    [Theory]
    [InlineData(0.84, 0.80)]
    [InlineData(1.28, 0.90)]
    [InlineData(1.645, 0.95)]
    [InlineData(2.326, 0.99)]
    [InlineData(3.09, 0.999)]
    public void Conformance_probabilities_match_the_table_of_JCGM_106(double uncertaintiesFromLimit, double conformance)
    {
        var verdict = Verdict.On(AtMost(2.0), Found(2.0 - (uncertaintiesFromLimit * 0.05), 0.05));
        Assert.Equal(conformance, 1 - verdict.ConsumersRisk, tolerance: 0.0006);
    }

    /// <summary>JCGM 106:2012: a breakdown voltage of −5.47 with u = 0.05 against an upper limit of −5.40 conforms with 0.92.</summary>
    [Fact]
    public void The_diode_of_JCGM_106_conforms_with_its_published_probability()
    {
        var limit = new Limit(Characteristic.MostPenetratingSize, null, Length.FromMicrometers(-5.40));
        var verdict = Verdict.On(limit, Found(-5.47, 0.05));
        Assert.Equal(0.92, 1 - verdict.ConsumersRisk, tolerance: 0.005);
    }

    [Theory]
    [InlineData(1, 6.314)]
    [InlineData(4, 2.132)]
    [InlineData(10, 1.812)]
    [InlineData(30, 1.697)]
    public void Few_degrees_of_freedom_widen_the_guard_band_by_Students_t(double degreesOfFreedom, double t)
    {
        var verdict = Verdict.On(AtMost(2.0), Found(1.5, 0.1) with { DegreesOfFreedom = degreesOfFreedom });
        Assert.Equal(t, verdict.GuardBand!.Factor, tolerance: 0.0006);
        Assert.Equal(2.0 - (0.1 * t), Micrometres(verdict.GuardBand.AcceptedTo!), tolerance: 0.0001);
    }

    [Fact]
    public void On_the_edge_of_the_acceptance_zone_the_consumers_risk_is_the_agreed_one()
    {
        foreach (var scale in Enum.GetValues<UncertaintyScale>())
        {
            var found = Found(1.5, 0.1) with { Scale = scale, DegreesOfFreedom = 7 };
            var edge = Micrometres(Verdict.On(AtMost(2.0), found).GuardBand!.AcceptedTo!);
            var onEdge = Found(edge, scale == UncertaintyScale.Linear ? 0.1 : 0.1 / 1.5 * edge) with { Scale = scale, DegreesOfFreedom = 7 };
            Assert.Equal(0.05, Verdict.On(AtMost(2.0), onEdge).ConsumersRisk, tolerance: 1e-6);
        }
    }

    [Theory]
    [InlineData(1.80, Decision.Pass)]
    [InlineData(1.95, Decision.Undecided)]
    [InlineData(2.05, Decision.Undecided)]
    [InlineData(2.20, Decision.Fail)]
    public void Acceptance_and_rejection_are_both_guarded(double micrometres, Decision decision) =>
        Assert.Equal(decision, Verdict.On(AtMost(2.0), Found(micrometres, 0.08)).Decision);

    [Fact]
    public void A_value_between_two_near_limits_is_not_passed_on_one_side_alone()
    {
        // Half-width 1.7 u: each side alone risks 4.5 %, both together 8.9 % (normal table: Φ(1.7) = 0.9554).
        var limit = new Limit(Characteristic.MeanDiameter, Length.FromMicrometers(1.83), Length.FromMicrometers(2.17));
        var verdict = Verdict.On(limit, Found(2.0, 0.1));
        Assert.Equal(0.0891, verdict.ConsumersRisk, tolerance: 0.0002);
        Assert.Equal(Decision.Undecided, verdict.Decision);
    }

    [Fact]
    public void An_exactly_known_value_is_decided_by_the_limit_itself()
    {
        Assert.Equal(Decision.Pass, Verdict.On(AtMost(2.0), Found(2.0, 0)).Decision);
        Assert.Equal(Decision.Fail, Verdict.On(AtMost(2.0), Found(2.0001, 0)).Decision);
    }

    [Fact]
    public void On_the_logarithmic_scale_a_limit_twice_as_high_is_ln_2_over_the_relative_uncertainty_away()
    {
        // (ln 2) / 0.4 = 1.7329; Φ = 0.9584 (normal table).
        var limit = new Limit(Characteristic.PenetrationAtMpps, null, Ratio.FromPercent(4));
        var found = new ObservedValue(Ratio.FromPercent(2), Ratio.FromPercent(0.8)) { Scale = UncertaintyScale.Logarithmic };
        Assert.Equal(0.0416, Verdict.On(limit, found).ConsumersRisk, tolerance: 0.0002);
    }

    [Fact]
    public void A_forecast_passes_only_when_every_model_of_its_band_passes()
    {
        var limit = new Limit(Characteristic.PenetrationAtMpps, null, Ratio.FromPercent(4));
        var found = new ObservedValue(Ratio.FromPercent(2), Ratio.FromPercent(0.2)) { Scale = UncertaintyScale.Logarithmic };
        Assert.Equal(Decision.Pass, Verdict.On(limit, found).Decision);
        var open = Verdict.On(limit, found with { ModelBand = (Ratio.FromPercent(1.5), Ratio.FromPercent(5)) });
        Assert.Equal(Decision.Undecided, open.Decision);
        Assert.Contains("models disagree", open.Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void A_forecast_says_so_and_defers_to_the_standards_test()
    {
        var limit = new Limit(Characteristic.PressureDrop, null, Pressure.FromPascals(60));
        var sentence = Verdict.On(limit, new ObservedValue(Pressure.FromPascals(40), Pressure.FromPascals(3))).Sentence;
        Assert.StartsWith("Pass by forecast: forecast pressure drop 40 Pa, limit at most 60 Pa", sentence, StringComparison.Ordinal);
        Assert.Contains("only the standard's own test decides", sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void Nothing_found_is_undecided()
    {
        var verdict = Verdict.On(AtMost(2.0), null);
        Assert.Equal(Decision.Undecided, verdict.Decision);
        Assert.Null(verdict.GuardBand);
        Assert.Contains("nothing was found", verdict.Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void Any_unit_gives_the_same_verdict()
    {
        var inNanometres = new ObservedValue(Length.FromNanometers(1950), Length.FromNanometers(80));
        Assert.Equal(
            Verdict.On(AtMost(2.0), Found(1.95, 0.08)).ConsumersRisk,
            Verdict.On(AtMost(2.0), inNanometres).ConsumersRisk,
            tolerance: 1e-12);
    }

    [Fact]
    public void A_value_of_another_kind_is_refused() =>
        Assert.Throws<ArgumentException>(() => Verdict.On(AtMost(2.0), new ObservedValue(Pressure.FromPascals(2), Pressure.FromPascals(0.1))));

    internal static Limit AtMost(double micrometres) => new(Characteristic.MeanDiameter, null, Length.FromMicrometers(micrometres));

    internal static ObservedValue Found(double micrometres, double uncertainty) =>
        new(Length.FromMicrometers(micrometres), Length.FromMicrometers(uncertainty));

    private static double Micrometres(IQuantity quantity) => Characteristic.MeanDiameter.In(quantity);
}
