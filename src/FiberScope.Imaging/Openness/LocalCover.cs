using System.Collections.Immutable;

namespace FiberScope.Imaging.Openness;

/// <summary>The cover of every window of one size that fits into a field, side by side.</summary>
/// <param name="Side">The side of the square windows; pixels.</param>
/// <param name="Shares">The share of each window that the foremost fibres take; dimensionless, 0 to 1.</param>
public sealed record LocalCover(int Side, ImmutableArray<double> Shares);
