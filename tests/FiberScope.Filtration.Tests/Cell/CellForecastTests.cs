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

    private static MediaForecast Forecast(params double[] micrometres) => By(CorrelationSet.Cell, micrometres);

    private static MediaForecast By(CorrelationSet set, params double[] micrometres) => MediaModel.Forecast(
        [Layer],
        new OperatingPoint { FaceVelocity = Speed.FromCentimetersPerSecond(5.3), Particles = [.. micrometres.Select(d => Length.FromMicrometers(d))] },
        new ForecastSettings { Correlations = set });

    // Davies (1952): f = 64 α^1.5 (1 + 56 α³).
    [Fact]
    public void Tied_to_real_mats_the_pressure_drop_is_Davies_but_for_slip_and_the_quality_that_of_the_cell()
    {
        var air = AirState.Standard.Properties;
        var even = Forecast(0.3);
        var mat = By(CorrelationSet.CellMat, 0.3);
        var flow = new KuwabaraFlow(0.08, 2 * air.MeanFreePath.Meters / 3e-6);
        var davies = 64 * Math.Pow(0.08, 1.5) * (1 + (56 * 0.08 * 0.08 * 0.08)) * air.Viscosity.PascalSeconds * 0.053 * 3e-4 / 9e-12;
        Assert.Equal(davies * flow.Drag / new KuwabaraFlow(0.08, 0).Drag, mat.PressureDrop.Pascals, 1e-6 * davies);
        Assert.Equal(-Math.Log(even.Curve[0].Penetration) / even.PressureDrop.Pascals, -Math.Log(mat.Curve[0].Penetration) / mat.PressureDrop.Pascals, 2e-4);
    }

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
