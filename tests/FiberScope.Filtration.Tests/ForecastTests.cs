using FiberScope.Filtration.Drag;
using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests;

public sealed class ForecastTests
{
    // Values: an independent script of this project, from the formulas of each set (µ, λ, Cc as in AirProperties and Allen and Raabe).
    [Theory]
    [InlineData(CorrelationSet.KirschStechkina1978, 1.1e-5, 0.05, 0.005, 0.053, 0.3565982467753251)]
    [InlineData(CorrelationSet.KirschStechkina1978, 1.5e-7, 0.03, 1e-5, 0.053, 5.514498598429659)]
    [InlineData(CorrelationSet.KirschStechkina1978, 2e-5, 0.1, 3e-4, 0.1, 0.010503645233185258)]
    [InlineData(CorrelationSet.LeeLiu1982, 2e-5, 0.1, 3e-4, 0.1, 0.0068754615483564326)]
    [InlineData(CorrelationSet.Hinds1999, 6e-7, 0.07, 4e-4, 0.053, 27.874489142495076)]
    [InlineData(CorrelationSet.Hinds1999, 1.1e-5, 0.05, 0.005, 0.053, 0.2957483426123649)]
    public void Penetration_of_300_nm_matches_an_independent_calculation(CorrelationSet set, double fibre, double solidity, double thickness, double velocity, double expected)
    {
        var forecast = MediaModel.Forecast([Layer(fibre, solidity, thickness)], At(velocity, 3e-7), By(set));
        Assert.Equal(expected, forecast.MinusLogP(), expected * 1e-4);
    }

    [Theory]
    [InlineData(CorrelationSet.LeeLiu1982, 6e-7, 0.07, 4e-4, 0.053, 1.607542611632449e-07)]
    [InlineData(CorrelationSet.Hinds1999, 2e-6, 0.08, 3e-4, 0.053, 2.0335763023924622e-07)]
    [InlineData(CorrelationSet.KirschStechkina1978, 1.5e-7, 0.03, 1e-5, 0.053, 1.1316515819364286e-07)]
    public void Most_penetrating_size_matches_an_independent_calculation(CorrelationSet set, double fibre, double solidity, double thickness, double velocity, double expected)
    {
        var forecast = MediaModel.Forecast([Layer(fibre, solidity, thickness)], At(velocity), By(set));
        Assert.Equal(expected, forecast.MostPenetratingSize!.Value.Meters, expected * 0.001);
    }

    [Theory]
    [InlineData(6e-7, 0.07, 4e-4, 0.053, 959.5274631846644)]
    [InlineData(2e-6, 0.08, 3e-4, 0.053, 96.7379163828812)]
    [InlineData(1.1e-5, 0.05, 0.005, 0.053, 28.15940323436461)]
    public void Pressure_drop_is_Davies_law_with_the_slip_of_the_fan_model(double fibre, double solidity, double thickness, double velocity, double expected) =>
        Assert.Equal(expected, MediaModel.Forecast([Layer(fibre, solidity, thickness)], At(velocity, 3e-7)).PressureDrop.Pascals, expected * 1e-5);

    [Fact]
    public void A_velocity_and_its_pressure_drop_are_each_others_inverse()
    {
        MediaLayer[] layers = [Layer(2e-6, 0.08, 3e-4), Layer(1e-5, 0.1, 1e-3)];
        var velocity = MediaModel.AirPermeability(layers, At(0.05), Pressure.FromPascals(200));
        Assert.Equal(200, MediaModel.PressureDropAt(layers, At(0.05), velocity).Pascals, 1e-9);
    }

    [Fact]
    public void The_usual_range_of_sizes_is_10_nm_to_10_µm()
    {
        var curve = MediaModel.Forecast([Layer(2e-6, 0.08, 3e-4)], At(0.05)).Curve;
        Assert.Equal(10, curve[0].Particle.Nanometers, 1e-6);
        Assert.Equal(10, curve[^1].Particle.Micrometers, 1e-9);
    }

    [Theory]
    [InlineData(0.9, 0.05, 3e-7, "solidity 0.9")]
    [InlineData(0.08, 100, 3e-7, "Face velocity 1E+04 cm/s")]
    [InlineData(0.08, 0.05, 1e-9, "Particles of 0.001 µm")]
    public void What_no_range_covers_is_flagged_with_the_range(double solidity, double velocity, double particle, string words)
    {
        var caveats = MediaModel.Forecast([Layer(2e-6, solidity, 3e-4)], At(velocity, particle)).Caveats;
        Assert.Contains(caveats, c => c.Code == "outside-fitted-range" && c.Message.Contains(words, StringComparison.Ordinal) && c.Message.Contains("range", StringComparison.Ordinal));
    }

    [Fact]
    public void Shares_of_the_mechanisms_sum_to_one() =>
        Assert.All(MediaModel.Forecast([Layer(2e-6, 0.08, 3e-4)], At(0.05)).Curve, c => Assert.Equal(1, c.ByMechanism.Values.Sum(), 1e-12));

    [Fact]
    public void A_medium_without_layers_is_refused() =>
        Assert.Throws<ArgumentException>(() => MediaModel.Forecast([], At(0.05)));

    [Fact]
    public void A_given_inhomogeneity_divides_pressure_drop_and_efficiency_alike()
    {
        var layer = Layer(2e-6, 0.05, 3e-4);
        var even = MediaModel.Forecast([layer with { InhomogeneityFactor = 1 }], At(0.05, 5e-8));
        var uneven = MediaModel.Forecast([layer with { InhomogeneityFactor = 1.5 }], At(0.05, 5e-8));
        Assert.Equal(even.PressureDrop.Pascals / 1.5, uneven.PressureDrop.Pascals, 1e-9);
        Assert.Equal(even.MinusLogP() / 1.5, uneven.MinusLogP(), 0.02);
    }

    // The values of dP_davies_fan_slip and of the laws' dimensionless drags, through the medium's own sum.
    [Fact]
    public void Laws_of_resistance_stand_side_by_side()
    {
        var laws = PressureDropLaws.All([Layer(2e-6, 0.08, 3e-4)], At(0.053));
        Assert.Equal(96.7379163828812, laws["davies-1952-with-fan-slip"].Pascals, 1e-3);
        Assert.True(laws["davies-1952"] > laws["davies-1952-with-fan-slip"]);
        Assert.True(laws["kuwabara-1959-with-slip"] > laws["random-in-space-spielman-goren-1968"]);
        Assert.True(laws.Count >= 5);
    }
}
