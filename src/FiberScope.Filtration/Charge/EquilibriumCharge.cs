using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>How many elementary charges particles carry at bipolar equilibrium.</summary>
/// <remarks>
/// Above 70 nm Boltzmann's distribution, f(n) ∝ exp(−K e² n² / (dp k T)); below 40 nm the fit of Wiedensohler (1988), J. Aerosol Sci.
/// 19(3), 387 (coefficients from memory), for up to two charges; between them a smooth passage from one to the other.
/// </remarks>
public static class EquilibriumCharge
{
    internal const double ElementaryCharge = 1.602176634e-19;
    internal const double VacuumPermittivity = 8.8541878128e-12;

    private const double FitOnlyBelowMetres = 40e-9;
    private const double BoltzmannOnlyAboveMetres = 70e-9;

    /// <summary>Charges beyond this many standard deviations are left out: fewer than one particle in ten thousand.</summary>
    private const double Cut = 4;

    /// <summary>log₁₀ f = Σ aᵢ (log₁₀ d/nm)ⁱ for n = −2 … 2; Wiedensohler (1988), from memory.</summary>
    private static readonly double[][] Fit =
    [
        [-26.3328, 35.9044, -21.4608, 7.0867, -1.3088, 0.1051],
        [-2.3197, 0.6175, 0.6201, -0.1105, -0.1260, 0.0297],
        [-0.0003, -0.1014, 0.3073, -0.3372, 0.1023, -0.0105],
        [-2.3484, 0.6044, 0.4800, 0.0013, -0.1553, 0.0320],
        [-44.4756, 79.3772, -62.8900, 26.4492, -5.7480, 0.5049],
    ];

    /// <summary>The shares of particles with 0, 1, 2 … charges of either sign; they sum to one.</summary>
    /// <param name="diameter">dp; above zero.</param>
    /// <param name="temperature">Above absolute zero.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public static IReadOnlyList<double> Shares(Length diameter, Temperature temperature)
    {
        var metres = Require.Positive(diameter.Meters, nameof(diameter));
        var boltzmann = Boltzmann(metres, Require.Positive(temperature.Kelvins, nameof(temperature)));
        if (metres >= BoltzmannOnlyAboveMetres)
        {
            return boltzmann;
        }

        var t = Math.Clamp(Math.Log(metres / FitOnlyBelowMetres) / Math.Log(BoltzmannOnlyAboveMetres / FitOnlyBelowMetres), 0, 1);
        var share = t * t * (3 - (2 * t));
        var fit = Wiedensohler(metres * 1e9);
        var mixed = new double[Math.Max(boltzmann.Length, fit.Length)];
        for (var n = 0; n < mixed.Length; n++)
        {
            mixed[n] = (share * boltzmann.ElementAtOrDefault(n)) + ((1 - share) * fit.ElementAtOrDefault(n));
        }

        return mixed;
    }

    /// <summary>The mean number of charges regardless of sign, by Boltzmann's distribution.</summary>
    public static double BoltzmannMean(Length diameter, Temperature temperature) =>
        Boltzmann(diameter.Meters, temperature.Kelvins).Select((share, n) => n * share).Sum();

    private static double[] Boltzmann(double metres, double kelvins)
    {
        var exponent = ElementaryCharge * ElementaryCharge / (4 * Math.PI * VacuumPermittivity * metres * Particle.Boltzmann * kelvins);
        var largest = 2 + (int)(Cut * Math.Sqrt(0.5 / exponent));
        return Normalise([.. Enumerable.Range(0, largest + 1).Select(n => (n == 0 ? 1 : 2) * Math.Exp(-exponent * n * n))]);
    }

    private static double[] Wiedensohler(double nanometres)
    {
        var x = Math.Log10(Math.Max(1, nanometres));
        double Of(int n) => Math.Pow(10, Fit[n + 2].Select((a, i) => a * Math.Pow(x, i)).Sum());
        return Normalise([Of(0), Of(1) + Of(-1), nanometres < 20 ? 0 : Of(2) + Of(-2)]);
    }

    private static double[] Normalise(double[] shares)
    {
        var sum = shares.Sum();
        return Array.ConvertAll(shares, s => s / sum);
    }
}
