using FiberScope.Statistics;

namespace FiberScope.Fibres;

/// <summary>The solidity (packing density) of a mat: fibre volume divided by mat volume.</summary>
public sealed record Solidity
{
    /// <summary>Makes a solidity from the volume fraction α; dimensionless, 0 &lt; α &lt; 1.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The fraction is not in (0, 1).</exception>
    public Solidity(double fraction) => Fraction = Require.Inside(fraction, 0, 1);

    /// <summary>α, the volume fraction of fibre; dimensionless, in (0, 1).</summary>
    public double Fraction { get; }

    /// <summary>The solidity found by weighing: α = W / (ρ t).</summary>
    /// <param name="basisWeight">W, the mass of mat per area, above zero.</param>
    /// <param name="fibreDensity">ρ, the density of the fibre's polymer, above zero.</param>
    /// <param name="thickness">t, the mat's thickness, above zero.</param>
    /// <exception cref="ArgumentOutOfRangeException">The result is not in (0, 1): one of the three is wrong.</exception>
    public static Solidity FromWeighing(UnitsNet.AreaDensity basisWeight, UnitsNet.Density fibreDensity, UnitsNet.Length thickness) =>
        new(basisWeight.KilogramsPerSquareMeter / (fibreDensity.KilogramsPerCubicMeter * thickness.Meters));
}
