using System.Collections.Immutable;
using FiberScope.Filtration.Cell;
using FiberScope.Validation.Filtration.Reference;

namespace FiberScope.Validation.Filtration;

/// <summary>Solves the cell on a grid of inputs and writes the tables that the set <c>cell</c> reads.</summary>
internal static class CellTabulator
{
    private static readonly ImmutableArray<double> Knudsen = [0, 0.02, 0.06, 0.15, 0.35, 1];

    /// <summary>Writes both tables; several minutes on one core.</summary>
    public static void Write(TextWriter log)
    {
        var folder = Repository.Locate("src", "FiberScope.Filtration", "Cell");
        log.WriteLine("Inertia with interception …");
        File.WriteAllText(Path.Combine(folder, "impaction.csv"), Impaction().ToText(
        [
            "ln(E / E_R), inertia with interception in the Kuwabara cell with slip, by limiting trajectories.",
            "gap share = R / (rim - 1); scaled Stokes = Stk (0.8288 drag)^0.8; written by: validation filtration --tabulate",
        ]));
        log.WriteLine("Diffusion with interception …");
        File.WriteAllText(Path.Combine(folder, "diffusion.csv"), Diffusion().ToText(
        [
            "ln(E / boundary-layer estimate), diffusion with interception in the Kuwabara cell with slip, by finite volumes.",
            "gap share = R / (rim - 1); written by: validation filtration --tabulate",
        ]));
    }

    private static CellTable Impaction()
    {
        ImmutableArray<TableAxis> axes =
        [
            new("solidity", 0, [0.005, 0.01, 0.02, 0.04, 0.07, 0.12, 0.2, 0.3]),
            new("fibre Knudsen", 0.03, Knudsen),
            new("gap share", 0, [0.0015, 0.004, 0.01, 0.025, 0.06, 0.12, 0.25, 0.45, 0.7, 0.95]),
            new("scaled Stokes", 0.1,
            [
                0, 0.015, 0.04, 0.08, 0.12, 0.16, 0.2, 0.24, 0.28, 0.32, 0.36, 0.4, 0.44, 0.47, 0.5, 0.52, 0.54, 0.56, 0.58, 0.6, 0.63, 0.66,
                0.7, 0.75, 0.82, 0.9, 1, 1.15, 1.35, 1.6, 2, 2.5, 3.2, 4.5, 7, 12, 25, 50,
            ]),
        ];
        return Fill(axes, (alpha, kn, share, scaled) =>
        {
            var flow = new CellFlow(alpha, kn);
            var ratio = share * (flow.Rim - 1);
            var stokes = scaled / CellSolution.ScaledStokes(new KuwabaraFlow(alpha, kn), 1);
            return scaled == 0 ? 0 : Math.Log(new TrajectorySolver(flow, 3e-7).Efficiency(ratio, stokes) / flow.Interception(ratio));
        });
    }

    private static CellTable Diffusion()
    {
        ImmutableArray<TableAxis> axes =
        [
            new("solidity", 0, [0.005, 0.01, 0.02, 0.05, 0.1, 0.2, 0.3]),
            new("fibre Knudsen", 0.03, Knudsen),
            new("gap share", 0.01, [0, 0.003, 0.01, 0.03, 0.08, 0.16, 0.3, 0.5, 0.75, 0.97]),
            new("Peclet", 0, [0.1, 0.3, 1, 3, 10, 30, 100, 300, 1e3, 3e3, 1e4, 3e4, 1e5, 3e5, 1e6]),
        ];
        return Fill(axes, (alpha, kn, share, peclet) =>
        {
            var flow = new CellFlow(alpha, kn);
            var ratio = share * (flow.Rim - 1);
            var estimate = BoundaryLayerEstimate.DiffusionInterception(new KuwabaraFlow(alpha, kn), peclet, ratio);
            return Math.Log(DiffusionSolver.Solve(flow, peclet, ratio, DiffusionSolver.CellsFor(peclet)) / estimate);
        });
    }

    private static CellTable Fill(ImmutableArray<TableAxis> axes, Func<double, double, double, double, double> solve)
    {
        var points =
            from alpha in axes[0].Nodes
            from kn in axes[1].Nodes
            from third in axes[2].Nodes
            from fourth in axes[3].Nodes
            select (alpha, kn, third, fourth);
        return new CellTable(axes, [.. points.AsParallel().AsOrdered().Select(p => solve(p.alpha, p.kn, p.third, p.fourth))]);
    }
}
