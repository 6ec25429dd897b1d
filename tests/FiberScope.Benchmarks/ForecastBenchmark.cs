using BenchmarkDotNet.Attributes;
using FiberScope.Fibres;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Benchmarks;

/// <summary>A full forecast: 3 layers of 40 diameter classes, 60 sizes, 2,000 draws; the aim is under one second on one core.</summary>
[MemoryDiagnoser]
[ShortRunJob]
public class ForecastBenchmark
{
    private readonly MediaLayer[] _layers = [Layer(14, 0.1, 0.25), Layer(2.2, 0.08, 0.2), Layer(14, 0.1, 0.25)];

    private readonly OperatingPoint _point = new()
    {
        FaceVelocity = Speed.FromCentimetersPerSecond(5.3),
        Particles = [.. Enumerable.Range(0, 60).Select(i => Length.FromMeters(1e-8 * Math.Pow(1000, i / 59.0)))],
        Uncertainty = new OperatingUncertainty { FaceVelocity = 0.02, Temperature = TemperatureDelta.FromKelvins(2), AirPressure = 0.01 },
    };

    /// <summary>Even, uncharged layers.</summary>
    [Benchmark(Baseline = true)]
    public MediaForecast Even() => MediaModel.Forecast(_layers, _point);

    /// <summary>The same, each layer uneven.</summary>
    [Benchmark]
    public MediaForecast Uneven() => MediaModel.Forecast([.. _layers.Select(l => l with { BasisWeightVariation = 0.2 })], _point);

    /// <summary>The same, the fine layer charged.</summary>
    [Benchmark]
    public MediaForecast Charged() => MediaModel.Forecast(
        [_layers[0], _layers[1] with { Charge = new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(2e-5)) }, _layers[2]], _point);

    private static MediaLayer Layer(double micrometres, double solidity, double millimetres) => new()
    {
        Diameters = DiameterDistribution.LogNormal(Length.FromMicrometers(micrometres), 1.5),
        Solidity = new Solidity(solidity),
        Thickness = Length.FromMillimeters(millimetres),
        Uncertainty = new LayerUncertainty { DiameterScale = 0.03, IndependentFibres = 150, Solidity = 0.05, Thickness = 0.04, SolidityByWeighing = true },
    };
}
