using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>Solidity from what fields show: the area of cut fibre in sections, or the coverage of a thin layer in transmitted light.</summary>
public static class ImageSolidity
{
    /// <summary>From embedded sections: the mean share of area that is cut fibre is the share of volume.</summary>
    /// <param name="shares">The area share of cut fibre of each field; each in (0, 1), at least one.</param>
    /// <exception cref="ArgumentException">There are no shares, or their mean is not in (0, 1).</exception>
    /// <remarks>Source: A. Delesse (1847), the principle that area share equals volume share on random sections (from memory).</remarks>
    public static SolidityEstimate FromSections(IReadOnlyList<double> shares)
    {
        var (mean, uncertainty) = Mean(shares, 0.015);
        return new SolidityEstimate(SolidityRoute.CrossSection, new Solidity(mean), uncertainty, FormattableString.Invariant($"Area share of cut fibre, mean of {shares.Count} section(s)."));
    }

    /// <summary>From the coverage C of a thin layer: α = −ln(1 − C) π t⁻¹ ⟨d²⟩ / (4 ⟨d⟩).</summary>
    /// <param name="coverages">The coverage of each field; each in (0, 1), at least one.</param>
    /// <param name="meanDiameter">⟨d⟩, the length-weighted mean diameter.</param>
    /// <param name="standardDeviation">The length-weighted standard deviation of the diameters; zero or above.</param>
    /// <param name="thickness">t, the layer's thickness; above zero.</param>
    /// <param name="outline">The relative standard uncertainty of the coverage that where the outlines lie leaves open; dimensionless.</param>
    /// <param name="thicknessUncertainty">The relative standard uncertainty of the thickness; dimensionless.</param>
    /// <param name="seen">How the layer was looked at, for people.</param>
    /// <exception cref="ArgumentException">There are no coverages, or the solidity that they give is not in (0, 1).</exception>
    /// <remarks>
    /// Straight fibres laid at random in a plane cover 1 − exp(−Σ L d / A) (the Poisson law of coverage; P. Hall 1988, from memory), and
    /// their volume is Σ L π d² / 4; with one diameter this is C = 1 − exp(−4 α t / (π d)).
    /// </remarks>
    public static SolidityEstimate FromCoverage(IReadOnlyList<double> coverages, Length meanDiameter, Length standardDeviation, Length thickness, double outline = 0.04, double thicknessUncertainty = 0, string seen = "in transmitted light")
    {
        var (coverage, uncertainty) = Mean(coverages, outline);
        var (d, s) = (meanDiameter.Meters, standardDeviation.Meters);
        var slope = Math.PI / 4 * ((d * d) + (s * s)) / d / thickness.Meters;
        var value = -Math.Log(1 - coverage) * slope;
        if (!(value is > 0 and < 1))
        {
            throw new ArgumentException("The coverage and thickness give no solidity between 0 and 1.", nameof(coverages));
        }

        var total = Math.Sqrt(Math.Pow(slope * uncertainty / (1 - coverage), 2) + Math.Pow(thicknessUncertainty * value, 2));
        return new SolidityEstimate(SolidityRoute.Coverage, new Solidity(value), total, FormattableString.Invariant($"Coverage {coverage:F3} {seen}, mean of {coverages.Count} field(s); from fibres laid at random in the plane."));
    }

    /// <summary>The mean and its standard uncertainty: the fields' scatter, and the doubt of where the outline lies.</summary>
    private static (double Mean, double Uncertainty) Mean(IReadOnlyList<double> shares, double relativeOutline)
    {
        if (shares.Count == 0 || shares.Any(share => !(share is > 0 and < 1)))
        {
            throw new ArgumentException("Needs at least one share, each between 0 and 1.", nameof(shares));
        }

        var mean = shares.Average();

        // One field alone tells nothing about the scatter: a fifth is what fields of a real mat often differ by (common practice, no source).
        var scatter = shares.Count == 1 ? 0.2 * mean : Math.Sqrt(shares.Sum(share => Math.Pow(share - mean, 2)) / (shares.Count - 1) / shares.Count);
        return (mean, Math.Sqrt((scatter * scatter) + Math.Pow(relativeOutline * mean, 2)));
    }
}
