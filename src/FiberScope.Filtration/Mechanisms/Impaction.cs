namespace FiberScope.Filtration.Mechanisms;

/// <summary>Collection of particles whose inertia carries them across the air's path.</summary>
/// <remarks>Stk = ρ dp² Cc U / (18 μ df), on the fibre's diameter (not its radius); dimensionless, 0 or above.</remarks>
public static class Impaction
{
    /// <summary>The ratio above which the fit's own ratio is held: trajectories were followed for R up to 1.</summary>
    private const double LargestFittedRatio = 1;

    /// <summary>
    /// What inertia adds to exact interception in the Kuwabara cell, over the whole Stokes range:
    /// E_I = (1 + R − E_R) g, g = x^3.851 / (x^3.851 + 1.5496 x^2.851 + 0.6298), x = Stk (0.8288/Ku)^0.8003 (1 + 0.7937 R).
    /// </summary>
    /// <param name="solidity">α; fitted on 0.02 to 0.2.</param>
    /// <param name="ratio">R = dp / df; fitted on 0.1 to 1, held at 1 above.</param>
    /// <param name="stokes">Stk; fitted on 0.01 to 5, tends to its limit 1 + R above.</param>
    /// <returns>E_I, dimensionless, 0 or above.</returns>
    /// <remarks>
    /// Fitted for this project to limiting trajectories (Runge–Kutta, uniform start): root-mean-square error of ln E 0.08, largest
    /// 0.42 near the threshold. Weak inertia (Stk below about 0.1) in truth lowers interception slightly; the fit gives zero there.
    /// </remarks>
    public static double TrajectoryFit(double solidity, double ratio, double stokes)
    {
        if (stokes == 0)
        {
            return 0;
        }

        var held = Math.Min(ratio, LargestFittedRatio);
        var x = stokes * Math.Pow(0.8288 / KuwabaraCell.HydrodynamicFactor(solidity), 0.8003) * (1 + (0.7937 * held));
        return Math.Max(0, 1 + ratio - KuwabaraCell.ExactInterception(solidity, ratio)) * TrajectoryShare(x);
    }

    /// <summary>g of the fit: the share of what interception leaves that inertia collects.</summary>
    internal static double TrajectoryShare(double scaledStokes) =>
        1 / (1 + (1.5496 / scaledStokes) + (0.6298 * Math.Pow(scaledStokes, -3.851)));

    /// <summary>
    /// Stk J / (2 Ku²) with J = (29.6 − 28 α^0.62) R² − 27.5 R^2.8 below R = 0.4 and 2 above; Stechkina, Kirsch and Fuchs (1969), printed as
    /// Hinds (1999), eq. 9.24 (from memory). Fitted for α 0.0035 to 0.111, small Stk; over-predicts by a factor 1.5 to 1.7 there.
    /// </summary>
    /// <remarks>
    /// The printed J jumps at R = 0.4; here it passes smoothly from one form to the other between R = 0.35 and 0.45. Not bounded
    /// for large Stk: the caller caps it at 1 + R − E_R.
    /// </remarks>
    public static double Hinds(double solidity, double ratio, double stokes)
    {
        var ku = KuwabaraCell.HydrodynamicFactor(solidity);
        return stokes * HindsFactor(solidity, ratio) / (2 * ku * ku);
    }

    private static double HindsFactor(double solidity, double ratio)
    {
        const double Large = 2;
        var small = ((29.6 - (28 * Math.Pow(solidity, 0.62))) * ratio * ratio) - (27.5 * Math.Pow(ratio, 2.8));
        var t = Math.Clamp((ratio - 0.35) / 0.1, 0, 1);
        return t == 1 ? Large : small + ((Large - small) * t * t * (3 - (2 * t)));
    }
}
