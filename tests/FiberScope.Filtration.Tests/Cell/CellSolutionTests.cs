using CsCheck;
using FiberScope.Filtration.Cell;
using FiberScope.Validation.Filtration.Reference;

namespace FiberScope.Filtration.Tests.Cell;

public sealed class CellSolutionTests
{
    // None of these is a node of the tables.
    [Theory]
    [InlineData(0.027, 0, 14, 0.013)]
    [InlineData(0.027, 0, 2.3e4, 0.17)]
    [InlineData(0.07, 0, 620, 0.045)]
    [InlineData(0.07, 0.4, 4400, 0.11)]
    [InlineData(0.15, 0, 180, 0.6)]
    [InlineData(0.15, 0.1, 6e4, 0.022)]
    public void Diffusion_with_interception_is_that_of_the_grid(double solidity, double knudsen, double peclet, double ratio)
    {
        var grid = DiffusionSolver.Solve(new CellFlow(solidity, knudsen), peclet, ratio, 64);
        Assert.Equal(1, new CellSolution(solidity, knudsen).DiffusionInterception(peclet, ratio) / grid, 0.015);
    }

    [Theory]
    [InlineData(0.027, 0, 0.013, 0.9)]
    [InlineData(0.027, 0, 0.3, 0.15)]
    [InlineData(0.07, 0, 0.045, 0.43)]
    [InlineData(0.07, 0.4, 0.11, 2.2)]
    [InlineData(0.15, 0, 0.6, 4.7)]
    [InlineData(0.15, 0.1, 0.022, 0.33)]
    public void Inertia_with_interception_is_that_of_the_limiting_trajectory(double solidity, double knudsen, double ratio, double stokes)
    {
        var trajectory = new TrajectorySolver(new CellFlow(solidity, knudsen)).Efficiency(ratio, stokes);
        Assert.Equal(1, new CellSolution(solidity, knudsen).ImpactionInterception(ratio, stokes) / trajectory, 0.03);
    }

    [Fact]
    public void Without_diffusion_and_inertia_only_interception_is_left()
    {
        var cell = new CellSolution(0.06, 0.05);
        Assert.Equal(cell.Flow.Interception(0.2), cell.Efficiency(double.PositiveInfinity, 0.2, 0), 1e-12);
    }

    [Fact]
    public void Efficiency_lies_between_interception_and_all_the_air_of_the_cell() =>
        Gen.Select(Gen.Double[0.005, 0.3], Gen.Double[0, 1], Gen.Double[-1, 6], Gen.Double[0, 2], Gen.Double[0, 10])
            .Sample((solidity, knudsen, logPeclet, ratio, stokes) =>
            {
                var cell = new CellSolution(solidity, knudsen);
                var efficiency = cell.Efficiency(Math.Pow(10, logPeclet), ratio, stokes);
                Assert.InRange(efficiency, 0, cell.Flow.Rim);
            }, iter: 500);

    [Fact]
    public void The_curve_against_particle_size_has_no_jump()
    {
        // A 3 µm fibre in air at 10 cm/s; neighbouring sizes 1 % apart. E rises at most as the third power of the size.
        var cell = new CellSolution(0.08, 0.044);
        double At(double micrometres)
        {
            var slip = 1 + (0.166 / micrometres);
            return cell.Efficiency(11_000 * micrometres / slip, micrometres / 3, 0.1 * micrometres * micrometres * slip);
        }

        for (var size = 0.01; size < 10; size *= 1.01)
        {
            Assert.InRange(At(1.01 * size) / At(size), 0.97, 1.08);
        }
    }
}
