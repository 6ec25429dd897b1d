namespace FiberScope.Filtration;

/// <summary>How the particles are charged.</summary>
public enum ParticleCharging
{
    /// <summary>As a neutraliser or long standing leaves them: as much plus as minus, by the equilibrium distribution.</summary>
    Equilibrium,

    /// <summary>Not at all.</summary>
    Neutral,
}
