using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration.Correlations;
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
        var curve = particles.Select(p => Point(p, central, media)).ToImmutableArray();
        var velocity = point.FaceVelocity.MetersPerSecond;
        var pascals = central.PressureDropPascals(velocity);
        var mostPenetrating = MostPenetrating.Size(central.Attenuation);
        var attenuation = central.Attenuation(mostPenetrating ?? curve.MaxBy(c => c.Penetration)!.Particle.Meters);
        return new MediaForecast
        {
            Correlations = settings.Correlations,
            OperatingPoint = point,
            PressureDrop = Pressure.FromPascals(pascals),
            PressureDropModelBandPascals = Spread(media.Select(m => m.PressureDropPascals(velocity))),
            Curve = curve,
            MostPenetratingSize = mostPenetrating is { } metres ? Length.FromMeters(metres) : null,
            PenetrationAtMostPenetratingSize = Math.Exp(-attenuation),
            QualityFactorPerPascal = attenuation / pascals,
            Caveats = [.. Caveats(layers, point, particles, central, media), .. RangeCaveats.ForDepth(attenuation)],
        };
    }

    /// <summary>The pressure drop of a medium at another face velocity, by the central set.</summary>
    public static Pressure PressureDropAt(IReadOnlyList<MediaLayer> layers, OperatingPoint point, Speed faceVelocity, ForecastSettings? settings = null)
    {
        Check(layers, point);
        Require.Positive(faceVelocity.MetersPerSecond, nameof(faceVelocity));
        return Pressure.FromPascals(Medium(layers, point, settings).PressureDropPascals(faceVelocity.MetersPerSecond));
    }

    /// <summary>The face velocity that a pressure drop drives through a medium: its air permeability at that pressure.</summary>
    /// <remarks>
    /// 1 mm/s is 1 L m⁻² s⁻¹. Usual pressures: 100 and 200 Pa (ISO 9237), 125 Pa (ASTM D737) (from memory). Creeping flow: no inertial
    /// pressure drop, so open cloth reads too high.
    /// </remarks>
    public static Speed AirPermeability(IReadOnlyList<MediaLayer> layers, OperatingPoint point, Pressure pressure, ForecastSettings? settings = null)
    {
        Check(layers, point);
        Require.Positive(pressure.Pascals, nameof(pressure));
        return Speed.FromMetersPerSecond(pressure.Pascals / Medium(layers, point, settings).PascalsPerMetrePerSecond);
    }

    private static MediumModel Medium(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ForecastSettings? settings) =>
        new(layers, point, SingleFibreModel.Of((settings ?? new ForecastSettings()).Correlations));

    private static CurvePoint Point(Length particle, MediumModel central, MediumModel[] media)
    {
        var mechanisms = central.Mechanisms(particle.Meters);
        return new CurvePoint
        {
            Particle = particle,
            Penetration = Math.Exp(-mechanisms.Total),
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
        ];
        var total = all.Sum(m => m.Value);
        return all.ToImmutableSortedDictionary(m => m.Name, m => total > 0 ? m.Value / total : 0, StringComparer.Ordinal);
    }

    private static IEnumerable<Caveat> Caveats(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ImmutableArray<Length> particles, MediumModel central, MediumModel[] media)
    {
        var metres = particles.Select(p => p.Meters).ToArray();
        foreach (var caveat in RangeCaveats.For(layers, point, metres, central.Model.Range))
        {
            yield return caveat;
        }

        var others = media.Where(m => m != central && RangeCaveats.For(layers, point, metres, m.Model.Range).Any(c => c.Code == "outside-fitted-range"))
            .Select(m => m.Model.Range.Name).ToArray();
        if (others.Length > 0)
        {
            yield return new Caveat("band-outside-fitted-range", $"The model band also holds {string.Join(" and ", others)}, outside the range of the fit for part of this curve.");
        }
    }

    private static Interval Spread(IEnumerable<double> values)
    {
        var all = values.ToArray();
        return new Interval(all.Min(), all.Max());
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
