using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>The evenness of cover in windows of one size.</summary>
/// <param name="Side">The side of the square window.</param>
/// <param name="StandardDeviation">The standard deviation of the windows' cover; dimensionless.</param>
/// <param name="RandomStandardDeviation">What a mat of straight fibres laid at random would show; dimensionless.</param>
public sealed record UniformityAtWindow(Length Side, double StandardDeviation, double RandomStandardDeviation);
