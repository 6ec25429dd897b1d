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
    /// <summary>
    /// Milne length of an absorbing wall in particle free paths √(D τ), −ζ(½); Marshall and Watson (1985), J. Phys. A 18,
    /// 3531 (from memory).
    /// </summary>
    private const double MilneLength = 1.46035;

    /// <summary>How fast the share of the diffusive reach fades where diffusion reaches far; fitted to the stochastic reference.</summary>
    private const double FadingFar = 1.2;

    /// <summary>How much faster where it adds little to interception; fitted likewise.</summary>
    private const double FadingNear = 4;

    /// <summary>Scaled Stokes number beyond which particles cross the diffusive reach; fitted likewise.</summary>
    private const double CrossingStokes = 0.84;

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

    /// <summary>
    /// Stk (0.8288 × drag)^0.8: the Stokes number scaled by the flow, so that inertia alone begins to collect point particles
    /// near 0.54 at every solidity.
    /// </summary>
    /// <param name="flow">The air's flow.</param>
    /// <param name="stokes">Stk = ρp dp² Cc U / (18 μ df); dimensionless, 0 or above.</param>
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
    /// Diffusion is taken as a larger reach: R* is the interception parameter that would collect by interception alone what
    /// diffusion and interception collect without inertia. Inertia acts on R* while particles follow the air, and on R when
    /// they cross it so fast that diffusion brings in as many as it takes away; between them the share of R* falls with the
    /// scaled Stokes number. Exact when diffusion or inertia vanishes. The three constants of that share are fitted to
    /// particles followed with both at once; how well they do at other points is in the validation document.
    /// </remarks>
    /// <param name="peclet">Pe = U df / D; dimensionless, above zero; infinity means no diffusion.</param>
    /// <param name="ratio">R = dp / df; dimensionless, 0 or above.</param>
    /// <param name="stokes">Stk = ρp dp² Cc U / (18 μ df); dimensionless, 0 or above.</param>
    /// <returns>E per projected fibre diameter; dimensionless, 0 to α^−½.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public double Efficiency(double peclet, double ratio, double stokes)
    {
        var slow = DiffusionInterception(peclet, ratio);
        if (stokes == 0)
        {
            return slow;
        }

        var fast = ImpactionInterception(ratio, stokes);
        if (double.IsPositiveInfinity(peclet) || ratio >= Flow.Rim - 1)
        {
            return fast;
        }

        var reach = Math.Max(ratio, Flow.ReachOf(WithKineticLayer(slow, peclet, ratio, stokes), ratio));
        var following = Following(ScaledStokes(Flow, stokes), reach > 0 ? ratio / reach : 0);
        return Math.Clamp(fast + (following * (ImpactionInterception(reach, stokes) - fast)), 0, Flow.Rim);
    }

    /// <summary>How much particles still follow the air through the diffusive reach; 1 without inertia, 0 when they cross it.</summary>
    private static double Following(double scaledStokes, double nearness)
    {
        var fading = FadingFar + (FadingNear * nearness * nearness * nearness);
        var crossing = scaledStokes / CrossingStokes;
        var cubed = crossing * crossing * crossing;
        return Math.Exp(-fading * scaledStokes) / (1 + (cubed * cubed));
    }

    /// <summary>Diffusion slowed by the layer, a particle's own free path deep, in which it cannot be told from free flight.</summary>
    private double WithKineticLayer(double slow, double peclet, double ratio, double stokes)
    {
        var interception = Flow.Interception(ratio);
        var diffusive = slow - interception;
        var depth = MilneLength * Math.Sqrt(4 * stokes / peclet);
        return interception + (diffusive / (1 + (depth * peclet * diffusive / (2 * Math.PI * (1 + ratio)))));
    }
}
