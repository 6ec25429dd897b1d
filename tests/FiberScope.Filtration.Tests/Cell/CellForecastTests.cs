using FiberScope.Fibres;
using FiberScope.Filtration.Cell;
using UnitsNet;

namespace FiberScope.Filtration.Tests.Cell;

public sealed class CellForecastTests
{
    private static readonly MediaLayer Layer = new()
    {
        Diameters = new DiameterDistribution([new DiameterClass(Length.FromMicrometers(3), 1)]),
        Solidity = new Solidity(0.08),
        Thickness = Length.FromMillimeters(0.3),
    };

    private static MediaForecast Forecast(params double[] micrometres) => MediaModel.Forecast(
        [Layer],
        new OperatingPoint { FaceVelocity = Speed.FromCentimetersPerSecond(5.3), Particles = [.. micrometres.Select(d => Length.FromMicrometers(d))] },
        new ForecastSettings { Correlations = CorrelationSet.Cell });

    [Fact]
    public void The_pressure_drop_is_the_cells_own()
    {
        var air = AirState.Standard.Properties;
        var flow = new KuwabaraFlow(0.08, 2 * air.MeanFreePath.Meters / 3e-6);
        var expected = flow.PressureDropFactor * air.Viscosity.PascalSeconds * 0.053 * 3e-4 / 9e-12;
        Assert.Equal(expected, Forecast(0.3).PressureDrop.Pascals, 1e-6 * expected);
    }

    [Fact]
    public void The_mechanisms_share_what_the_cell_collects()
    {
        foreach (var point in Forecast(0.02, 0.1, 0.3, 1, 3, 8).Curve)
        {
            Assert.Equal(1, point.ByMechanism.Values.Sum(), 1e-9);
            Assert.All(point.ByMechanism.Values, share => Assert.InRange(share, 0, 1));
        }
    }

    [Fact]
    public void Small_particles_diffuse_and_large_ones_are_intercepted_or_thrown()
    {
        var curve = Forecast(0.02, 5).Curve;
        Assert.True(curve[0].ByMechanism["diffusion"] > 0.9);
        Assert.True(curve[1].ByMechanism["interception"] + curve[1].ByMechanism["impaction"] > 0.9);
    }
}
