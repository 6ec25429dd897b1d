using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Conformity;

/// <summary>One limit of a grade: at least, at most, or between.</summary>
public sealed record Limit
{
    /// <summary>The largest risk that a limit allows unless its grade says otherwise.</summary>
    /// <remarks>Source: ISO 14253-1:2017 takes a conformance probability of 95 % where nothing is agreed (from memory).</remarks>
    public const double DefaultMaximumRisk = 0.05;

    /// <summary>Makes a limit.</summary>
    /// <param name="characteristic">What is limited.</param>
    /// <param name="atLeast">The smallest value that conforms; null when there is none.</param>
    /// <param name="atMost">The largest value that conforms; null when there is none.</param>
    /// <exception cref="ArgumentException">There is no bound, a bound is of another kind, or the bounds are in the wrong order.</exception>
    public Limit(Characteristic characteristic, IQuantity? atLeast, IQuantity? atMost)
    {
        Characteristic = characteristic;
        AtLeast = atLeast;
        AtMost = atMost;
        if (atLeast is null && atMost is null)
        {
            throw new ArgumentException($"A limit on the {characteristic.Name} needs 'at least', 'at most' or both.", nameof(atLeast));
        }

        if (atLeast is not null && atMost is not null && !(characteristic.In(atLeast) < characteristic.In(atMost)))
        {
            throw new ArgumentException($"The limits on the {characteristic.Name} are in the wrong order.", nameof(atMost));
        }

        _ = Lower + Upper; // Both are read once so that a bound of another kind is refused here and not later.
    }

    /// <summary>What is limited.</summary>
    public Characteristic Characteristic { get; }

    /// <summary>The smallest value that conforms; null when there is none.</summary>
    public IQuantity? AtLeast { get; }

    /// <summary>The largest value that conforms; null when there is none.</summary>
    public IQuantity? AtMost { get; }

    /// <summary>
    /// The largest risk of a wrong decision that the parties accept, for acceptance and rejection alike; dimensionless, in (0, 0.5).
    /// </summary>
    public double MaximumRisk { get; init => field = Require.Inside(value, 0, 0.5); } = DefaultMaximumRisk;

    /// <summary>The particle diameter of a limit on penetration; null otherwise.</summary>
    public Length? Particle { get; init; }

    /// <summary>The pressure drop at which an air permeability is meant; null otherwise.</summary>
    public Pressure? TestPressure { get; init; }

    /// <summary>What is limited, with its condition, for people: <c>penetration at 0.3 µm</c>.</summary>
    public string Name => Particle is { } particle
        ? FormattableString.Invariant($"{Characteristic.Name} at {particle.Micrometers:G4} µm")
        : TestPressure is { } pressure
            ? FormattableString.Invariant($"{Characteristic.Name} at {pressure.Pascals:G4} Pa")
            : Characteristic.Name;

    /// <summary>The bounds for people: <c>at most 3 %</c>, <c>1.5 µm to 2.1 µm</c>.</summary>
    public string Bounds => (AtLeast, AtMost) switch
    {
        ({ } low, { } high) => $"{Characteristic.Format(low)} to {Characteristic.Format(high)}",
        ({ } low, null) => $"at least {Characteristic.Format(low)}",
        (null, { } high) => $"at most {Characteristic.Format(high)}",
        _ => "",
    };

    /// <summary>The lower bound in the characteristic's unit; minus infinity when there is none.</summary>
    internal double Lower => AtLeast is null ? double.NegativeInfinity : Characteristic.In(AtLeast);

    /// <summary>The upper bound in the characteristic's unit; infinity when there is none.</summary>
    internal double Upper => AtMost is null ? double.PositiveInfinity : Characteristic.In(AtMost);
}
