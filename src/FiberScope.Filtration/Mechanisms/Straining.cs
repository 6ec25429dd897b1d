using FiberScope.Statistics;
using MathNet.Numerics.Distributions;

namespace FiberScope.Filtration.Mechanisms;

/// <summary>Particles larger than the openings of a mat stay in front of it.</summary>
public static class Straining
{
    /// <summary>Flow through an opening grows as the fourth power of its size (Poiseuille), so the air prefers the large ones.</summary>
    private const double FlowExponent = 4;

    /// <summary>Penetration is never taken below this by straining alone: openings join up below the surface.</summary>
    private const double LeastPassing = 1e-6;

    /// <summary>−ln of the share of the air that goes through openings larger than the particle.</summary>
    /// <param name="sizeRatio">Particle diameter / median opening; dimensionless, above zero.</param>
    /// <param name="geometricStandardDeviation">GSD of the openings, by number; above 1.</param>
    /// <returns>What straining adds to −ln P; zero or above.</returns>
    /// <remarks>Log-normal openings in parallel, each passing air as the fourth power of its size; an engineering estimate, no source.</remarks>
    public static double Attenuation(double sizeRatio, double geometricStandardDeviation)
    {
        var sigma = Math.Log(Require.Within(geometricStandardDeviation, 1.01, 20));
        var z = (Math.Log(Require.Positive(sizeRatio)) - (FlowExponent * sigma * sigma)) / sigma;
        return -Math.Log(Math.Max(LeastPassing, Normal.CDF(0, 1, -z)));
    }
}
