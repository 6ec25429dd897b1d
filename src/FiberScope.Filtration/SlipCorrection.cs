namespace FiberScope.Filtration;

/// <summary>Cunningham's slip correction of a sphere's drag, by several published fits.</summary>
/// <remarks>
/// Cc = 1 + Kn (a + b exp(−c / Kn)) with Kn = 2 λ / dp, the particle's Knudsen number. Holds from the free-molecular to the
/// continuum limit; a fit's constants belong to the mean free path they were fitted with.
/// </remarks>
public static class SlipCorrection
{
    /// <summary>Allen and Raabe (1985), solid spheres: a = 1.142, b = 0.558, c = 0.999; with λ = 66.4 nm. The one used by the forecast.</summary>
    public static double AllenRaabe(double particleKnudsen) => Form(particleKnudsen, 1.142, 0.558, 0.999);

    /// <summary>Kim et al. (2005): a = 1.165, b = 0.483, c = 0.997; with λ = 67.3 nm (from memory).</summary>
    public static double Kim(double particleKnudsen) => Form(particleKnudsen, 1.165, 0.483, 0.997);

    /// <summary>Hinds (1999), eq. 3.20: 1 + (λ/d)(2.34 + 1.05 exp(−0.39 d/λ)); with λ = 66 nm (from memory).</summary>
    public static double Hinds(double particleKnudsen) => Form(particleKnudsen, 2.34 / 2, 1.05 / 2, 0.39 * 2);

    private static double Form(double knudsen, double a, double b, double c) =>
        1 + (knudsen * (a + (b * Math.Exp(-c / knudsen))));
}
