using FiberScope.Validation.Filtration.Reference;

namespace FiberScope.Validation.Filtration;

/// <summary>One case of the reference with the closed form's inputs.</summary>
internal sealed record ReferenceCase(double Solidity, double Knudsen, double Peclet, double Ratio, double Stokes, double Efficiency);

/// <summary>The reference on the grids on which closed forms are judged, worked out once.</summary>
internal sealed class ReferenceGrid
{
    public static readonly double[] Solidities = [0.01, 0.03, 0.1, 0.2, 0.3];
    public static readonly double[] Knudsens = [0, 0.1, 1];
    public static readonly double[] Peclets = [0.1, 1, 10, 100, 1e3, 1e4, 1e5, 1e6];
    public static readonly double[] Ratios = [0.01, 0.03, 0.1, 0.3, 1, 2];
    public static readonly double[] Stokeses = [0.01, 0.03, 0.1, 0.3, 1, 3, 10];

    private ReferenceGrid(IReadOnlyList<ReferenceCase> diffusion, IReadOnlyList<ReferenceCase> inertia) => (Diffusion, Inertia) = (diffusion, inertia);

    /// <summary>Diffusion with interception, R from 0.</summary>
    public IReadOnlyList<ReferenceCase> Diffusion { get; }

    /// <summary>Inertia with interception; the Peclet number is infinite.</summary>
    public IReadOnlyList<ReferenceCase> Inertia { get; }

    public static ReferenceGrid Solve()
    {
        var diffusion =
            from alpha in Solidities
            from kn in Knudsens
            from ratio in Ratios.Prepend(0)
            where 1 + ratio < 0.98 / Math.Sqrt(alpha)
            from peclet in Peclets
            select new ReferenceCase(alpha, kn, peclet, ratio, 0, 0);
        var inertia =
            from alpha in Solidities
            from kn in Knudsens
            from ratio in Ratios
            where 1 + ratio < 0.98 / Math.Sqrt(alpha)
            from stokes in Stokeses
            select new ReferenceCase(alpha, kn, double.PositiveInfinity, ratio, stokes, 0);
        return new ReferenceGrid(
            [.. diffusion.AsParallel().AsOrdered().Select(c => c with { Efficiency = DiffusionSolver.Solve(new CellFlow(c.Solidity, c.Knudsen), c.Peclet, c.Ratio, Cells(c.Peclet)) })],
            [.. inertia.AsParallel().AsOrdered().Select(c => c with { Efficiency = new TrajectorySolver(new CellFlow(c.Solidity, c.Knudsen), 1e-6).Efficiency(c.Ratio, c.Stokes) })]);
    }

    /// <summary>Coarser than for the tables: closed forms miss by far more than this grid's 0.1 % (1 % at Pe 1e6).</summary>
    private static int Cells(double peclet) => peclet < 3e4 ? 48 : peclet < 3e5 ? 64 : 96;
}
