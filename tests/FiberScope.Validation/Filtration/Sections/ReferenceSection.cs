using FiberScope.Validation.Filtration.Reference;

namespace FiberScope.Validation.Filtration.Sections;

/// <summary>How good the numerical reference itself is: convergence, and agreement with an independent code.</summary>
internal static class ReferenceSection
{
    private static readonly (double Solidity, double Knudsen, double Peclet, double Ratio)[] GridCases =
    [
        (0.05, 0, 10, 0), (0.05, 0, 100, 0.1), (0.2, 0, 1e3, 0.3), (0.02, 0, 1e4, 0.03), (0.05, 0.3, 1e3, 0.1), (0.05, 0, 1e5, 0.03), (0.02, 0, 1e6, 0.1),
    ];

    private static readonly (double Solidity, double Ratio, double Stokes)[] PathCases =
        [(0.02, 0.01, 0.5), (0.05, 0.1, 0.2), (0.05, 0.3, 1), (0.1, 0.01, 0.03), (0.2, 1, 5)];

    public static void Write(MarkdownText text)
    {
        text.Heading(3, "The numerical reference")
            .Paragraph($"Air: creeping flow in the Kuwabara cell with first-order slip, its four conditions solved as a linear system. Diffusion with interception: finite volumes between the collision surface r = 1 + R and the rim, exponentially fitted in r, central in θ, graded towards the surface and the wake; face flows from the stream function. Inertia with interception: trajectories from the rim with the face velocity, the limiting one by root search. Both at once: particles followed one by one with Brownian motion (Langevin equation). All are written apart from the product's code.")
            .Paragraph($"Error of one grid against Richardson extrapolation (from 96 and 128 cells in θ; twice as many in r), and of trajectories against a step tolerance of 1e-10:")
            .Table(["α", "Kn", "Pe", "R", "E", "32 cells", "48", "64", "96"], GridCases.AsParallel().AsOrdered().Select(GridRow))
            .Table(["α", "R", "Stk", "E", "tolerance 1e-5", "1e-6", "1e-7", "1e-8"], PathCases.Select(PathRow));
        Agreement(text);
    }

    private static IReadOnlyList<string> GridRow((double Solidity, double Knudsen, double Peclet, double Ratio) c)
    {
        var flow = new CellFlow(c.Solidity, c.Knudsen);
        var fine = DiffusionSolver.Solve(flow, c.Peclet, c.Ratio, 128);
        var coarser = DiffusionSolver.Solve(flow, c.Peclet, c.Ratio, 96);
        var exact = fine + ((fine - coarser) / (Math.Pow(128d / 96, 2) - 1));
        var errors = new[] { 32, 48, 64 }.Select(n => DiffusionSolver.Solve(flow, c.Peclet, c.Ratio, n)).Append(coarser);
        return
        [
            MarkdownText.Number(c.Solidity), MarkdownText.Number(c.Knudsen), MarkdownText.Number(c.Peclet), MarkdownText.Number(c.Ratio),
            MarkdownText.Number(exact, "G5"), .. errors.Select(e => MarkdownText.Percent((e / exact) - 1, "0.000")),
        ];
    }

    private static IReadOnlyList<string> PathRow((double Solidity, double Ratio, double Stokes) c)
    {
        var flow = new CellFlow(c.Solidity);
        double At(double tolerance) => new TrajectorySolver(flow, tolerance).Efficiency(c.Ratio, c.Stokes);
        var exact = At(1e-10);
        return
        [
            MarkdownText.Number(c.Solidity), MarkdownText.Number(c.Ratio), MarkdownText.Number(c.Stokes), MarkdownText.Number(exact, "G5"),
            .. new[] { 1e-5, 1e-6, 1e-7, 1e-8 }.Select(t => MarkdownText.Percent((At(t) / exact) - 1, "0.0000")),
        ];
    }

    private static void Agreement(MarkdownText text)
    {
        var rows = DataFile.Read("independent-cell-values.csv").AsParallel().AsOrdered()
            .Select(row => (Kind: row["kind"], Error: (Ours(row) / DataFile.Number(row["efficiency"])) - 1)).ToList();
        text.Paragraph($"Agreement with an independent code for the same cell (finite volumes on up to 400² cells, Runge-Kutta trajectories; `tests/FiberScope.Validation/Filtration/Published/independent-cell-values.csv`):")
            .Table(["what", "points", "median", "worst"], rows.GroupBy(r => r.Kind, StringComparer.Ordinal).Select(g =>
            {
                var summary = ErrorSummary.Of(g.Select(r => r.Error));
                return (IReadOnlyList<string>)[g.Key, MarkdownText.Number(summary.Count), MarkdownText.Percent(summary.Median, "0.0000"), MarkdownText.Percent(summary.Worst, "0.000")];
            }));
    }

    private static double Ours(IReadOnlyDictionary<string, string> row)
    {
        double Column(string name) => DataFile.Number(row[name]);
        var flow = new CellFlow(Column("solidity"), Column("knudsen"));
        if (row["kind"] == "inertia")
        {
            return new TrajectorySolver(flow).Efficiency(Column("ratio"), Column("stokes"));
        }

        var rim = row["rim"] == "flux" ? RimCondition.Flux : RimCondition.Concentration;
        // A concentration held at the rim makes a thin layer there at small Pe, which the grid does not seek out.
        return Column("peclet") < 3
            ? DiffusionSolver.Extrapolated(flow, Column("peclet"), Column("ratio"), 64, rim)
            : DiffusionSolver.Solve(flow, Column("peclet"), Column("ratio"), DiffusionSolver.CellsFor(Column("peclet")), rim);
    }
}
