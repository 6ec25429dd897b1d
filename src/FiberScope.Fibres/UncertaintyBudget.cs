using System.Collections.Immutable;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>One part of the uncertainty of a mean diameter.</summary>
/// <param name="Name">Its stable name: <c>scale</c>, <c>edge</c>, <c>fibres</c>, <c>fields</c>, <c>swatches</c>.</param>
/// <param name="StandardUncertainty">Its standard uncertainty of the mean; zero or above.</param>
/// <param name="DegreesOfFreedom">Its degrees of freedom; infinite where it is known from elsewhere.</param>
/// <param name="Meaning">What it is, in one sentence for people.</param>
public sealed record BudgetPart(string Name, Length StandardUncertainty, double DegreesOfFreedom, string Meaning);

/// <summary>The uncertainty of a mean diameter, part by part.</summary>
/// <remarks>
/// Parts add in squares. Source: JCGM 100:2008 (GUM), sections 5.1 and G.4 (Welch–Satterthwaite).
/// </remarks>
/// <param name="Parts">The parts, in the order in which they arise.</param>
public sealed record UncertaintyBudget(ImmutableArray<BudgetPart> Parts)
{
    /// <summary>The combined standard uncertainty.</summary>
    public Length Combined => Length.FromMeters(Math.Sqrt(Parts.Sum(p => p.StandardUncertainty.Meters * p.StandardUncertainty.Meters)));

    /// <summary>The effective degrees of freedom by Welch–Satterthwaite; infinite when no part is limited.</summary>
    public double EffectiveDegreesOfFreedom
    {
        get
        {
            var combined = Combined.Meters;
            var sum = Parts.Where(p => double.IsFinite(p.DegreesOfFreedom) && p.DegreesOfFreedom > 0)
                .Sum(p => Math.Pow(p.StandardUncertainty.Meters / combined, 4) / p.DegreesOfFreedom);
            return sum > 0 ? 1 / sum : double.PositiveInfinity;
        }
    }

    /// <summary>Half the width of the 95 % interval: Student's t at the effective degrees of freedom times the combined uncertainty.</summary>
    public Length Expanded95 => Combined.Meters > 0 ? Combined * ClusteredMean.StudentFactor95(EffectiveDegreesOfFreedom) : Length.Zero;
}
