using FiberScope.Validation.Filtration.Reference;

namespace FiberScope.Filtration.Tests.Cell;

// Values of an independent finite-volume and trajectory code for the same cell (400 × 400 cells with extrapolation;
// Runge-Kutta of fourth order with halved steps), computed for this project in another language.
public sealed class ReferenceTests
{
    [Theory]
    [InlineData(0.02, 0, 10, 0, 0.6368359776908192)]
    [InlineData(0.05, 0, 1000, 0.1, 0.05114379440257151)]
    [InlineData(0.1, 0, 1e4, 0.3, 0.1443517381378576)]
    [InlineData(0.2, 0, 1e5, 0.3, 0.23727881077590665)]
    [InlineData(0.05, 0.3, 1000, 0.3, 0.2152692004568893)]
    public void The_grid_agrees_with_an_independent_code(double solidity, double knudsen, double peclet, double ratio, double expected) =>
        Assert.Equal(1, DiffusionSolver.Extrapolated(new CellFlow(solidity, knudsen), peclet, ratio, 32) / expected, 0.002);

    [Theory]
    [InlineData(0.02, 0.01, 1, 0.2314501)]
    [InlineData(0.05, 0.1, 0.2, 0.0179764)]
    [InlineData(0.05, 1, 2, 1.528725)]
    [InlineData(0.1, 0.1, 0.5, 0.2944509)]
    public void Trajectories_agree_with_an_independent_code(double solidity, double ratio, double stokes, double expected) =>
        Assert.Equal(1, new TrajectorySolver(new CellFlow(solidity)).Efficiency(ratio, stokes) / expected, 0.0005);

    [Fact]
    public void The_error_falls_with_the_square_of_the_cell()
    {
        var flow = new CellFlow(0.05);
        var finest = DiffusionSolver.Solve(flow, 100, 0.1, 96);
        var coarse = DiffusionSolver.Solve(flow, 100, 0.1, 16) - finest;
        var fine = DiffusionSolver.Solve(flow, 100, 0.1, 32) - finest;
        Assert.InRange(coarse / fine, 3, 6);
    }

    [Fact]
    public void Random_walkers_without_inertia_find_the_grids_efficiency()
    {
        var flow = new CellFlow(0.05);
        var (walked, error) = new StochasticParticles(flow, 1000, 0.2, 0.002).Efficiency(3000, seed: 7);
        Assert.InRange(walked / DiffusionSolver.Solve(flow, 1000, 0.2, 48), 0.97 - (3 * error / walked), 1.03 + (3 * error / walked));
    }

    [Fact]
    public void Heavy_walkers_hardly_notice_their_Brownian_motion()
    {
        var flow = new CellFlow(0.1);
        var (walked, error) = new StochasticParticles(flow, 1e5, 0.1, 2).Efficiency(3000, seed: 7);
        Assert.InRange(walked / new TrajectorySolver(flow).Efficiency(0.1, 2), 0.98 - (3 * error / walked), 1.02 + (3 * error / walked));
    }
}
