using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Designing;

/// <summary>The structures that a search found, and a map of two of its variables.</summary>
public sealed record DesignFinding
{
    /// <summary>What was asked.</summary>
    public required DesignFile Design { get; init; }

    /// <summary>The correlations that the search used.</summary>
    public required CorrelationSet Correlations { get; init; }

    /// <summary>The best structures, best first; where none meets the targets, the nearest misses.</summary>
    public required ImmutableArray<DesignCandidate> Candidates { get; init; }

    /// <summary>
    /// The best structure that keeps the targets even where the models and the uncertain inputs are against it; null when the best is as
    /// sure already, or when none of the ranges allows it.
    /// </summary>
    public required DesignCandidate? Surer { get; init; }

    /// <summary>Two variables over their ranges with the others as in the best structure; null with one variable only.</summary>
    public required DesignMap? Map { get; init; }

    /// <summary>What a reader must know of the best structure's forecast.</summary>
    public required ImmutableArray<Caveat> Caveats { get; init; }

    /// <summary>Whether the best structure meets every target.</summary>
    public bool IsMet => Candidates[0].MeetsTargets;
}

/// <summary>Candidates on an even grid over two variables.</summary>
/// <param name="Across">The variable along the width.</param>
/// <param name="Up">The variable along the height.</param>
/// <param name="Rows">Rows from the low end of <paramref name="Up"/>, each from the low end of <paramref name="Across"/>.</param>
public sealed record DesignMap(DesignVariable Across, DesignVariable Up, ImmutableArray<ImmutableArray<DesignCandidate>> Rows);
