using System.Collections.Immutable;
using FiberScope.Statistics;

namespace FiberScope.Assessment.Auditing;

/// <summary>How the machine agrees with a person's eye.</summary>
public sealed record AuditFinding
{
    /// <summary>What the crops were drawn from.</summary>
    public required AuditKey Key { get; init; }

    /// <summary>The pairs, in the order of the crops.</summary>
    public required ImmutableArray<AuditPair> Pairs { get; init; }

    /// <summary>Crops that the person left empty.</summary>
    public required ImmutableArray<string> Unfilled { get; init; }

    /// <summary>Machine minus person, µm.</summary>
    public required BlandAltman Micrometres { get; init; }

    /// <summary>Natural logarithm of machine over person: differences that grow with the diameter, made even.</summary>
    public required BlandAltman Logarithm { get; init; }

    /// <summary>The machine against the person, µm, both in error alike.</summary>
    public required DemingRegression Line { get; init; }

    /// <summary>Machine over person − 1, with its 95 % interval; dimensionless.</summary>
    public (double Value, Interval Interval95) RelativeBias => (Math.Exp(Logarithm.Bias) - 1, new Interval(Math.Exp(Logarithm.BiasInterval95.Low) - 1, Math.Exp(Logarithm.BiasInterval95.High) - 1));

    /// <summary>Between which machine over person − 1 lies for 95 % of readings; dimensionless.</summary>
    public Interval RelativeLimits => new(Math.Exp(Logarithm.LowerLimit) - 1, Math.Exp(Logarithm.UpperLimit) - 1);

    /// <summary>The result in one sentence.</summary>
    public string Sentence
    {
        get
        {
            var (bias, interval) = RelativeBias;
            var range = FormattableString.Invariant($"95 % interval {interval.Low * 100:+0.0;−0.0;0.0} to {interval.High * 100:+0.0;−0.0;0.0} %");
            return interval.Contains(0)
                ? FormattableString.Invariant($"No bias between machine and eye can be told: {bias * 100:+0.0;−0.0;0.0} % ({range}) over {Pairs.Length} readings.")
                : FormattableString.Invariant($"The machine reads {Math.Abs(bias) * 100:F1} % {(bias > 0 ? "more" : "less")} than the eye ({range}) over {Pairs.Length} readings.");
        }
    }
}

/// <summary>One crop, read by both.</summary>
/// <param name="Crop">The crop with the machine's reading.</param>
/// <param name="PersonMicrometres">What the person read, µm.</param>
public sealed record AuditPair(AuditCrop Crop, double PersonMicrometres)
{
    /// <summary>What the machine read, µm.</summary>
    public double MachineMicrometres => Crop.Reading.Diameter.Micrometers;

    /// <summary>Machine over person; dimensionless.</summary>
    public double Ratio => MachineMicrometres / PersonMicrometres;
}
