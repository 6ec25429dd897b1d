namespace FiberScope.Filtration;

/// <summary>What one uncertain input costs a forecast when it alone varies.</summary>
public sealed record InputContribution
{
    /// <summary>The input: <c>diameter-scale</c>, <c>diameter-distribution</c>, <c>solidity</c>, <c>basis-weight</c>, <c>thickness</c>, <c>inhomogeneity</c>, <c>charge</c>, <c>face-velocity</c>, <c>temperature</c>, <c>air-pressure</c>.</summary>
    public required string Input { get; init; }

    /// <summary>The layer, by number from 1; null for the conditions of use.</summary>
    public required int? Layer { get; init; }

    /// <summary>Standard deviation that it gives −ln P at the most-penetrating size; dimensionless.</summary>
    public required double LogPenetrationDeviation { get; init; }

    /// <summary>Relative standard deviation that it gives the pressure drop; dimensionless.</summary>
    public required double PressureDropDeviation { get; init; }

    /// <summary>Its share of the variance of −ln P at the most-penetrating size; the shares of all inputs sum to 1.</summary>
    public required double PenetrationShare { get; init; }

    /// <summary>Its share of the variance of the pressure drop; the shares of all inputs sum to 1.</summary>
    public required double PressureDropShare { get; init; }
}
