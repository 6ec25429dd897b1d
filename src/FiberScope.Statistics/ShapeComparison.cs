using System.Collections.Immutable;

namespace FiberScope.Statistics;

/// <summary>Log-normal, normal and two-part log-normal fits to one sample, compared.</summary>
public sealed record ShapeComparison
{
    /// <summary>A BIC this much smaller counts as strong evidence: Kass and Raftery (1995), J. Am. Stat. Assoc. 90, 773–795.</summary>
    public const double StrongEvidence = 6;

    /// <summary>Two parts closer than this many spreads are one hump: Ashman, Bird and Zepf (1994), Astron. J. 108, 2348.</summary>
    public const double LeastSeparation = 2;

    private ShapeComparison(DistributionShape logNormal, DistributionShape normal, DistributionShape? twoLogNormals, double effectiveCount)
    {
        LogNormal = logNormal;
        Normal = normal;
        TwoLogNormals = twoLogNormals;
        EffectiveCount = effectiveCount;
    }

    /// <summary>The log-normal fit.</summary>
    public DistributionShape LogNormal { get; }

    /// <summary>The normal fit.</summary>
    public DistributionShape Normal { get; }

    /// <summary>The mixture of two log-normal parts; null when there are too few independent values to fit five parameters.</summary>
    public DistributionShape? TwoLogNormals { get; }

    /// <summary>The number of independent values that the comparison counts with.</summary>
    public double EffectiveCount { get; }

    /// <summary>The fits, best (smallest BIC) first.</summary>
    public ImmutableArray<DistributionShape> Ranked =>
        [.. new[] { LogNormal, Normal, TwoLogNormals }.OfType<DistributionShape>().OrderBy(shape => shape.BayesianCriterion)];

    /// <summary>
    /// Whether two parts are supported: strong evidence over both single shapes, each part at least 3 % of the weight,
    /// and the parts at least <see cref="LeastSeparation"/> spreads apart.
    /// </summary>
    public bool IsBimodal =>
        TwoLogNormals is { } two
        && Math.Min(LogNormal.BayesianCriterion, Normal.BayesianCriterion) - two.BayesianCriterion >= StrongEvidence
        && two.Parts.All(part => part.Fraction >= 0.03)
        && Separation(two) >= LeastSeparation;

    /// <summary>Ashman's D on the logarithms: √2 |ln m₁ − ln m₂| / √(s₁² + s₂²).</summary>
    private static double Separation(DistributionShape two)
    {
        var (a, b) = (Math.Log(two.Parts[0].Spread), Math.Log(two.Parts[1].Spread));
        return Math.Sqrt(2) * Math.Abs(Math.Log(two.Parts[0].Location / two.Parts[1].Location)) / Math.Sqrt((a * a) + (b * b));
    }

    /// <summary>Fits and compares.</summary>
    /// <param name="sample">Values above zero.</param>
    /// <param name="effectiveCount">
    /// The number of independent values: that of fibres, not of readings; at least 1. It scales the evidence, not the fits.
    /// </param>
    /// <exception cref="ArgumentException">A value is not above zero, or all values are equal.</exception>
    public static ShapeComparison Of(WeightedSample sample, double effectiveCount)
    {
        Require.Positive(effectiveCount);
        if (!(sample.Values[0] > 0) || sample.Values[0] == sample.Values[^1])
        {
            throw new ArgumentException("Shapes need values above zero that are not all equal.", nameof(sample));
        }

        DistributionShape Finish(ShapeFamily family, ImmutableArray<ShapePart> parts, int parameters)
        {
            var shape = new DistributionShape(family, parts, 0, 0);
            var likelihood = sample.Average(x => Math.Log(Math.Max(shape.Density(x), 1e-300)));
            return shape with { MeanLogLikelihood = likelihood, BayesianCriterion = (-2 * effectiveCount * likelihood) + (parameters * Math.Log(effectiveCount)) };
        }

        const int EnoughForMixture = 20;
        return new ShapeComparison(
            Finish(ShapeFamily.LogNormal, [new(1, sample.GeometricMean, sample.GeometricStandardDeviation)], 2),
            Finish(ShapeFamily.Normal, [new(1, sample.Mean, sample.StandardDeviation)], 2),
            effectiveCount < EnoughForMixture ? null : Finish(ShapeFamily.TwoLogNormals, TwoPartMixture.Fit(sample), 5),
            effectiveCount);
    }
}
