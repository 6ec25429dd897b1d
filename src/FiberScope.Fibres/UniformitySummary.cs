using System.Collections.Immutable;

namespace FiberScope.Fibres;

/// <summary>How evenly the fibres cover the field, against the side of the window it is looked at through.</summary>
public sealed record UniformitySummary
{
    /// <summary>One entry per window, smallest first.</summary>
    public required ImmutableArray<UniformityAtWindow> Windows { get; init; }

    /// <summary>
    /// The standard deviation of local cover over that of a random mat of the same cover and fibres, averaged over the windows
    /// (geometric mean); 1 random, above 1 cloudy, below 1 more even than chance.
    /// </summary>
    public required double Unevenness { get; init; }
}
