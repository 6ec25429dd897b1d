namespace FiberScope.Filtration.Mechanisms;

/// <summary>Collection of particles that diffuse to the fibre: published forms of E_D.</summary>
/// <remarks>
/// Pe = U df / D with the face velocity U; dimensionless, above zero. Each form belongs to the correlation set that uses it:
/// they differ by up to a factor 2.5, because some stand for an ideal cell and others were fitted to real mats.
/// </remarks>
public static class Diffusion
{
    /// <summary>Thin concentration layer in the Kuwabara cell, 2.892 A^⅓ Pe^−⅔; exact for Pe ≫ 1.</summary>
    /// <remarks>Levich (1962) and Natanson (1957); the coefficient was derived anew and confirmed numerically.</remarks>
    public static double BoundaryLayer(double wallFactor, double peclet) => 2.892 * Math.Cbrt(wallFactor / (peclet * peclet));

    /// <summary>Second term of the thin-layer series, 0.624 / Pe; Stechkina and Fuchs (1966), from memory, confirmed numerically.</summary>
    public static double SecondTerm(double peclet) => 0.624 / peclet;

    /// <summary>Fan model, 2.7 Pe^−⅔; Kirsch and Fuchs (1968), from memory. Holds for α 0.01 to 0.15.</summary>
    public static double Fan(double peclet) => 2.7 / Math.Cbrt(peclet * peclet);

    /// <summary>Slip of the air at the fibre in the fan model, 1 + 0.39 k^−⅓ Pe^⅓ Kn; Kirsch and Stechkina (1978), from memory.</summary>
    public static double FanSlip(double fanFactor, double peclet, double fibreKnudsen) => 1 + (0.39 * Math.Cbrt(peclet / fanFactor) * fibreKnudsen);

    /// <summary>Fitted to measured mats, 1.6 A^⅓ Pe^−⅔; Lee and Liu (1982), Aerosol Sci. Technol. 1(2), 147 (from memory).</summary>
    public static double LeeLiu(double wallFactor, double peclet) => 1.6 * Math.Cbrt(wallFactor / (peclet * peclet));

    /// <summary>2 Pe^−⅔; Hinds (1999), eq. 9.27 (from memory).</summary>
    public static double Hinds(double peclet) => 2 / Math.Cbrt(peclet * peclet);

    /// <summary>Gain of slip at the fibre to first order in Kn, 1 + 0.388 Kn (A Pe)^⅓; Payet et al. (1992), from memory. Not above Kn ≈ 0.1.</summary>
    public static double FirstOrderSlip(double wallFactor, double peclet, double fibreKnudsen) => 1 + (0.388 * fibreKnudsen * Math.Cbrt(wallFactor * peclet));

    /// <summary>
    /// Joint action with interception, 1.24 s R^⅔ Pe^−½ with s = k^−½, Ku^−½ or A^½ by the flow; Stechkina and Fuchs (1966), printed
    /// as Hinds (1999), eq. 9.28 (from memory, confirmed numerically). Worth 5 to 20 % near the most-penetrating size.
    /// </summary>
    public static double WithInterception(double inverseFlowFactor, double peclet, double ratio) =>
        1.24 * Math.Sqrt(inverseFlowFactor / peclet) * Math.Cbrt(ratio * ratio);
}
