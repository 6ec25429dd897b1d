using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests;

/// <summary>Uneven layers, holes, gaps, charge and straining, against closed forms of our own derivation or published values.</summary>
public sealed class PassageTests
{
    private static readonly MediaLayer Mat = Layer(3e-6, 0.1, 3e-4);

    // For a gamma-distributed weight the mean of 1/w is 1/(1 − c²): places at equal pressure drop carry that much more.
    [Theory]
    [InlineData(0.1)]
    [InlineData(0.3)]
    [InlineData(0.5)]
    public void Unevenness_lowers_resistance_by_the_square_of_its_variation(double variation) => Assert.Equal(
        (1 - (variation * variation)) * MediaModel.Forecast([Mat], At(0.05)).PressureDrop.Pascals,
        MediaModel.Forecast([Mat with { BasisWeightVariation = variation }], At(0.05)).PressureDrop.Pascals,
        1e-6);

    // Where capture does not care about velocity, the mean over the air of exp(−K w) is (1 + c² K)^−(1/c² − 1). Pure interception in the
    // set without slip and inertia is such a case.
    [Theory]
    [InlineData(0.15)]
    [InlineData(0.3)]
    [InlineData(0.5)]
    public void Uneven_penetration_meets_its_closed_form(double variation)
    {
        var point = At(0.3, 2e-6) with { Air = new AirState(Temperature.FromKelvins(10), Pressure.FromPascals(101_325), 0) };
        var even = MediaModel.Forecast([Mat], point, By(CorrelationSet.LeeLiu1982)).MinusLogP();
        var uneven = MediaModel.Forecast([Mat with { BasisWeightVariation = variation }], point, By(CorrelationSet.LeeLiu1982)).Curve[0].Penetration;
        var square = variation * variation;
        Assert.Equal(Math.Pow(1 + (square * even), 1 - (1 / square)), uneven, 0.02 * uneven);
    }

    [Fact]
    public void Bonds_that_close_a_fifth_of_the_area_raise_resistance_by_a_quarter() => Assert.Equal(
        1.25 * MediaModel.Forecast([Mat], At(0.05)).PressureDrop.Pascals,
        MediaModel.Forecast([Mat with { BondedArea = 0.2 }], At(0.05)).PressureDrop.Pascals,
        1e-9);

    // 100 cm² of medium that takes 120 Pa at 5.3 cm/s, one hole through 0.4 mm: independent calculation of this project.
    [Theory]
    [InlineData(50e-6, 4.4e-6)]
    [InlineData(100e-6, 5.9e-5)]
    [InlineData(200e-6, 4.8e-4)]
    [InlineData(500e-6, 4.0e-3)]
    public void One_hole_takes_the_share_of_the_air_that_an_independent_calculation_gives(double hole, double share)
    {
        var medium = Layer(3e-6, 0.1, 4e-4);
        var plain = MediaModel.PressureDropAt([medium], At(0.053), Speed.FromMetersPerSecond(0.053)).Pascals;
        var scaled = medium with { InhomogeneityFactor = EffectiveDiameter.Inhomogeneity(medium, At(0.053), Pressure.FromPascals(120)) };
        Assert.NotEqual(120, plain, 1.0);
        var forecast = MediaModel.Forecast([scaled with { Holes = [Pinholes.Counted(1, Length.FromMeters(hole), Area.FromSquareCentimeters(100))] }], At(0.053, 3e-7));
        Assert.Equal(120, forecast.PressureDrop.Pascals, 1.0);
        Assert.Equal(share, forecast.HoleShares[0], 0.03 * share);
    }

    [Fact]
    public void A_cloth_that_is_mostly_holes_lets_nearly_all_through()
    {
        var cloth = Layer(15e-6, 0.3, 3e-4) with { Holes = [new Pinholes(Length.FromMicrometers(150), 0.1)] };
        var forecast = MediaModel.Forecast([cloth], At(0.05, 3e-6));
        Assert.True(forecast.HoleShares[0] > 0.5);
        Assert.True(forecast.Curve[0].Penetration > forecast.HoleShares[0]);
    }

    [Fact]
    public void A_gap_at_the_edge_lets_at_least_its_own_share_through()
    {
        var leak = new EdgeLeak(Length.FromMillimeters(0.3), Length.FromCentimeters(5), Length.FromMillimeters(10), Area.FromSquareCentimeters(100));
        var forecast = MediaModel.Forecast([Mat], At(0.05, 3e-6) with { Leak = leak });
        Assert.InRange(forecast.EdgeLeakShare, 1e-3, 0.9);
        Assert.True(forecast.Curve[0].Penetration >= forecast.EdgeLeakShare);
    }

    [Fact]
    public void The_leak_that_halves_protection_doubles_penetration() =>
        Assert.Equal(0.02, Leakage.Total(0.01, Leakage.HalvingShare(0.01)), 1e-12);

    [Fact]
    public void Charge_lowers_penetration_and_moves_the_most_penetrating_size_below_100_nm()
    {
        var charged = Mat with { Charge = new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(5e-5)) };
        var plain = MediaModel.Forecast([Mat], At(0.05, 3e-7));
        var electret = MediaModel.Forecast([charged], At(0.05, 3e-7));
        Assert.True(electret.Curve[0].Penetration < 0.5 * plain.Curve[0].Penetration);
        Assert.True(electret.MostPenetratingSize!.Value.Nanometers < 100);
        Assert.Equal(plain.PressureDrop, electret.PressureDrop);
    }

    [Fact]
    public void Charged_particles_are_caught_better_than_neutral_ones()
    {
        var charged = Mat with { Charge = new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(2e-5)) };
        var point = At(0.05, 1e-7);
        Assert.True(MediaModel.Forecast([charged], point).Curve[0].Penetration < MediaModel.Forecast([charged], point with { Charging = ParticleCharging.Neutral }).Curve[0].Penetration);
    }

    // Wiedensohler (1988) gives about 5.1 % and 4.1 % singly charged at 10 nm (from memory); the two signs together here.
    [Fact]
    public void One_particle_in_eleven_of_10_nm_carries_a_charge() =>
        Assert.Equal(0.092, EquilibriumCharge.Shares(Length.FromNanometers(10), Temperature.FromKelvins(293.15))[1], 0.002);

    [Fact]
    public void Openings_smaller_than_the_particle_stop_it()
    {
        var strained = Mat with { Openings = new MatOpenings(Length.FromMicrometers(1), 1.3) };
        var forecast = MediaModel.Forecast([strained], At(0.05, 1e-7, 5e-6));
        Assert.Equal(MediaModel.Forecast([Mat], At(0.05, 1e-7)).Curve[0].Penetration, forecast.Curve[0].Penetration, 1e-4);
        Assert.True(forecast.Curve[1].ByMechanism["straining"] > 0);
    }

    [Fact]
    public void Particles_settle_with_the_air_and_against_it()
    {
        double P(FlowDirection direction) => MediaModel.Forecast([Layer(2e-5, 0.05, 2e-4)], At(0.01, 4e-6) with { Direction = direction }).Curve[0].Penetration;
        Assert.True(P(FlowDirection.Down) < P(FlowDirection.Horizontal));
        Assert.True(P(FlowDirection.Horizontal) < P(FlowDirection.Up));
    }
}
