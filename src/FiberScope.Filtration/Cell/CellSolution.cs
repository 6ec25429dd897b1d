using FiberScope.Statistics;

namespace FiberScope.Filtration.Cell;

/// <summary>Single-fibre efficiency from the numerical solution of the Kuwabara cell, at one solidity and fibre Knudsen number.</summary>
/// <remarks>
/// Diffusion with interception was solved on a grid, inertia with interception along trajectories; both are tabulated and
/// read between the nodes. Table range: α 0.005–0.3, Kn 0–1, Pe 0.1–1e6, R from 0 to what fits in the cell, Stk 0–10;
/// outside, the nearest end of the remainder is kept, so the closed-form limits stay right.
/// Immutable; make one per fibre class and ask it for every particle.
/// </remarks>
public sealed class CellSolution
{
    private readonly CellSurface _diffusion;
    private readonly CellSurface _impaction;

    /// <summary>Reads the tables at one solidity and fibre Knudsen number.</summary>
    /// <param name="solidity">α; dimensionless, 0 &lt; α &lt; 1.</param>
    /// <param name="fibreKnudsen">Kn = 2 λ / df; dimensionless, 0 or above.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public CellSolution(double solidity, double fibreKnudsen)
    {
        Flow = new KuwabaraFlow(solidity, fibreKnudsen);
        _diffusion = CellTables.Diffusion.At(solidity, fibreKnudsen);
        _impaction = CellTables.Impaction.At(solidity, fibreKnudsen);
    }

    /// <summary>The air's flow.</summary>
    public KuwabaraFlow Flow { get; }

    /// <summary>Stokes number at which inertia alone begins to collect point particles, near y = 0.54 for all solidities.</summary>
    public static double ScaledStokes(KuwabaraFlow flow, double stokes) => stokes * Math.Pow(0.8288 * flow.Drag, 0.8);

    /// <summary>How much of the room between fibre and rim a particle's radius takes.</summary>
    public static double ShareOfGap(KuwabaraFlow flow, double ratio) => ratio / (flow.Rim - 1);

    /// <summary>Diffusion and interception together, without inertia.</summary>
    /// <param name="peclet">Pe = U df / D; dimensionless, above zero; infinity means no diffusion.</param>
    /// <param name="ratio">R = dp / df; dimensionless, 0 or above.</param>
    /// <returns>E per projected fibre diameter; dimensionless, 0 to α^−½.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public double DiffusionInterception(double peclet, double ratio)
    {
        Require.NotNegative(ratio);
        if (double.IsPositiveInfinity(peclet))
        {
            return Flow.Interception(ratio);
        }

        var estimate = BoundaryLayerEstimate.DiffusionInterception(Flow, Require.Positive(peclet), ratio);
        var corrected = estimate * Math.Exp(_diffusion.Smooth(ShareOfGap(Flow, ratio), peclet));
        return Math.Clamp(corrected, Flow.Interception(ratio), Flow.Rim);
    }

    /// <summary>Inertia and interception together, without diffusion.</summary>
    /// <param name="ratio">R = dp / df; dimensionless, 0 or above.</param>
    /// <param name="stokes">Stk = ρp dp² Cc U / (18 μ df); dimensionless, 0 or above.</param>
    /// <returns>E per projected fibre diameter; dimensionless, 0 to α^−½.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public double ImpactionInterception(double ratio, double stokes)
    {
        Require.NotNegative(stokes);
        var interception = Flow.Interception(ratio);
        var smallest = CellTables.Impaction.Axes[2].Nodes[0] * (Flow.Rim - 1);
        if (ratio < smallest)
        {
            // Point-like particles: what inertia adds no longer depends on their size.
            var added = ImpactionInterception(smallest, stokes) - Flow.Interception(smallest);
            return added > 0 ? interception + added : interception * (1 + (added / Flow.Interception(smallest)));
        }

        var gain = Math.Exp(_impaction.Kinked(ShareOfGap(Flow, ratio), ScaledStokes(Flow, stokes)));
        return Math.Min(interception * gain, Flow.Rim);
    }

    /// <summary>Diffusion, interception and inertia together.</summary>
    /// <remarks>
    /// What diffusion and inertia add to interception is joined as the root of the sum of squares: both draw on the same
    /// air near the axis, so their plain sum is too high. Exact when either vanishes; against particles followed with
    /// both at once the rule's limits are in the validation document.
    /// </remarks>
    /// <param name="peclet">Pe = U df / D; dimensionless, above zero; infinity means no diffusion.</param>
    /// <param name="ratio">R = dp / df; dimensionless, 0 or above.</param>
    /// <param name="stokes">Stk = ρp dp² Cc U / (18 μ df); dimensionless, 0 or above.</param>
    /// <returns>E per projected fibre diameter; dimensionless, 0 to α^−½.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public double Efficiency(double peclet, double ratio, double stokes)
    {
        var interception = Flow.Interception(ratio);
        var byDiffusion = DiffusionInterception(peclet, ratio) - interception;
        var byInertia = ImpactionInterception(ratio, stokes) - interception;
        var added = byInertia > 0 ? Math.Sqrt((byDiffusion * byDiffusion) + (byInertia * byInertia)) : byDiffusion + byInertia;
        return Math.Min(interception + added, Flow.Rim);
    }
}
