using System.Collections.Immutable;
using MathNet.Numerics.Distributions;

namespace FiberScope.Statistics;

/// <summary>The families of distribution that diameters are compared with.</summary>
public enum ShapeFamily
{
    /// <summary>ln x is normal.</summary>
    LogNormal,

    /// <summary>x is normal.</summary>
    Normal,

    /// <summary>Two log-normal parts.</summary>
    TwoLogNormals,
}

/// <summary>One part of a fitted shape.</summary>
/// <param name="Fraction">Its share of the weight; dimensionless, in (0, 1].</param>
/// <param name="Location">Its median for a log-normal part, its mean for a normal one; in the unit of the values.</param>
/// <param name="Spread">Its geometric standard deviation (1 or above) for a log-normal part, its standard deviation for a normal one.</param>
public readonly record struct ShapePart(double Fraction, double Location, double Spread);

/// <summary>A distribution fitted to a weighted sample by maximum likelihood.</summary>
/// <param name="Family">Which family it is.</param>
/// <param name="Parts">Its parts, smallest first; one unless it is a mixture.</param>
/// <param name="MeanLogLikelihood">The weighted mean log-likelihood a value; depends on the unit of the values.</param>
/// <param name="BayesianCriterion">
/// BIC = −2 n L + k ln n, with n the effective number of independent values, L the mean log-likelihood and k the number of free
/// parameters; smaller is better. Source: Schwarz (1978), Ann. Statist. 6, 461–464.
/// </param>
public sealed record DistributionShape(ShapeFamily Family, ImmutableArray<ShapePart> Parts, double MeanLogLikelihood, double BayesianCriterion)
{
    /// <summary>The probability density at <paramref name="value"/> (above zero); per unit of the values.</summary>
    public double Density(double value) => Parts.Sum(p => p.Fraction * (Family == ShapeFamily.Normal
        ? Normal.PDF(p.Location, p.Spread, value)
        : LogNormal.PDF(Math.Log(p.Location), Math.Log(p.Spread), value)));

    /// <summary>The share at or below <paramref name="value"/> (above zero); dimensionless, 0 to 1.</summary>
    public double ShareAtOrBelow(double value) => Parts.Sum(p => p.Fraction * (Family == ShapeFamily.Normal
        ? Normal.CDF(p.Location, p.Spread, value)
        : LogNormal.CDF(Math.Log(p.Location), Math.Log(p.Spread), value)));
}
