using FiberScope.Fibres;
using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;
using FiberScope.Filtration.Uncertainty;
using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests;

public sealed class UncertaintyTests
{
    private static readonly MediaLayer Known = Layer(2e-6, 0.07, 4e-4) with
    {
        Diameters = DiameterDistribution.LogNormal(Length.FromMicrometers(2), 1.5),
        Uncertainty = new LayerUncertainty { DiameterScale = 0.04, IndependentFibres = 150, Solidity = 0.08, Thickness = 0.05, Inhomogeneity = 0.1, Charge = 0.2 },
    };

    private static readonly OperatingPoint Point = At(0.053) with
    {
        Uncertainty = new OperatingUncertainty { FaceVelocity = 0.05, Temperature = TemperatureDelta.FromKelvins(3), AirPressure = 0.01 },
    };

    [Fact]
    public void Nothing_uncertain_gives_no_band() =>
        Assert.Null(MediaModel.Forecast([Layer(2e-6, 0.07, 4e-4)], At(0.053)).Uncertainty);

    [Fact]
    public void Every_band_holds_its_central_value()
    {
        var forecast = MediaModel.Forecast([Known], Point);
        var bands = forecast.Uncertainty!;
        Assert.All(forecast.Curve, c => Assert.True(c.MeasurementBand!.Value.Contains(c.Penetration)));
        Assert.True(bands.PressureDropPascals.Contains(forecast.PressureDrop.Pascals));
        Assert.True(bands.PenetrationAtMostPenetratingSize.Contains(forecast.PenetrationAtMostPenetratingSize));
        Assert.True(bands.QualityFactorPerPascal.Contains(forecast.QualityFactorPerPascal));
        Assert.True(bands.MostPenetratingSize!.Value.Contains(forecast.MostPenetratingSize!.Value));
    }

    [Fact]
    public void The_same_seed_gives_the_same_bands()
    {
        var first = MediaModel.Forecast([Known], Point, new ForecastSettings { Draws = 100, Seed = 7 });
        var again = MediaModel.Forecast([Known], Point, new ForecastSettings { Draws = 100, Seed = 7 });
        Assert.Equal(first.Curve.Select(c => c.MeasurementBand), again.Curve.Select(c => c.MeasurementBand));
    }

    // Pressure drop is proportional to velocity and to thickness: their bands are known in closed form.
    [Fact]
    public void An_uncertain_velocity_gives_the_pressure_drop_its_own_log_normal_band()
    {
        var point = At(0.053) with { Uncertainty = new OperatingUncertainty { FaceVelocity = 0.1 } };
        var forecast = MediaModel.Forecast([Known with { Uncertainty = null }], point, new ForecastSettings { Draws = 5000 });
        var band = forecast.Uncertainty!.PressureDropPascals;
        Assert.Equal(0.196, Math.Log(band.High / forecast.PressureDrop.Pascals), 0.02);
        Assert.Equal(-0.196, Math.Log(band.Low / forecast.PressureDrop.Pascals), 0.02);
    }

    [Fact]
    public void Weighing_makes_thickness_harmless_to_the_amount_of_fibre()
    {
        double Cost(bool weighing) => MediaModel.Forecast(
            [Known with { Uncertainty = new LayerUncertainty { Thickness = 0.1, SolidityByWeighing = weighing } }], Point).Uncertainty!.Ranking.Single(r => r.Input == "thickness").LogPenetrationDeviation;
        Assert.True(Cost(weighing: true) < 0.5 * Cost(weighing: false));
    }

    [Fact]
    public void The_ranking_puts_the_costliest_input_first_and_its_shares_sum_to_one()
    {
        var ranking = MediaModel.Forecast([Known with { Uncertainty = Known.Uncertainty! with { DiameterScale = 0.2 } }], Point).Uncertainty!.Ranking;
        Assert.Equal("diameter-scale", ranking[0].Input);
        Assert.Equal(1, ranking.Sum(r => r.PenetrationShare), 1e-9);
        Assert.Equal(1, ranking.Sum(r => r.PressureDropShare), 1e-9);
    }

    // The fast tables against the full calculation, at inputs drawn as the bands draw them.
    [Theory]
    [InlineData(0, 0, false)]
    [InlineData(0.3, 0.02, false)]
    [InlineData(0, 0, true)]
    public void A_draw_from_the_tables_is_what_the_full_calculation_gives(double variation, double openArea, bool charged)
    {
        var layer = Known with
        {
            BasisWeightVariation = variation,
            Holes = openArea > 0 ? [new Pinholes(Length.FromMicrometers(40), 1e-4)] : [],
            InhomogeneityFactor = charged ? 1.3 : null,
            Charge = charged ? new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(2e-5)) : null,
        };
        MediaLayer[] layers = [layer, layer with { Diameters = DiameterDistribution.OfOneDiameter(Length.FromMicrometers(12)), Thickness = Length.FromMillimeters(1) }];
        double[] sizes = [2e-8, 5e-8, 1e-7, 3e-7, 1e-6, 3e-6];
        var model = SingleFibreModel.Of(CorrelationSet.KirschStechkina1978);
        var response = new MediumResponse(layers, Point, model, sizes);
        var source = new InputDraws(layers, Point, 3, UncertainInput.Of(layers, Point));
        var found = new double[sizes.Length];
        for (var i = 0; i < 25; i++)
        {
            var draw = source.Next();
            var pascals = response.Evaluate(draw, null, found);
            var full = new MediumModel([.. layers.Select((l, k) => Drawn(l, draw.Layers[k]))], Drawn(draw), model);
            Assert.Equal(full.Pascals, pascals, 1e-6 * full.Pascals);
            Assert.All(sizes.Zip(found), pair => Assert.Equal(full.Attenuation(pair.First), pair.Second, 0.015 * pair.Second));
        }
    }

    private static MediaLayer Drawn(MediaLayer layer, LayerDraw draw) => layer with
    {
        Diameters = new DiameterDistribution(layer.Diameters.Classes.Select((c, i) => new DiameterClass(c.Diameter * draw.DiameterFactor, draw.LengthFractions[i]))),
        Solidity = new Solidity(layer.Solidity.Fraction * Math.Exp(draw.LogSolidity)),
        Thickness = layer.Thickness * Math.Exp(draw.LogThickness),
        InhomogeneityFactor = layer.InhomogeneityFactor * Math.Exp(draw.LogInhomogeneity),
        Charge = layer.Charge is { } charge ? new FibreCharge(charge.SurfaceDensity * Math.Exp(draw.LogCharge), charge.FibrePermittivity) : null,
    };

    private static OperatingPoint Drawn(InputDraw draw) => Point with
    {
        FaceVelocity = Point.FaceVelocity * Math.Exp(draw.LogVelocity),
        Air = new AirState(
            Temperature.FromKelvins(Point.Air.Temperature.Kelvins + draw.KelvinsAbove),
            Pressure.FromPascals(Point.Air.Pressure.Pascals * Math.Exp(draw.LogPressure)),
            Point.Air.RelativeHumidity),
    };
}
