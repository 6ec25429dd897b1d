using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;
using UnitsNet;

namespace FiberScope.Filtration.Classes;

/// <summary>Puts a medium through the tests behind the classes, each once.</summary>
internal sealed class TestBench(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ForecastSettings settings, Area? mediaArea)
{
    private const int NodesPerBand = 9;
    private const int Draws = 400;

    private readonly Dictionary<string, TestOutcome?> _outcomes = new(StringComparer.Ordinal);

    /// <summary>The outcome of a test; null when it cannot be judged for want of the medium's area.</summary>
    public TestOutcome? Outcome(ClassTest test)
    {
        if (!_outcomes.TryGetValue(test.Id, out var outcome))
        {
            outcome = Run(test);
            _outcomes[test.Id] = outcome;
        }

        return outcome;
    }

    private TestOutcome? Run(ClassTest test)
    {
        var velocity = Velocity(test);
        if (test.Kind == "pressure-drop")
        {
            return velocity is { } given ? PressureDrop(test, given) : null;
        }

        var at = point with { FaceVelocity = velocity ?? point.FaceVelocity };
        return test.Kind switch
        {
            "mpps" => MostPenetrating(at),
            "aerosol" => Penetration(test, at, TestAerosol.AerosolOf(test).Shares()),
            "band" => Penetration(test, at, Band(test)),
            "epm" => Penetration(test, at, [.. AmbientDust.Channels(Length.FromMicrometers(test.UpperMicrometres)).Select(c => (c.Size.Meters, c.Weight))]),
            _ => throw new InvalidOperationException($"The table of classes names an unknown kind of test, '{test.Kind}'."),
        };
    }

    private Speed? Velocity(ClassTest test)
    {
        var area = test.SquareCentimetres is { } own ? Area.FromSquareCentimeters(own) : mediaArea;
        return test.LitresPerMinute is { } flow && area is { } known ? VolumeFlow.FromLitersPerMinute(flow) / known : null;
    }

    private TestOutcome PressureDrop(ClassTest test, Speed velocity)
    {
        var divisor = test.PerSquareCentimetre ? test.SquareCentimetres!.Value : 1;
        var at = point with { FaceVelocity = velocity, Particles = [Length.FromNanometers(300)] };
        var bySet = SingleFibreModel.Published.Select(set => Math.Log(new MediumModel(layers, at, SingleFibreModel.Of(set)).Pascals / divisor)).ToArray();
        var forecast = MediaModel.Forecast(layers, at, settings with { Draws = Math.Min(settings.Draws, Draws) });
        var band = forecast.Uncertainty?.PressureDropPascals;
        return new TestOutcome(Math.Log(forecast.PressureDrop.Pascals / divisor), bySet, band is { } b ? Math.Log(b.High / b.Low) / 3.92 : 0);
    }

    private TestOutcome MostPenetrating(OperatingPoint at)
    {
        var forecast = MediaModel.Forecast(layers, at with { Particles = [] }, settings with { Draws = Math.Min(settings.Draws, Draws) });
        var bySet = SingleFibreModel.Published.Select(set =>
            Math.Log(Math.Max(1e-12, Worst.Of(new MediumModel(layers, at, SingleFibreModel.Of(set)), MediaModel.DefaultParticles).Attenuation))).ToArray();
        return new TestOutcome(Math.Log(forecast.QualityFactorPerPascal * forecast.PressureDrop.Pascals), bySet, Deviation(forecast.Uncertainty?.PenetrationAtMostPenetratingSize));
    }

    private TestOutcome Penetration(ClassTest test, OperatingPoint at, (double Metres, double Share)[] shares)
    {
        var with = test.Kind == "aerosol"
            ? at with { ParticleDensity = Density.FromKilogramsPerCubicMeter(test.Density), ParticlePermittivity = test.Permittivity }
            : at;
        MediaLayer[] bare = [.. layers.Select(l => l with { Charge = null })];
        double Of(CorrelationSet set, IReadOnlyList<MediaLayer> tested)
        {
            var medium = new MediumModel(tested, with, SingleFibreModel.Of(set));
            return shares.Sum(s => s.Share * Math.Exp(-medium.Attenuation(s.Metres)));
        }

        // Ambient-dust efficiencies average the medium as it is and discharged.
        double Value(CorrelationSet set) => test.Discharged
            ? Of(set, bare)
            : test.Kind == "epm" ? 0.5 * (Of(set, layers) + Of(set, bare)) : Of(set, layers);
        var forecast = MediaModel.Forecast(
            test.Discharged ? bare : layers,
            with with { Particles = [.. shares.Select(s => Length.FromMeters(s.Metres))] },
            settings with { Draws = Math.Min(settings.Draws, Draws) });
        return new TestOutcome(
            TestOutcome.OfPenetration(Value(settings.Correlations)),
            [.. SingleFibreModel.Published.Select(set => TestOutcome.OfPenetration(Value(set)))],
            Deviation(ChallengeResult.Over(forecast, [.. shares.OrderBy(s => s.Metres).Select(s => s.Share)]).MeasurementBand));
    }

    private static double Deviation(Statistics.Interval? penetration) => penetration is { } band
        ? (TestOutcome.OfPenetration(band.Low) - TestOutcome.OfPenetration(band.High)) / 3.92
        : 0;

    private static (double Metres, double Share)[] Band(ClassTest test) =>
    [
        .. Enumerable.Range(0, NodesPerBand).Select(i =>
            (1e-6 * test.LowMicrometres * Math.Pow(test.UpperMicrometres / test.LowMicrometres, (i + 0.5) / NodesPerBand), 1.0 / NodesPerBand)),
    ];
}
