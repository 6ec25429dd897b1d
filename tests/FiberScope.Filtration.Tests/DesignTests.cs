using FiberScope.Statistics;
using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests;

public sealed class DesignTests
{
    private static readonly Density Polypropylene = Density.FromKilogramsPerCubicMeter(905);
    private static readonly MediaLayer Start = Layer(3e-6, 0.08, 3e-4);

    [Fact]
    public void A_design_meets_its_targets_when_forecast_forwards()
    {
        var targets = new DesignTargets { PenetrationAtMostPenetratingSize = 0.2, PressureDrop = Pressure.FromPascals(150), BasisWeight = AreaDensity.FromGramsPerSquareMeter(60) };
        var best = Design(targets).Search(6)[0];
        var forecast = MediaModel.Forecast(best.Layers, At(0.053));
        Assert.True(best.MeetsTargets);
        Assert.InRange(forecast.PenetrationAtMostPenetratingSize, 0, 0.2);
        Assert.InRange(forecast.PressureDrop.Pascals, 0, 150);
        Assert.Equal(best.QualityFactorPerPascal, forecast.QualityFactorPerPascal, 1e-9);
        Assert.Equal(["penetration-at-most-penetrating-size", "pressure-drop"], best.Probabilities.Keys);
    }

    [Fact]
    public void Targets_out_of_reach_are_said_to_be_missed()
    {
        var best = Design(new DesignTargets { PenetrationAtMostPenetratingSize = 1e-6, PressureDrop = Pressure.FromPascals(5) }).Search(4, 2);
        Assert.All(best, c => Assert.False(c.MeetsTargets));
    }

    [Fact]
    public void A_map_runs_from_the_low_ends_of_both_variables()
    {
        var weight = new DesignVariable(DesignKind.BasisWeight, 0, new Interval(0.01, 0.08));
        var diameter = new DesignVariable(DesignKind.MedianDiameter, 0, new Interval(1e-6, 6e-6));
        var map = Design(new DesignTargets()).Map(diameter, weight, 3);
        Assert.Equal(1e-6, map[0][0].Values[0], 1e-12);
        Assert.Equal(6e-6, map[0][2].Values[0], 1e-12);
        Assert.Equal(80, map[2][0].BasisWeight.GramsPerSquareMeter, 1e-6);
        Assert.True(map[0][0].PenetrationAtMostPenetratingSize < map[0][2].PenetrationAtMostPenetratingSize);
        Assert.True(map[2][0].PressureDrop > map[0][0].PressureDrop);
    }

    [Fact]
    public void Solidity_changes_without_changing_the_weight()
    {
        var map = Design(new DesignTargets()).Map(new DesignVariable(DesignKind.Solidity, 0, new Interval(0.04, 0.16)), new DesignVariable(DesignKind.Charge, 0, new Interval(0, 5e-5)), 2);
        Assert.Equal(map[0][0].BasisWeight.GramsPerSquareMeter, map[1][1].BasisWeight.GramsPerSquareMeter, 1e-9);
        Assert.True(map[1][0].PenetrationAtMostPenetratingSize < map[0][0].PenetrationAtMostPenetratingSize);
    }

    [Fact]
    public void A_fine_layer_may_take_a_larger_share_of_the_same_weight()
    {
        var design = new MediaDesign([Layer(1e-6, 0.06, 1e-4), Layer(1.5e-5, 0.1, 5e-4)], At(0.053), new DesignTargets(), [new DesignVariable(DesignKind.WeightShare, 0, new Interval(0.05, 0.5))], Polypropylene, new ForecastSettings { Draws = 0 });
        var tried = design.Search(2, 2).OrderBy(c => c.Values[0]).ToArray();
        Assert.Equal(tried[0].BasisWeight.GramsPerSquareMeter, tried[^1].BasisWeight.GramsPerSquareMeter, 1e-9);
        Assert.True(tried[0].PenetrationAtMostPenetratingSize > tried[^1].PenetrationAtMostPenetratingSize);
    }

    [Fact]
    public void A_design_without_variables_is_refused() =>
        Assert.Throws<ArgumentException>(() => new MediaDesign([Start], At(0.05), new DesignTargets(), [], Polypropylene));

    private static MediaDesign Design(DesignTargets targets) => new(
        [Start with { Uncertainty = new LayerUncertainty { DiameterScale = 0.05 } }],
        At(0.053),
        targets,
        [new DesignVariable(DesignKind.MedianDiameter, 0, new Interval(0.8e-6, 8e-6)), new DesignVariable(DesignKind.BasisWeight, 0, new Interval(0.01, 0.1))],
        Polypropylene,
        new ForecastSettings { Draws = 100 });
}
