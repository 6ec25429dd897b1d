using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>The forecast of a medium and everything that was asked of it besides.</summary>
public sealed record MediaPrediction
{
    /// <summary>The forecast at the operating point.</summary>
    public required MediaForecast Forecast { get; init; }

    /// <summary>Air permeability at 125 Pa and 200 Pa.</summary>
    public required ImmutableArray<AirPermeability> Permeabilities { get; init; }

    /// <summary>Pressure drop of even layers by every law of resistance, by its stable name.</summary>
    public ImmutableSortedDictionary<string, Pressure> PressureDropLaws { get; init; } = ImmutableSortedDictionary<string, Pressure>.Empty;

    /// <summary>The classes of published standards that the forecast points to.</summary>
    public required ImmutableArray<ClassForecast> Classes { get; init; }

    /// <summary>What passes of the aerosols asked for; may be empty.</summary>
    public required ImmutableArray<ChallengeFinding> Challenges { get; init; }

    /// <summary>What passes in the bands of size asked for; may be empty.</summary>
    public required ImmutableArray<BandFinding> Bands { get; init; }

    /// <summary>Total inward leakage at the most-penetrating size; null unless a mask's leaks or an edge leak were told.</summary>
    public required double? TotalInwardLeakage { get; init; }
}
