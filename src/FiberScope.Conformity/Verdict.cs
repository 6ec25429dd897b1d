using FiberScope.Statistics;

namespace FiberScope.Conformity;

/// <summary>What can be said about one limit of a grade, and at which risk.</summary>
/// <remarks>
/// Acceptance and rejection are both guarded: between the two lies a zone in which neither is proven. Source: ISO 14253-1:2017 and
/// JCGM 106:2012, section 8.3 (from memory). For a forecast the risks are those of the worst model of its band.
/// </remarks>
public sealed record Verdict
{
    private const string OnlyTheTestDecides = "This is a forecast; only the standard's own test decides.";

    private Verdict(Limit limit, ObservedValue? observed, Interval breachProbability)
    {
        Limit = limit;
        Observed = observed;
        BreachProbability = breachProbability;
    }

    /// <summary>The limit.</summary>
    public Limit Limit { get; }

    /// <summary>What was found; null when nothing was.</summary>
    public ObservedValue? Observed { get; }

    /// <summary>
    /// The probability that the true value breaks the limit; a single number for a measured value, a range over the models for a
    /// forecast, 0 to 1 when nothing was found.
    /// </summary>
    public Interval BreachProbability { get; }

    /// <summary>The decision at the limit's maximum risk.</summary>
    public Decision Decision =>
        BreachProbability.High <= Limit.MaximumRisk ? Decision.Pass
        : 1 - BreachProbability.Low <= Limit.MaximumRisk ? Decision.Fail
        : Decision.Undecided;

    /// <summary>
    /// The consumer's risk of accepting on this evidence: the probability that what is accepted breaks the limit. 0 to 1.
    /// </summary>
    public double ConsumersRisk => BreachProbability.High;

    /// <summary>
    /// The producer's risk of rejecting on this evidence: the probability that what is rejected keeps the limit. 0 to 1.
    /// </summary>
    public double ProducersRisk => 1 - BreachProbability.Low;

    /// <summary>Where acceptance begins inside the limit, and rejection outside it; null when nothing was found.</summary>
    public GuardBand? GuardBand => Observed is null ? null : GuardBand.Of(Limit, Observed);

    /// <summary>What would bring a decision; null when there is one.</summary>
    public WayToDecide? WayToDecide => Decision == Decision.Undecided ? WayToDecide.For(this) : null;

    /// <summary>The verdict in one or two sentences for people.</summary>
    public string Sentence
    {
        get
        {
            if (Observed is null)
            {
                return $"Undecided: nothing was found for the {Limit.Name} ({Limit.Bounds}).";
            }

            var forecast = Limit.Characteristic.IsForecast;
            var found = $"{(forecast ? "forecast " : "")}{Limit.Name} {Limit.Characteristic.Format(Observed.Value)}, limit {Limit.Bounds}";
            var text = Decision switch
            {
                Decision.Pass => FormattableString.Invariant($"Pass{(forecast ? " by forecast" : "")}: {found}; risk that it is outside {Percent(ConsumersRisk)}."),
                Decision.Fail => FormattableString.Invariant($"Fail{(forecast ? " by forecast" : "")}: {found}; risk that it is inside all the same {Percent(ProducersRisk)}."),
                _ => FormattableString.Invariant($"Undecided: {found}; it may be outside with a probability of {Percent(BreachProbability)}. {WayToDecide!.Sentence}"),
            };
            return forecast ? $"{text} {OnlyTheTestDecides}" : text;
        }
    }

    /// <summary>Judges what was found against a limit.</summary>
    /// <param name="limit">The limit.</param>
    /// <param name="observed">What was found; null when nothing was.</param>
    /// <exception cref="ArgumentException">The value is not of the limit's kind.</exception>
    public static Verdict On(Limit limit, ObservedValue? observed)
    {
        if (observed is null)
        {
            return new Verdict(limit, null, new Interval(0, 1));
        }

        var uncertainty = limit.Characteristic.In(observed.StandardUncertainty);
        return new Verdict(limit, observed, Breach(limit, observed, uncertainty, observed.DegreesOfFreedom));
    }

    /// <summary>The range of breach probabilities over the models, at a given standard uncertainty in the characteristic's unit.</summary>
    internal static Interval Breach(Limit limit, ObservedValue observed, double uncertainty, double freedom)
    {
        var spread = new ConformityProbability.Spread(observed.Scale, freedom);
        var centre = limit.Characteristic.In(observed.Value);
        double At(double value) =>
            1 - ConformityProbability.Within(limit.Lower, limit.Upper, value, Carried(observed.Scale, uncertainty, value, centre), spread);
        if (observed.ModelBand is not { } band)
        {
            return new Interval(At(centre), At(centre));
        }

        double[] all = [At(centre), At(limit.Characteristic.In(band.Low)), At(limit.Characteristic.In(band.High))];
        return new Interval(all.Min(), all.Max());
    }

    /// <summary>A relative uncertainty keeps its ratio when the value moves along the model band.</summary>
    private static double Carried(UncertaintyScale scale, double uncertainty, double value, double centre) =>
        scale == UncertaintyScale.Logarithmic && centre > 0 && value > 0 ? uncertainty * value / centre : uncertainty;

    private static string Percent(Interval range) => range.Width < 0.0005
        ? Percent(range.High)
        : $"{Percent(range.Low)} to {Percent(range.High)}";

    private static string Percent(double share) => share switch
    {
        < 0.001 => "below 0.1 %",
        > 0.999 => "above 99.9 %",
        < 0.1 => FormattableString.Invariant($"{share * 100:F1} %"),
        _ => FormattableString.Invariant($"{share * 100:F0} %"),
    };
}
