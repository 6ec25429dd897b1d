using UnitsNet;

namespace FiberScope.Conformity;

/// <summary>What would turn 'undecided' into a decision, should the value found stay as it is.</summary>
public sealed record WayToDecide
{
    private const int MostFields = 1000;

    private WayToDecide(string sentence) => Sentence = sentence;

    /// <summary>The largest standard uncertainty at which the present value would be decided; null when none would do.</summary>
    public IQuantity? NeededStandardUncertainty { get; private init; }

    /// <summary>How many fields in all would reach it; null when fields do not matter or cannot suffice.</summary>
    public int? FieldsNeeded { get; private init; }

    /// <summary>Which decision would follow; undecided when nothing would bring one.</summary>
    public Decision Outcome { get; private init; } = Decision.Undecided;

    /// <summary>The advice in one sentence for people.</summary>
    public string Sentence { get; }

    internal static WayToDecide For(Verdict verdict)
    {
        var (limit, observed) = (verdict.Limit, verdict.Observed);
        if (observed is null)
        {
            return new WayToDecide($"To decide, give what the {limit.Name} needs: see the caveats for what is missing.");
        }

        var outcome = Decided(limit, observed, 0, double.PositiveInfinity);
        if (outcome == Decision.Undecided)
        {
            return new WayToDecide(observed.ModelBand is null
                ? "The value lies on the limit: no better measurement would decide."
                : "The published models disagree across the limit: a rig measurement or a calibration of this material would decide, better micrographs would not.");
        }

        var now = limit.Characteristic.In(observed.StandardUncertainty);
        var needed = LargestDecided(limit, observed, now);
        var fields = FieldsFor(limit, observed, now);
        var toWhat = outcome == Decision.Pass ? "a pass" : "a fail";
        var quantity = limit.Characteristic.Of(needed);
        var text = $"Should the value stay, a standard uncertainty of {limit.Characteristic.FormatUncertainty(quantity)} or less (now {limit.Characteristic.FormatUncertainty(observed.StandardUncertainty)}) would make it {toWhat}";
        var plan = (observed.Sampling, fields) switch
        {
            (null, _) => ".",
            ({ } sampling, { } count) => FormattableString.Invariant($": about {count} fields like these in all, {count - sampling.Fields} more."),
            _ => "; more fields alone cannot reach it.",
        };
        return new WayToDecide(text + plan) { NeededStandardUncertainty = quantity, FieldsNeeded = fields, Outcome = outcome };
    }

    private static Decision Decided(Limit limit, ObservedValue observed, double uncertainty, double freedom)
    {
        var breach = Verdict.Breach(limit, observed, uncertainty, freedom);
        return breach.High <= limit.MaximumRisk ? Decision.Pass : 1 - breach.Low <= limit.MaximumRisk ? Decision.Fail : Decision.Undecided;
    }

    /// <summary>Halving: the present uncertainty is undecided and none at all is decided, with one border between.</summary>
    private static double LargestDecided(Limit limit, ObservedValue observed, double now)
    {
        var (decided, undecided) = (0.0, now);
        for (var i = 0; i < 60; i++)
        {
            var middle = (decided + undecided) / 2;
            (decided, undecided) = Decided(limit, observed, middle, observed.DegreesOfFreedom) == Decision.Undecided
                ? (decided, middle)
                : (middle, undecided);
        }

        return decided;
    }

    /// <summary>
    /// The sampling part falls with the number of fields, the rest stays; degrees of freedom follow by Welch–Satterthwaite.
    /// </summary>
    private static int? FieldsFor(Limit limit, ObservedValue observed, double now)
    {
        if (observed.Sampling is not { } sampling)
        {
            return null;
        }

        var part = Math.Min(now, limit.Characteristic.In(sampling.StandardUncertainty));
        var lasting = (now * now) - (part * part);
        for (var fields = sampling.Fields + 1; fields <= MostFields; fields++)
        {
            var variable = part * part * sampling.Fields / fields;
            var freedom = variable > 0 ? Math.Max(1, (fields - 1) * Math.Pow((lasting + variable) / variable, 2)) : double.PositiveInfinity;
            if (Decided(limit, observed, Math.Sqrt(lasting + variable), freedom) != Decision.Undecided)
            {
                return fields;
            }
        }

        return null;
    }
}
