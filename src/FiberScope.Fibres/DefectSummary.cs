using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>What a swatch holds that is no single fibre, pooled over its fields.</summary>
/// <param name="Area">The area looked at.</param>
/// <param name="Kinds">One entry per kind of defect, those not met included.</param>
public sealed record DefectSummary(Area Area, ImmutableArray<DefectShare> Kinds)
{
    /// <summary>The share of the area that any defect takes; 0 to 1.</summary>
    public double AreaShare => Kinds.Sum(kind => kind.AreaShare);
}
