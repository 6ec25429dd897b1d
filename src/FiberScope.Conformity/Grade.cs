using System.Collections.Immutable;

namespace FiberScope.Conformity;

/// <summary>A product specification: a name and the limits that a swatch of it must keep.</summary>
/// <param name="Name">The grade's name.</param>
/// <param name="Limits">The limits, in the order in which people read them; at least one.</param>
public sealed record Grade(string Name, ImmutableArray<Limit> Limits)
{
    /// <summary>The limits; at least one.</summary>
    /// <exception cref="ArgumentException">There are none.</exception>
    public ImmutableArray<Limit> Limits { get; } = Limits.IsDefaultOrEmpty
        ? throw new ArgumentException("A grade needs at least one limit.", nameof(Limits))
        : Limits;

    /// <summary>Judges a swatch against every limit.</summary>
    /// <param name="observed">Gives what was found for a limit; null when nothing was.</param>
    public GradeVerdict Judge(Func<Limit, ObservedValue?> observed) => new(this, [.. Limits.Select(limit => Verdict.On(limit, observed(limit)))]);
}
