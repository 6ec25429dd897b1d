using System.Collections.Immutable;

namespace FiberScope.Filtration;

/// <summary>The class of one standard that a forecast points to.</summary>
public sealed record ClassForecast
{
    /// <summary>What must stand beside every class: a forecast decides nothing.</summary>
    public const string Caution = "A forecast for the flat medium: only the standard's own test on the finished product decides.";

    /// <summary>The standard.</summary>
    public required string Standard { get; init; }

    /// <summary>The edition whose limits were used, and how well they are known.</summary>
    public required string Edition { get; init; }

    /// <summary>Where the limits are from.</summary>
    public required string Provenance { get; init; }

    /// <summary>The highest class whose limits the central forecast keeps; null for none.</summary>
    public required string? Class { get; init; }

    /// <summary>The probability that the medium keeps the limits of <see cref="Class"/>; zero for none.</summary>
    public required double Probability { get; init; }

    /// <summary>Every class, lowest first, with the probability that its limits are kept.</summary>
    public required ImmutableArray<ClassProbability> All { get; init; }

    /// <summary>What the class asks for beyond the limits that were judged.</summary>
    public required string NotJudged { get; init; }
}

/// <summary>One class and the probability that its judged limits are kept.</summary>
/// <param name="Name">The class.</param>
/// <param name="Probability">From 0 to 1: published sets taken as equally likely, each with the measurement uncertainty about it.</param>
/// <param name="Kept">Whether the central forecast keeps all judged limits.</param>
public sealed record ClassProbability(string Name, double Probability, bool Kept);
