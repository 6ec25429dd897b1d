using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests;

/// <summary>Rolls made by the model itself, with factors that the fit must find again.</summary>
public sealed class CalibrationTests
{
    private static readonly double[] Sizes = [0.1e-6, 0.3e-6, 0.5e-6, 1e-6, 2e-6];

    [Fact]
    public void The_factors_that_made_the_rolls_are_found_again()
    {
        var fit = GradeCalibration.Fit("invented", [.. new[] { 2.5e-6, 3e-6, 3.6e-6 }.Select(d => Roll(d, 1.4, 0.3, 2e-5))]);
        Assert.Equal(1.4, fit.InhomogeneityFactor, 0.02);
        Assert.Equal(0.3, fit.BasisWeightVariation, 0.02);
        Assert.InRange(fit.OpenArea, 0, 1e-5);
        Assert.Equal(20, fit.Charge.CoulombsPerSquareMeter * 1e6, 0.5);
        Assert.InRange(fit.LeaveOneOutPenetrationError!.Value, 0, 0.01);
        Assert.InRange(fit.LeaveOneOutPressureDropError!.Value, 0, 0.01);
    }

    [Fact]
    public void The_next_forecast_uses_the_calibration_and_says_so()
    {
        var roll = Roll(3e-6, 1.4, 0.3, 2e-5);
        var fit = GradeCalibration.Fit("invented", [roll]);
        var forecast = fit.Forecast([Layer(3e-6, 0.08, 3e-4)], At(0.053, Sizes));
        Assert.Contains(forecast.Caveats, c => c.Code == "calibrated");
        Assert.Equal(roll.PressureDrop!.Value.Pascals, forecast.PressureDrop.Pascals, 0.5);
        Assert.All(forecast.Curve, c => Assert.NotNull(c.MeasurementBand));
        Assert.Contains(fit.Caveats, c => c.Code == "few-rolls");
    }

    [Fact]
    public void Holes_that_pass_large_particles_are_found_beside_unevenness()
    {
        var fit = GradeCalibration.Fit("invented", [Roll(3e-6, 1.4, 0.2, 2e-5, 2e-3)]);
        Assert.Equal(2e-3, fit.OpenArea, 3e-4);
        Assert.Equal(0.2, fit.BasisWeightVariation, 0.05);
        Assert.Equal(20, fit.Charge.CoulombsPerSquareMeter * 1e6, 1.0);
    }

    [Fact]
    public void A_charge_without_a_discharged_test_is_not_guessed()
    {
        var roll = Roll(3e-6, 1.4, 0.3, 2e-5);
        var fit = GradeCalibration.Fit("invented", [roll with { Penetrations = [.. roll.Penetrations.Where(p => !p.Discharged)] }]);
        Assert.Equal(0, fit.Charge.CoulombsPerSquareMeter);
        Assert.Contains(fit.Caveats, c => c.Code == "charge-not-separable");
    }

    [Fact]
    public void Rolls_without_any_measurement_are_refused() =>
        Assert.Throws<ArgumentException>(() => GradeCalibration.Fit("invented", [new CalibrationRoll("1", [Layer(3e-6, 0.08, 3e-4)], At(0.05), null, [])]));

    [Theory]
    [InlineData(1e-5)]
    [InlineData(6e-5)]
    public void A_pair_of_penetrations_gives_the_charge_back(double charge)
    {
        var layer = Layer(4e-6, 0.08, 3e-4);
        var charged = layer with { Charge = new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(charge)) };
        double P(MediaLayer medium) => MediaModel.Forecast([medium], At(0.05, 3e-7)).Curve[0].Penetration;
        var found = ChargeInference.FromPair([layer], At(0.05), Length.FromNanometers(300), P(charged), P(layer));
        Assert.Equal(charge, found.Charge.SurfaceDensity.CoulombsPerSquareMeter, 1e-4 * charge);
        Assert.InRange(found.RelativeUncertainty, 0.01, 1);
    }

    [Fact]
    public void A_medium_that_passes_no_more_discharged_shows_no_charge() =>
        Assert.Contains(ChargeInference.FromPair([Layer(4e-6, 0.08, 3e-4)], At(0.05), Length.FromNanometers(300), 0.5, 0.45).Caveats, c => c.Code == "no-charge-seen");

    // d² = f(α) μ U t / Δp, so the diameter put into Davies' law comes back.
    [Fact]
    public void Effective_diameter_inverts_Davies_law()
    {
        var layer = Layer(12e-6, 0.1, 1e-3);
        var pressure = MediaModel.PressureDropAt([layer], At(0.1), Speed.FromMetersPerSecond(0.1), By(CorrelationSet.Hinds1999));
        var found = EffectiveDiameter.FromPressureDrop(pressure, Speed.FromMetersPerSecond(0.1), layer.Solidity, layer.Thickness, AirState.Standard.Properties);
        Assert.Equal(12, found.Micrometers, 1e-6);
        Assert.Empty(EffectiveDiameter.Compare(found, layer.Diameters, 0));
    }

    [Theory]
    [InlineData(18, 0.0, "flow-diameter-ropes")]
    [InlineData(14.5, 0.5, "flow-diameter-uneven")]
    [InlineData(8, 0.0, "flow-diameter-tight")]
    public void A_mismatch_of_diameters_names_its_likely_reason(double byFlow, double variation, string code) =>
        Assert.Contains(EffectiveDiameter.Compare(Length.FromMicrometers(byFlow), Layer(12e-6, 0.1, 1e-3).Diameters, 0, variation), c => c.Code == code);

    private static CalibrationRoll Roll(double fibre, double inhomogeneity, double variation, double charge, double openArea = 0)
    {
        var structure = Layer(fibre, 0.08, 3e-4);
        var bare = structure with { InhomogeneityFactor = inhomogeneity, BasisWeightVariation = variation, Holes = openArea > 0 ? [new Pinholes(Length.FromMillimeters(0.2), openArea)] : [] };
        var charged = bare with { Charge = new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(charge)) };
        var point = At(0.053, Sizes);
        var (with, without) = (MediaModel.Forecast([charged], point), MediaModel.Forecast([bare], point));
        return new CalibrationRoll(
            FormattableString.Invariant($"roll of {fibre * 1e6} µm"),
            [structure],
            point,
            with.PressureDrop,
            [.. with.Curve.Select(c => new RigPenetration(c.Particle, c.Penetration)), .. without.Curve.Select(c => new RigPenetration(c.Particle, c.Penetration, Discharged: true))]);
    }
}
