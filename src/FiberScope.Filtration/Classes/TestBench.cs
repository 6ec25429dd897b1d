using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;
using UnitsNet;

namespace FiberScope.Filtration.Classes;

/// <summary>Puts a medium through the tests behind the classes, each once.</summary>
internal sealed class TestBench(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ForecastSettings settings, Area? mediaArea)
{
    private const int NodesPerBand = 9;
    private const int Draws = 400;

    /// <summary>Every second size of the usual curve carries a shared band.</summary>
    private const int SharedStep = 2;

    private readonly MediaLayer[] _bare = [.. layers.Select(l => l with { Charge = null })];
    private readonly bool _isCharged = layers.Any(l => l.Charge is not null);
    private readonly Dictionary<(double MetresPerSecond, bool Discharged), MediaForecast> _drawn = [];
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
        double Drop(CorrelationSet set) => Math.Log(new MediumModel(layers, point with { FaceVelocity = velocity }, SingleFibreModel.Of(set)).Pascals / divisor);

        // Slow flow: what the inputs leave open, relative to the pressure drop, is the same at every velocity.
        var band = Drawn(point.FaceVelocity, discharged: false).Uncertainty?.PressureDropPascals;
        return new TestOutcome(Drop(settings.Correlations), [.. SingleFibreModel.Published.Select(Drop)], band is { } b ? Math.Log(b.High / b.Low) / 3.92 : 0);
    }

    private TestOutcome MostPenetrating(OperatingPoint at)
    {
        double Least(CorrelationSet set) => Math.Log(Math.Max(1e-12, Worst.Of(new MediumModel(layers, at, SingleFibreModel.Of(set)), MediaModel.DefaultParticles).Attenuation));
        return new TestOutcome(
            Least(settings.Correlations),
            [.. SingleFibreModel.Published.Select(Least)],
            Deviation(Drawn(at.FaceVelocity, discharged: false).Uncertainty?.PenetrationAtMostPenetratingSize));
    }

    private TestOutcome Penetration(ClassTest test, OperatingPoint at, (double Metres, double Share)[] shares)
    {
        var with = test.Kind == "aerosol"
            ? at with { ParticleDensity = Density.FromKilogramsPerCubicMeter(test.Density), ParticlePermittivity = test.Permittivity }
            : at;
        double Of(CorrelationSet set, IReadOnlyList<MediaLayer> tested)
        {
            var medium = new MediumModel(tested, with, SingleFibreModel.Of(set));
            return shares.Sum(s => s.Share * Math.Exp(-medium.Attenuation(s.Metres)));
        }

        // Ambient-dust efficiencies average the medium as it is and discharged.
        double Value(CorrelationSet set) => test.Discharged || !_isCharged
            ? Of(set, _bare)
            : test.Kind == "epm" ? 0.5 * (Of(set, layers) + Of(set, _bare)) : Of(set, layers);
        var bySet = SingleFibreModel.Published.ToDictionary(set => set, Value);
        return new TestOutcome(
            TestOutcome.OfPenetration(bySet.TryGetValue(settings.Correlations, out var central) ? central : Value(settings.Correlations)),
            [.. SingleFibreModel.Published.Select(set => TestOutcome.OfPenetration(bySet[set]))],
            Deviation(Band(Drawn(at.FaceVelocity, test.Discharged), shares)));
    }

    /// <summary>
    /// The forecast whose bands all tests at one velocity share: the inputs are drawn once for the point's own particles, as the spread
    /// that they give hardly depends on what the particles are made of.
    /// </summary>
    private MediaForecast Drawn(Speed velocity, bool discharged)
    {
        var key = (velocity.MetersPerSecond, discharged && _isCharged);
        if (!_drawn.TryGetValue(key, out var forecast))
        {
            forecast = MediaModel.Forecast(
                key.Item2 ? _bare : layers,
                point with { FaceVelocity = velocity, Particles = [.. MediaModel.DefaultParticles.Where((_, i) => i % SharedStep == 0)] },
                settings with { Draws = Math.Min(settings.Draws, Draws) });
            _drawn[key] = forecast;
        }

        return forecast;
    }

    /// <summary>A curve's band over shares of sizes, read between its points.</summary>
    private static Statistics.Interval? Band(MediaForecast forecast, (double Metres, double Share)[] shares)
    {
        if (forecast.Curve.Any(c => c.MeasurementBand is null))
        {
            return null;
        }

        double Sum(Func<CurvePoint, double> end) => Math.Clamp(shares.Sum(s => s.Share * Between(forecast, s.Metres, end)), 0, 1);
        return new Statistics.Interval(Sum(c => c.MeasurementBand!.Value.Low), Sum(c => c.MeasurementBand!.Value.High));
    }

    private static double Between(MediaForecast forecast, double metres, Func<CurvePoint, double> value)
    {
        var curve = forecast.Curve;
        var above = 1;
        while (above < curve.Length - 1 && curve[above].Particle.Meters < metres)
        {
            above++;
        }

        var (low, high) = (curve[above - 1], curve[above]);
        var share = Math.Clamp(Math.Log(metres / low.Particle.Meters) / Math.Log(high.Particle / low.Particle), 0, 1);
        return value(low) + (share * (value(high) - value(low)));
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
