using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests;

public sealed class ChallengeTests
{
    private static readonly ForecastSettings Quick = new() { Draws = 0 };

    // Independent script of this project: salt of 75 nm count median, GSD 1.86, unit density, through one fan-model medium.
    [Theory]
    [InlineData(AerosolBasis.Count, 0.0391344156923891)]
    [InlineData(AerosolBasis.Mass, 0.0699148449086659)]
    public void Penetration_of_a_log_normal_aerosol_matches_an_independent_calculation(AerosolBasis basis, double expected)
    {
        var aerosol = new ChallengeAerosol(Length.FromNanometers(75), 1.86, basis) { ParticleDensity = Density.FromKilogramsPerCubicMeter(1000) };
        Assert.Equal(expected, Challenge.Penetration([Layer(2e-6, 0.08, 6e-4)], At(0.0944), aerosol, Quick).Penetration, expected * 1e-3);
    }

    [Fact]
    public void An_aerosol_of_one_size_is_a_point_of_the_curve()
    {
        var aerosol = new ChallengeAerosol(Length.FromNanometers(300), 1, AerosolBasis.Mass) { ParticleDensity = Density.FromKilogramsPerCubicMeter(1000) };
        Assert.Equal(
            MediaModel.Forecast([Layer(2e-6, 0.08, 6e-4)], At(0.05, 3e-7), Quick).Curve[0].Penetration,
            Challenge.Penetration([Layer(2e-6, 0.08, 6e-4)], At(0.05), aerosol, Quick).Penetration,
            1e-12);
    }

    // Below 0.2 µm scattered light grows as d⁶ (Rayleigh), so a photometer weighs far larger particles than a balance does.
    [Fact]
    public void A_light_photometer_lets_the_larger_particles_count_for_more()
    {
        double Of(AerosolBasis basis) => Challenge.Penetration([Layer(2e-6, 0.08, 6e-4)], At(0.0944), new ChallengeAerosol(Length.FromNanometers(75), 1.86, basis), Quick).Penetration;
        Assert.True(Of(AerosolBasis.ScatteredLight) < Of(AerosolBasis.Mass));
    }

    [Fact]
    public void A_band_of_sizes_lies_between_its_ends()
    {
        MediaLayer[] medium = [Layer(8e-6, 0.08, 6e-4)];
        var band = Challenge.OverBand(medium, At(0.2), Length.FromMicrometers(1), Length.FromMicrometers(3), Quick).Penetration;
        var ends = MediaModel.Forecast(medium, At(0.2, 1e-6, 3e-6), Quick).Penetrations();
        Assert.InRange(band, ends[1], ends[0]);
    }
}
