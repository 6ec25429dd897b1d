using FiberScope.Filtration.Mechanisms;
using UnitsNet;

namespace FiberScope.Filtration.Tests.Published;

/// <summary>A medium worked through with the equations and constants of Hinds (1999), chapter 9.</summary>
internal sealed class TextbookExample
{
    public TextbookExample(PhysicsCheck c)
    {
        var particle = new Particle(Length.FromMeters(c["dp_m"]), Density.FromKilogramsPerCubicMeter(c["rho_p"]), PhysicsChecks.GivenAir(c), SlipCorrection.Hinds);
        var (fibre, solidity, velocity) = (c["df_m"], c["alpha"], c["U"]);
        var peclet = velocity * fibre / particle.DiffusionCoefficient.SquareMetersPerSecond;
        var ratio = c["dp_m"] / fibre;
        var stokes = particle.RelaxationTime.Seconds * velocity / fibre;
        Diffusion = Mechanisms.Diffusion.Hinds(peclet);
        Interception = Mechanisms.Interception.Textbook(KuwabaraCell.WallFactor(solidity), ratio);
        Joint = Mechanisms.Diffusion.WithInterception(1 / KuwabaraCell.HydrodynamicFactor(solidity), peclet, ratio);
        Impaction = Mechanisms.Impaction.Hinds(solidity, ratio, stokes);
        Penetration = Math.Exp(-4 * solidity * Sum * c["t_m"] / (Math.PI * (1 - solidity) * fibre));
    }

    public double Diffusion { get; }

    public double Interception { get; }

    public double Joint { get; }

    public double Impaction { get; }

    public double Sum => Diffusion + Interception + Joint + Impaction;

    public double Penetration { get; }
}
