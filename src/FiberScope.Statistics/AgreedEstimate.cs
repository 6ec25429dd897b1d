using System.Collections.Immutable;
using MathNet.Numerics.Distributions;

namespace FiberScope.Statistics;

/// <summary>Several estimates of one number, combined by their uncertainties and tested for agreement.</summary>
/// <remarks>
/// Weights are inverse variances; agreement is the chi-squared test on the weighted squares; when the estimates disagree the
/// standard uncertainty is multiplied by the Birge ratio √(χ²/(n − 1)), so that a quarrel widens the result.
/// Source: Birge (1932), Phys. Rev. 40, 207–227; the procedure is that of Cox (2002), Metrologia 39, 589–595 (from memory).
/// </remarks>
public sealed record AgreedEstimate
{
    private AgreedEstimate(double value, double standardUncertainty, double probability, ImmutableArray<double> deviations)
    {
        Value = value;
        StandardUncertainty = standardUncertainty;
        AgreementProbability = probability;
        NormalisedDeviations = deviations;
    }

    /// <summary>The weighted mean.</summary>
    public double Value { get; }

    /// <summary>Its standard uncertainty, widened where the estimates disagree.</summary>
    public double StandardUncertainty { get; }

    /// <summary>The probability of a quarrel at least this large by chance; 1 for a single estimate.</summary>
    public double AgreementProbability { get; }

    /// <summary>Whether the estimates agree at the 5 % level.</summary>
    public bool Agrees => AgreementProbability >= 0.05;

    /// <summary>For each estimate its distance from the mean of the others, in standard uncertainties of that difference.</summary>
    public ImmutableArray<double> NormalisedDeviations { get; }

    /// <summary>The place in the list of the estimate that stands furthest off.</summary>
    public int FurthestOff => NormalisedDeviations.Select((d, i) => (Math.Abs(d), -i)).Max() is var (_, i) ? -i : 0;

    /// <summary>Combines estimates.</summary>
    /// <param name="values">The estimates, at least one, finite.</param>
    /// <param name="standardUncertainties">As many standard uncertainties, above zero.</param>
    /// <exception cref="ArgumentException">The lists are empty or differ in length.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A standard uncertainty is not above zero.</exception>
    public static AgreedEstimate Of(ReadOnlySpan<double> values, ReadOnlySpan<double> standardUncertainties)
    {
        if (values.Length == 0 || values.Length != standardUncertainties.Length)
        {
            throw new ArgumentException("Needs at least one estimate, and one uncertainty for each.", nameof(values));
        }

        double total = 0, sum = 0, chiSquared = 0;
        for (var i = 0; i < values.Length; i++)
        {
            var weight = 1 / (Require.Positive(standardUncertainties[i]) * standardUncertainties[i]);
            total += weight;
            sum += weight * Require.Finite(values[i]);
        }

        var mean = sum / total;
        var deviations = ImmutableArray.CreateBuilder<double>(values.Length);
        for (var i = 0; i < values.Length; i++)
        {
            var variance = standardUncertainties[i] * standardUncertainties[i];
            chiSquared += (values[i] - mean) * (values[i] - mean) / variance;
            var others = total - (1 / variance);
            deviations.Add(values.Length == 1 ? 0 : (values[i] - ((sum - (values[i] / variance)) / others)) / Math.Sqrt(variance + (1 / others)));
        }

        var freedom = values.Length - 1;
        var probability = freedom == 0 ? 1 : 1 - ChiSquared.CDF(freedom, chiSquared);
        var birge = probability < 0.05 ? Math.Max(1, Math.Sqrt(chiSquared / freedom)) : 1;
        return new AgreedEstimate(mean, birge / Math.Sqrt(total), probability, deviations.MoveToImmutable());
    }
}
