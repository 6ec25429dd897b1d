namespace FiberScope.Filtration.Cell;

/// <summary>Closed forms for diffusion with interception in the cell: right in their limits, a few per cent off between them.</summary>
/// <remarks>The table of the numerical solution stores the small remainder.</remarks>
public static class BoundaryLayerEstimate
{
    /// <summary>Coefficient of the thin concentration layer on a surface without slip; derived from Levich (1962), checked numerically.</summary>
    private const double NoSlipLayer = 2.8922;

    /// <summary>Coefficient of the thin layer under a uniform slip speed, 4 / √π; derived, checked numerically.</summary>
    private const double SlipLayer = 2.2568;

    /// <summary>Exponent that joins the two layers; fitted to the numerical solution, within 6 %.</summary>
    private const double JoiningExponent = 2.5;

    /// <summary>Second term of the thin-layer series; Stechkina and Fuchs (1966), Ann. Occup. Hyg. 9, 59 (from memory).</summary>
    private const double SecondTerm = 0.624;

    /// <summary>Joint action of diffusion and interception; Stechkina and Fuchs (1966), as printed in Hinds (1999), eq. 9.28 (from memory).</summary>
    private const double JointTerm = 1.24;

    /// <summary>Exponent of the approach to all the air in the cell at small Pe; fitted to the numerical solution, within 3 %.</summary>
    private const double SaturationExponent = 2.1;

    /// <summary>Diffusion and interception together.</summary>
    /// <param name="flow">The air's flow in the cell.</param>
    /// <param name="peclet">Pe = U df / D; dimensionless, above zero; infinity means no diffusion.</param>
    /// <param name="ratio">R = dp / df; dimensionless, 0 or above.</param>
    /// <returns>E per projected fibre diameter; dimensionless, from E_R to α^−½.</returns>
    public static double DiffusionInterception(KuwabaraFlow flow, double peclet, double ratio)
    {
        var interception = flow.Interception(ratio);
        var room = flow.Rim - interception;
        if (room <= 0)
        {
            return flow.Rim;
        }

        var joint = JointTerm * Math.Sqrt(flow.HalfCurvature / peclet) * Math.Cbrt(ratio * ratio);
        var share = (Diffusion(flow, peclet) + joint) / room;
        return interception + (room * share / Math.Pow(1 + Math.Pow(share, SaturationExponent), 1 / SaturationExponent));
    }

    /// <summary>Diffusion of point particles, without the limit at small Pe.</summary>
    private static double Diffusion(KuwabaraFlow flow, double peclet)
    {
        var still = NoSlipLayer * Math.Cbrt(flow.HalfCurvature / (peclet * peclet));
        var slipping = SlipLayer * Math.Sqrt(Math.Max(flow.SurfaceSpeed, 0) / peclet);
        return Math.Pow(Math.Pow(still, JoiningExponent) + Math.Pow(slipping, JoiningExponent), 1 / JoiningExponent)
            + (SecondTerm / peclet);
    }
}
