using UnitsNet;

namespace FiberScope.Fibres.Tests;

public sealed class SolidityTests
{
    [Fact]
    public void Weighing_gives_mass_over_density_and_thickness()
    {
        // Worked by hand: 25 g/m2 of 910 kg/m3 in 0.3 mm.
        var found = Solidity.FromWeighing(AreaDensity.FromGramsPerSquareMeter(25), Density.FromKilogramsPerCubicMeter(910), Length.FromMillimeters(0.3));
        Assert.Equal(0.09158, found.Fraction, 5e-6);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(1.2)]
    [InlineData(double.NaN)]
    public void A_solidity_outside_zero_to_one_is_refused(double fraction) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new Solidity(fraction));

    [Fact]
    public void Routes_that_agree_are_combined_and_narrow_the_interval()
    {
        var found = SolidityFinding.Combine([Estimate(SolidityRoute.Weighing, 0.10, 0.005), Estimate(SolidityRoute.Coverage, 0.105, 0.01)]);
        Assert.Empty(found.Caveats);
        Assert.InRange(found.Combined.Value.Fraction, 0.10, 0.105);
        Assert.True(found.Combined.Interval95.Width < found.Routes[0].Interval95.Width);
    }

    [Fact]
    public void Routes_that_disagree_say_which_is_off()
    {
        var found = SolidityFinding.Combine(
            [Estimate(SolidityRoute.Weighing, 0.10, 0.003), Estimate(SolidityRoute.CrossSection, 0.102, 0.003), Estimate(SolidityRoute.PressureDrop, 0.2, 0.01)]);
        Assert.Contains("PressureDrop stands furthest off", Assert.Single(found.Caveats).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_polymer_has_a_plausible_density_and_a_source() =>
        Assert.All(Polymer.Known, p =>
        {
            Assert.InRange(p.Density.KilogramsPerCubicMeter, 850, 2700);
            Assert.NotEmpty(p.Source);
        });

    private static SolidityEstimate Estimate(SolidityRoute route, double value, double uncertainty) => new(route, new Solidity(value), uncertainty, "");
}
