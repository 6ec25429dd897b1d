namespace FiberScope.Filtration;

/// <summary>How a forecast is made; apart from what is forecast.</summary>
public sealed record ForecastSettings
{
    /// <summary>The set that the central values come from; the fan model by default. The others make the model band.</summary>
    public CorrelationSet Correlations { get; init; } = CorrelationSet.KirschStechkina1978;
}
