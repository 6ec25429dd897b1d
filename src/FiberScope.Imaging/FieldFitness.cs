using System.Collections.Immutable;

namespace FiberScope.Imaging;

/// <summary>Whether a field can be measured, check by check.</summary>
/// <param name="Checks">Every check made, in the order in which a person would look.</param>
public sealed record FieldFitness(ImmutableArray<FitnessCheck> Checks)
{
    /// <summary>Whether every check passed.</summary>
    public bool IsFit => Checks.All(check => check.Passed);
}
