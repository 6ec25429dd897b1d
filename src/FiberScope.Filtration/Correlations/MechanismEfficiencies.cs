namespace FiberScope.Filtration.Correlations;

/// <summary>What each mechanism adds to a single fibre's efficiency; dimensionless, per projected fibre diameter.</summary>
internal readonly record struct MechanismEfficiencies
{
    public double Diffusion { get; init; }

    public double Interception { get; init; }

    public double DiffusionInterception { get; init; }

    public double Impaction { get; init; }

    public double Gravity { get; init; }

    public double Electrostatic { get; init; }

    public double Straining { get; init; }

    /// <summary>All of them together; never negative, though gravity may work against the rest.</summary>
    public double Total => Math.Max(0, Diffusion + Interception + DiffusionInterception + Impaction + Gravity + Electrostatic + Straining);

    public MechanismEfficiencies Scale(double factor) => new()
    {
        Diffusion = Diffusion * factor,
        Interception = Interception * factor,
        DiffusionInterception = DiffusionInterception * factor,
        Impaction = Impaction * factor,
        Gravity = Gravity * factor,
        Electrostatic = Electrostatic * factor,
        Straining = Straining * factor,
    };

    public MechanismEfficiencies Add(in MechanismEfficiencies other) => new()
    {
        Diffusion = Diffusion + other.Diffusion,
        Interception = Interception + other.Interception,
        DiffusionInterception = DiffusionInterception + other.DiffusionInterception,
        Impaction = Impaction + other.Impaction,
        Gravity = Gravity + other.Gravity,
        Electrostatic = Electrostatic + other.Electrostatic,
        Straining = Straining + other.Straining,
    };
}
