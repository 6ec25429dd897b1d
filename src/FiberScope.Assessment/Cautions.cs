using System.Collections.Immutable;

namespace FiberScope.Assessment;

/// <summary>The cautions that every summary and report shows.</summary>
public static class Cautions
{
    /// <summary>The cautions, most important first; each a sentence or two for people.</summary>
    public static ImmutableArray<string> All { get; } =
    [
        "A forecast certifies nothing. Approval of a respirator, mask or filter needs the standard's own test, by an accredited or notified body, on the finished and fitted product.",
        "Fit and seal dominate real protection: a small leak lets through more than the medium does.",
        "Handle fibre dust, discharge solvents, embedding resins and microscopes by the local safety rules and the makers' data sheets.",
    ];
}
