namespace FiberScope.Filtration.Correlations;

/// <summary>One fibre of one diameter in a mat of one solidity, ready to meet every particle.</summary>
/// <remarks>Immutable. What depends on the fibre alone is worked out once in the constructor.</remarks>
internal abstract class SingleFibre
{
    /// <summary>What the fibre collects by the set's own mechanisms: diffusion, interception, their joint action, inertia.</summary>
    public abstract MechanismEfficiencies Collect(in Encounter encounter);

    /// <summary>The highest efficiency that the set lets a sum of mechanisms reach.</summary>
    public abstract double Limit(double efficiency);
}
