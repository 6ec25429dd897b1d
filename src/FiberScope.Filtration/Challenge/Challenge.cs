using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>Sends aerosols against a medium: curve first, then the sum over sizes, never the other way round.</summary>
public static class Challenge
{
    private const int NodesPerBand = 9;

    /// <summary>What passes of a log-normal aerosol.</summary>
    /// <param name="layers">The layers, upstream first.</param>
    /// <param name="point">How the medium is used; the aerosol's density and permittivity take the place of its own.</param>
    /// <param name="aerosol">The aerosol.</param>
    /// <param name="settings">How the forecast is made; the defaults when null.</param>
    public static ChallengeResult Penetration(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ChallengeAerosol aerosol, ForecastSettings? settings = null)
    {
        var shares = aerosol.Shares();
        var forecast = MediaModel.Forecast(
            layers,
            point with
            {
                Particles = [.. shares.Select(s => Length.FromMeters(s.Metres))],
                ParticleDensity = aerosol.ParticleDensity,
                ParticlePermittivity = aerosol.ParticlePermittivity,
            },
            settings);
        return ChallengeResult.Over(forecast, [.. shares.Select(s => s.Share)]);
    }

    /// <summary>Efficiency's complement averaged over a band of sizes, evenly in ln d.</summary>
    /// <param name="layers">The layers, upstream first.</param>
    /// <param name="point">How the medium is used.</param>
    /// <param name="low">The band's lower end; above zero.</param>
    /// <param name="high">The band's upper end; above <paramref name="low"/>.</param>
    /// <param name="settings">How the forecast is made; the defaults when null.</param>
    public static ChallengeResult OverBand(IReadOnlyList<MediaLayer> layers, OperatingPoint point, Length low, Length high, ForecastSettings? settings = null)
    {
        var ratio = Require.Within(high / low, 1, 1e6);
        var sizes = Enumerable.Range(0, NodesPerBand).Select(i => low * Math.Pow(ratio, (i + 0.5) / NodesPerBand)).ToArray();
        var forecast = MediaModel.Forecast(layers, point with { Particles = [.. sizes] }, settings);
        return ChallengeResult.Over(forecast, [.. sizes.Select(_ => 1.0 / NodesPerBand)]);
    }
}
