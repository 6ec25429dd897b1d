using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Specimens;

/// <summary>One log-normal part of a mat's fibres.</summary>
public sealed record FibrePopulation
{
    /// <summary>Its share of the mat's fibre length; dimensionless, above zero. Shares are scaled to sum to one.</summary>
    public double LengthShare { get; init => field = Require.Positive(value, nameof(LengthShare)); } = 1;

    /// <summary>Its length-weighted median diameter; above zero.</summary>
    public required Length MedianDiameter { get; init; }

    /// <summary>Its geometric standard deviation; dimensionless, from 1 (all alike) to 4.</summary>
    public double GeometricStandardDeviation { get; init => field = Require.Within(value, 1, 4, nameof(GeometricStandardDeviation)); } = 1.3;
}
