using FiberScope.Fibres;
using FiberScope.Filtration.Cell;
using FiberScope.Filtration.Mechanisms;
using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests.Published;

/// <summary>Whole media, from structure to penetration.</summary>
internal static class Chains
{
    private const int Nodes = 801;

    public static double MinusLogP(PhysicsCheck c, double particleMetres) => c.Text("chain") switch
    {
        "CELL" => Cell(c, particleMetres),
        "LL+Payet/LiuRubow slip" => LeeLiuWithSlip(c, particleMetres),
        var chain => MediaModel.Forecast([PhysicsChecks.Single(c)], At(c["U"], particleMetres), By(Set(chain))).MinusLogP(),
    };

    public static double MostPenetratingMetres(PhysicsCheck c)
    {
        if (c.Text("chain") is "CELL" or "LL+Payet/LiuRubow slip")
        {
            var sizes = Enumerable.Range(0, 2000).Select(i => 3e-8 * Math.Pow(50, i / 2000.0));
            return sizes.MinBy(d => MinusLogP(c, d));
        }

        return MediaModel.Forecast([PhysicsChecks.Single(c)], At(c["U"]), By(Set(c.Text("chain")))).MostPenetratingSize!.Value.Meters;
    }

    public static double OfAnAerosol(PhysicsCheck c)
    {
        var sigma = Math.Log(c["GSD"]);
        var middle = HatchChoate.Median(Length.FromMeters(c["CMD_m"]), c["GSD"], c["weight_exponent"]).Meters;
        var z = Steps();
        var forecast = MediaModel.Forecast([PhysicsChecks.Single(c)], At(c["U"], [.. z.Select(x => middle * Math.Exp(sigma * x))]));
        var weights = z.Select(x => Math.Exp(-0.5 * x * x)).ToArray();
        return forecast.Penetrations().Zip(weights, (p, w) => p * w).Sum() / weights.Sum();
    }

    public static double OfAFibreDistribution(PhysicsCheck c)
    {
        var diameters = DiameterDistribution.LogNormal(Length.FromMeters(c["fibre_CMD_m"]), c["fibre_GSD"], 400);
        var layer = Layer(1e-6, c["alpha"], c["t_m"]) with { Diameters = diameters };
        return MediaModel.Forecast([layer], At(c["U"], c["dp_m"])).MinusLogP();
    }

    public static double SquareRootMoment(double countMedian, double gsd, double exponent)
    {
        var median = HatchChoate.Median(Length.FromMeters(countMedian), gsd, exponent);
        return Math.Sqrt(HatchChoate.MeanOfPower(median, gsd, 0.5) / Length.FromMicrometers(1));
    }

    private static CorrelationSet Set(string chain) => chain switch
    {
        "FAN/eps(Davies)" => CorrelationSet.KirschStechkina1978,
        "LL1982" => CorrelationSet.LeeLiu1982,
        "HINDS" => CorrelationSet.Hinds1999,
        _ => throw new ArgumentException($"No calculation for the chain '{chain}'.", nameof(chain)),
    };

    private static (double Pe, double R, double Stk, double Kn) Numbers(PhysicsCheck c, double particleMetres)
    {
        var air = PhysicsChecks.AirAt(c["T_K"], c["p_Pa"]).Properties;
        var particle = new Particle(Length.FromMeters(particleMetres), Density.FromKilogramsPerCubicMeter(c["rho_p"]), air);
        return (c["U"] * c["df_m"] / particle.DiffusionCoefficient.SquareMetersPerSecond,
            particleMetres / c["df_m"],
            particle.RelaxationTime.Seconds * c["U"] / c["df_m"],
            2 * air.MeanFreePath.Meters / c["df_m"]);
    }

    private static double LeeLiuWithSlip(PhysicsCheck c, double particleMetres)
    {
        var (pe, r, _, kn) = Numbers(c, particleMetres);
        var wall = KuwabaraCell.WallFactor(c["alpha"]);
        var e = (Diffusion.LeeLiu(wall, pe) * Diffusion.FirstOrderSlip(wall, pe, kn)) + (Interception.LeeLiu(wall, r) * Interception.FirstOrderSlip(r, kn));
        return Depth(c) * e / (1 - c["alpha"]);
    }

    /// <summary>The closed forms of the cell with slip: layer with and without slip joined, exact interception, joint action, inertia.</summary>
    private static double Cell(PhysicsCheck c, double particleMetres)
    {
        var (pe, r, stk, kn) = Numbers(c, particleMetres);
        var alpha = c["alpha"];
        var flow = new KuwabaraFlow(alpha, kn);
        var still = 2.892 * Math.Cbrt(flow.HalfCurvature / (pe * pe));
        var slipping = 2.2568 * Math.Sqrt(flow.SurfaceSpeed / pe);
        var e = Math.Pow(Math.Pow(still, 2.5) + Math.Pow(slipping, 2.5), 0.4) + Diffusion.SecondTerm(pe)
            + flow.Interception(r) + Diffusion.WithInterception(KuwabaraCell.WallFactor(alpha), pe, r) + Impaction.TrajectoryFit(alpha, r, stk);
        return Depth(c) * Saturation.Limit(e, alpha, 2.1);
    }

    private static double Depth(PhysicsCheck c) => 4 * c["alpha"] * c["t_m"] / (Math.PI * c["df_m"]);

    private static double[] Steps() => [.. Enumerable.Range(0, Nodes).Select(i => (16.0 * i / (Nodes - 1)) - 8)];
}
