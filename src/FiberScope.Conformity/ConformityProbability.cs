using MathNet.Numerics.Distributions;

namespace FiberScope.Conformity;

/// <summary>The probability that a true value lies within two bounds, given what was found.</summary>
/// <remarks>
/// p = F((T_U − y)/u) − F((T_L − y)/u), with y the value found, u its standard uncertainty and F the standard normal law, or
/// Student's t where the uncertainty itself is known from few degrees of freedom; on the logarithmic scale the same with
/// ln T, ln y and u/y. Source: JCGM 106:2012, section 7 (from memory).
/// </remarks>
internal static class ConformityProbability
{
    public static double Within(double lower, double upper, double value, double uncertainty, Spread spread)
    {
        if (uncertainty == 0)
        {
            return value >= lower && value <= upper ? 1 : 0;
        }

        return Math.Clamp(spread.Below(upper, value, uncertainty) - spread.Below(lower, value, uncertainty), 0, 1);
    }

    /// <summary>The law by which the true value spreads around the one found.</summary>
    internal readonly record struct Spread(UncertaintyScale Scale, double DegreesOfFreedom)
    {
        public double Below(double bound, double value, double uncertainty)
        {
            if (double.IsInfinity(bound))
            {
                return bound > 0 ? 1 : 0;
            }

            return Scale == UncertaintyScale.Linear || value <= 0
                ? Cumulative((bound - value) / uncertainty)
                : bound <= 0 ? 0 : Cumulative(Math.Log(bound / value) * value / uncertainty);
        }

        private double Cumulative(double deviation) => DegreesOfFreedom > 1e6
            ? Normal.CDF(0, 1, deviation)
            : StudentT.CDF(0, 1, DegreesOfFreedom, deviation);
    }
}
