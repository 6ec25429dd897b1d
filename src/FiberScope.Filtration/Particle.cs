using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>One sphere in air: how it diffuses, settles and fails to follow the air.</summary>
public sealed record Particle
{
    /// <summary>Boltzmann's constant, J/K (exact, SI 2019).</summary>
    internal const double Boltzmann = 1.380649e-23;

    /// <summary>Acceleration of free fall, m/s².</summary>
    internal const double Gravity = 9.81;

    private readonly double _mobility;

    /// <summary>Puts a sphere into air.</summary>
    /// <param name="diameter">The physical diameter; above zero.</param>
    /// <param name="density">Its density; above zero.</param>
    /// <param name="air">The air.</param>
    /// <param name="slipCorrection">Cunningham's correction as a function of Kn = 2 λ / dp; Allen and Raabe's when null.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public Particle(Length diameter, Density density, AirProperties air, Func<double, double>? slipCorrection = null)
    {
        DiameterMetres = Require.Positive(diameter.Meters, nameof(diameter));
        var kilogramsPerCubicMetre = Require.Positive(density.KilogramsPerCubicMeter, nameof(density));
        Slip = (slipCorrection ?? SlipCorrection.AllenRaabe)(2 * air.MeanFreePathMetres / DiameterMetres);
        _mobility = Slip / (3 * Math.PI * air.PascalSeconds * DiameterMetres);
        SquareMetresPerSecond = Boltzmann * air.Kelvins * _mobility;
        RelaxationSeconds = kilogramsPerCubicMetre * DiameterMetres * DiameterMetres * Slip / (18 * air.PascalSeconds);
    }

    /// <summary>The physical diameter.</summary>
    public Length Diameter => Length.FromMeters(DiameterMetres);

    /// <summary>Cunningham's slip correction Cc; dimensionless, 1 or above.</summary>
    public double Slip { get; }

    /// <summary>Diffusion coefficient D = k T Cc / (3 π μ dp); Stokes and Einstein. Holds for any size above about 3 nm.</summary>
    public KinematicViscosity DiffusionCoefficient => KinematicViscosity.FromSquareMetersPerSecond(SquareMetresPerSecond);

    /// <summary>Relaxation time τ = ρ dp² Cc / (18 μ). Holds for particle Reynolds numbers below 1.</summary>
    public Duration RelaxationTime => Duration.FromSeconds(RelaxationSeconds);

    /// <summary>Settling velocity τ g in still air. Holds for particle Reynolds numbers below 1.</summary>
    public Speed SettlingVelocity => Speed.FromMetersPerSecond(RelaxationSeconds * Gravity);

    internal double DiameterMetres { get; }

    internal double SquareMetresPerSecond { get; }

    internal double RelaxationSeconds { get; }

    /// <summary>Speed per force, Cc / (3 π μ dp); s/kg.</summary>
    internal double SecondsPerKilogram => _mobility;
}
