namespace FiberScope.Validation.Filtration.Reference;

/// <summary>What is known of the particles at the cell's rim.</summary>
internal enum RimCondition
{
    /// <summary>The inflow carries n0 with it: what enters is u n0, so the cell cannot collect more than the air in it holds.</summary>
    Flux,

    /// <summary>The concentration on the inflow half is n0; differs from <see cref="Flux"/> below Pe ≈ 10 only.</summary>
    Concentration,
}

/// <summary>Convective diffusion of particles of finite size to the fibre, on a grid.</summary>
/// <remarks>
/// Finite volumes in polar coordinates between the collision surface r = 1 + R (n = 0) and the rim. Face flows come from
/// the stream function, so the air is conserved exactly. Exponentially fitted in r (Scharfetter and Gummel 1969), central
/// in θ, sinh-graded towards the surface; second order, so two grids give a Richardson extrapolation.
/// E is per projected fibre diameter: collected per length / (n0 U df).
/// </remarks>
internal static class DiffusionSolver
{
    /// <summary>Cells in θ that keep the error of one grid near 0.01 %; near 0.5 % at Pe 1e6.</summary>
    public static int CellsFor(double peclet) => peclet < 2e4 ? 64 : peclet < 2e5 ? 96 : 128;

    /// <summary>The efficiency by Richardson extrapolation from a grid and one twice as fine.</summary>
    public static double Extrapolated(CellFlow flow, double peclet, double ratio, int cells = 48, RimCondition rim = RimCondition.Flux)
    {
        var coarse = Solve(flow, peclet, ratio, cells, rim);
        var fine = Solve(flow, peclet, ratio, 2 * cells, rim);
        return fine + ((fine - coarse) / 3);
    }

    /// <summary>The efficiency on one grid of 2 × <paramref name="cells"/> cells in r and <paramref name="cells"/> in θ.</summary>
    /// <param name="flow">The air's flow.</param>
    /// <param name="peclet">Pe = U df / D, above zero.</param>
    /// <param name="ratio">R = dp / df; 1 + R inside the cell.</param>
    /// <param name="cells">Cells in θ; even.</param>
    /// <param name="rim">The condition at the rim.</param>
    public static double Solve(CellFlow flow, double peclet, double ratio, int cells, RimCondition rim = RimCondition.Flux)
    {
        var grid = new PolarGrid(flow, peclet, ratio, 2 * cells, cells);
        var system = new BandedSystem(grid.Rings * grid.Sectors, grid.Sectors);
        for (var i = 0; i < grid.Rings; i++)
        {
            for (var j = 0; j < grid.Sectors; j++)
            {
                AddRadialFace(system, grid, i, j, rim);
                AddSectorFace(system, grid, i, j);
            }
        }

        var density = system.Solve();
        var collected = 0d;
        for (var j = 0; j < grid.Sectors; j++)
        {
            collected += grid.Conductance(-1, j) * Bernoulli(grid.RadialFlow(-1, j) / grid.Conductance(-1, j)) * density[j];
        }

        return collected;
    }

    /// <summary>The face outside ring <paramref name="i"/>; for the first ring also the collision surface inside it.</summary>
    private static void AddRadialFace(BandedSystem system, PolarGrid grid, int i, int j, RimCondition rim)
    {
        var here = (i * grid.Sectors) + j;
        if (i == 0)
        {
            // Outward flux at the surface is −G B(q) n₀, as n = 0 on it.
            system.Add(here, here, grid.Conductance(-1, j) * Bernoulli(grid.RadialFlow(-1, j) / grid.Conductance(-1, j)));
        }

        var conductance = grid.Conductance(i, j);
        var flow = grid.RadialFlow(i, j);
        var q = flow / conductance;
        if (i < grid.Rings - 1)
        {
            var next = here + grid.Sectors;
            var outward = conductance * Bernoulli(-q);
            var inward = conductance * Bernoulli(q);
            system.Add(here, here, outward);
            system.Add(here, next, -inward);
            system.Add(next, here, -outward);
            system.Add(next, next, inward);
        }
        else if (flow >= 0)
        {
            system.Add(here, here, flow);
        }
        else if (rim == RimCondition.Flux)
        {
            system.RightHandSide[here] -= flow;
        }
        else
        {
            system.Add(here, here, conductance * Bernoulli(-q));
            system.RightHandSide[here] += conductance * Bernoulli(q);
        }
    }

    /// <summary>The face between sector <paramref name="j"/> and the next; the symmetry lines carry nothing.</summary>
    private static void AddSectorFace(BandedSystem system, PolarGrid grid, int i, int j)
    {
        if (j == grid.Sectors - 1)
        {
            return;
        }

        var here = (i * grid.Sectors) + j;
        var share = grid.NextShare(j);
        var flow = grid.SectorFlow(i, j);
        var conductance = grid.SectorConductance(i, j);
        var fromHere = ((1 - share) * flow) + conductance;
        var fromNext = (share * flow) - conductance;
        system.Add(here, here, fromHere);
        system.Add(here, here + 1, fromNext);
        system.Add(here + 1, here, -fromHere);
        system.Add(here + 1, here + 1, -fromNext);
    }

    /// <summary>x / (eˣ − 1).</summary>
    private static double Bernoulli(double x) =>
        Math.Abs(x) < 1e-5 ? 1 - (x / 2) + (x * x / 12) : x > 700 ? 0 : x / (Math.Exp(x) - 1);
}
