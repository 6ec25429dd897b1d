using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;
using FiberScope.Filtration.Uncertainty;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>From the structure of a medium to what a rig would show.</summary>
public static class MediaModel
{
    private const int DefaultSizes = 61;
    private const double DefaultSmallestMetres = 10e-9;
    private const double DefaultLargestMetres = 10e-6;

    /// <summary>The sizes of a curve unless told otherwise: 61, evenly spaced in ln d from 10 nm to 10 µm.</summary>
    public static ImmutableArray<Length> DefaultParticles { get; } =
    [
        .. Enumerable.Range(0, DefaultSizes).Select(i =>
            Length.FromMeters(DefaultSmallestMetres * Math.Pow(DefaultLargestMetres / DefaultSmallestMetres, (double)i / (DefaultSizes - 1)))),
    ];

    /// <summary>Penetration against size, pressure drop, most-penetrating size and quality factor, with the spread between correlations.</summary>
    /// <param name="layers">The layers, upstream first; at least one.</param>
    /// <param name="point">How the medium is used.</param>
    /// <param name="settings">How the forecast is made; the defaults when null.</param>
    /// <returns>The forecast, with a caveat for every range that it leaves.</returns>
    /// <exception cref="ArgumentException">There are no layers.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A thickness, the face velocity or a size is not above zero.</exception>
    public static MediaForecast Forecast(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ForecastSettings? settings = null)
    {
        Check(layers, point);
        settings ??= new ForecastSettings();
        var particles = point.Particles.IsDefaultOrEmpty ? DefaultParticles : [.. point.Particles.Order()];
        var media = SingleFibreModel.Published.Append(settings.Correlations).Distinct().Select(set => new MediumModel(layers, point, SingleFibreModel.Of(set))).ToArray();
        var central = media.Single(m => m.Model.Set == settings.Correlations);
        var worst = media.Select(m => Worst.Of(m, particles)).ToArray();
        var own = worst[Array.IndexOf(media, central)];
        var monteCarlo = settings.Draws > 0 && MonteCarlo.HasInputs(layers, point)
            ? new MonteCarlo(layers, point, settings, [.. particles.Select(p => p.Meters)])
            : null;
        var uncertainty = monteCarlo?.Run(own.Metres ?? own.WhereMetres);
        return new MediaForecast
        {
            Correlations = settings.Correlations,
            OperatingPoint = point,
            PressureDrop = Pressure.FromPascals(central.Pascals),
            PressureDropModelBandPascals = Spread(media.Select(m => m.Pascals)),
            Curve = [.. particles.Select((p, i) => Point(p, central, media, monteCarlo?.Curve[i]))],
            MostPenetratingSize = own.Metres is { } metres ? Length.FromMeters(metres) : null,
            PenetrationAtMostPenetratingSize = Math.Exp(-own.Attenuation),
            QualityFactorPerPascal = own.Attenuation / central.Pascals,
            MostPenetratingSizeModelBand = SpreadOfSizes(worst),
            PenetrationAtMostPenetratingSizeModelBand = Spread(worst.Select(w => Math.Exp(-w.Attenuation))),
            Uncertainty = uncertainty,
            EdgeLeakShare = central.EdgeLeakShare,
            HoleShares = [.. central.HoleShares],
            Caveats = [.. ForecastCaveats.For(layers, point, particles, central, media), .. RangeCaveats.ForDepth(own.Attenuation)],
        };
    }

    /// <summary>The pressure drop of a medium at another face velocity, by the central set.</summary>
    public static Pressure PressureDropAt(IReadOnlyList<MediaLayer> layers, OperatingPoint point, Speed faceVelocity, ForecastSettings? settings = null)
    {
        Check(layers, point);
        Require.Positive(faceVelocity.MetersPerSecond, nameof(faceVelocity));
        return Pressure.FromPascals(Medium(layers, point, settings).FlowAt(faceVelocity.MetersPerSecond).Pascals);
    }

    /// <summary>The face velocity that a pressure drop drives through a medium: its air permeability at that pressure.</summary>
    /// <remarks>
    /// 1 mm/s is 1 L m⁻² s⁻¹. Usual pressures: 100 and 200 Pa (ISO 9237), 125 Pa (ASTM D737) (from memory). Holes and gaps are
    /// counted with their inertial loss, the fibres with creeping flow.
    /// </remarks>
    public static Speed AirPermeability(IReadOnlyList<MediaLayer> layers, OperatingPoint point, Pressure pressure, ForecastSettings? settings = null)
    {
        Check(layers, point);
        Require.Positive(pressure.Pascals, nameof(pressure));
        var medium = Medium(layers, point, settings);
        var wanted = pressure.Pascals;
        var upper = point.FaceVelocity.MetersPerSecond;
        while (medium.FlowAt(upper).Pascals < wanted)
        {
            upper *= 2;
        }

        return Speed.FromMetersPerSecond(RisingRoot.Solve(u => medium.FlowAt(u).Pascals, wanted, upper));
    }

    private static MediumModel Medium(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ForecastSettings? settings) =>
        new(layers, point, SingleFibreModel.Of((settings ?? new ForecastSettings()).Correlations));

    private static CurvePoint Point(Length particle, MediumModel central, MediumModel[] media, Interval? measured)
    {
        var mechanisms = central.Mechanisms(particle.Meters);
        return new CurvePoint
        {
            Particle = particle,
            Penetration = Math.Exp(-central.Attenuation(particle.Meters)),
            MeasurementBand = measured,
            ModelBand = Spread(media.Select(m => Math.Exp(-m.Attenuation(particle.Meters)))),
            ByMechanism = Shares(mechanisms),
        };
    }

    private static ImmutableSortedDictionary<string, double> Shares(MechanismEfficiencies brought)
    {
        (string Name, double Value)[] all =
        [
            ("diffusion", brought.Diffusion),
            ("interception", brought.Interception),
            ("diffusion-interception", brought.DiffusionInterception),
            ("impaction", brought.Impaction),
            ("gravity", Math.Max(0, brought.Gravity)),
            ("electrostatic", brought.Electrostatic),
            ("straining", brought.Straining),
        ];
        var total = all.Sum(m => m.Value);
        return all.ToImmutableSortedDictionary(m => m.Name, m => total > 0 ? m.Value / total : 0, StringComparer.Ordinal);
    }

    private static Interval Spread(IEnumerable<double> values)
    {
        var all = values.ToArray();
        return new Interval(all.Min(), all.Max());
    }

    private static LengthInterval? SpreadOfSizes(Worst[] worst)
    {
        if (worst.Any(w => w.Metres is null))
        {
            return null;
        }

        var band = Spread(worst.Select(w => w.Metres!.Value));
        return new LengthInterval(Length.FromMeters(band.Low), Length.FromMeters(band.High));
    }

    private static void Check(IReadOnlyList<MediaLayer> layers, OperatingPoint point)
    {
        if (layers.Count == 0)
        {
            throw new ArgumentException("A medium has at least one layer.", nameof(layers));
        }

        foreach (var layer in layers)
        {
            Require.Positive(layer.Thickness.Meters, nameof(layer.Thickness));
        }

        Require.Positive(point.FaceVelocity.MetersPerSecond, nameof(point.FaceVelocity));
        Require.Positive(point.ParticleDensity.KilogramsPerCubicMeter, nameof(point.ParticleDensity));
        foreach (var particle in point.Particles.IsDefault ? [] : point.Particles)
        {
            Require.Positive(particle.Meters, nameof(point.Particles));
        }
    }
}
