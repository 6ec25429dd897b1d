using FiberScope.Statistics;

namespace FiberScope.Filtration;

/// <summary>How a forecast is made; apart from what is forecast.</summary>
public sealed record ForecastSettings
{
    /// <summary>The set that the central values come from; the fan model by default. The published ones make the model band.</summary>
    public CorrelationSet Correlations { get; init; } = CorrelationSet.KirschStechkina1978;

    /// <summary>How many times the uncertain inputs are drawn; 0 for no measurement bands. 2,000 by default.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Negative, or 1 to 49: too few for a 95 % interval.</exception>
    public int Draws { get; init => field = value == 0 ? 0 : (int)Require.Within(value, 50, 1_000_000, nameof(Draws)); } = 2000;

    /// <summary>The seed of the draws; the same seed gives the same bands.</summary>
    public int Seed { get; init; } = 1;
}
