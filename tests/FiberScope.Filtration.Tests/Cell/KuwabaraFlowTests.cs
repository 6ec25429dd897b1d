using FiberScope.Filtration.Cell;
using FiberScope.Validation.Filtration.Reference;

namespace FiberScope.Filtration.Tests.Cell;

// Kuwabara factor and exact interception: Kuwabara (1959), J. Phys. Soc. Jpn. 14, 527, evaluated by an independent script.
public sealed class KuwabaraFlowTests
{
    [Theory]
    [InlineData(0.01, 1.5625)]
    [InlineData(0.02, 1.2259)]
    [InlineData(0.05, 0.797241)]
    [InlineData(0.1, 0.49879)]
    [InlineData(0.2, 0.24472)]
    public void Drag_without_slip_is_one_over_the_Kuwabara_factor(double solidity, double factor) =>
        Assert.Equal(1 / factor, new KuwabaraFlow(solidity, 0).Drag, 1e-4 / factor);

    [Theory]
    [InlineData(0.1, 0.0111453)]
    [InlineData(0.3, 0.0891964)]
    [InlineData(1, 0.727565)]
    public void Interception_at_a_solidity_of_5_percent_is_exact(double ratio, double expected) =>
        Assert.Equal(expected, new KuwabaraFlow(0.05, 0).Interception(ratio), 1e-6);

    // Ratio of the drag with slip to that without; the same independent script.
    [Theory]
    [InlineData(0.02, 0.3, 0.8720623871370959)]
    [InlineData(0.05, 0.1, 0.9139276950593858)]
    [InlineData(0.1, 1, 0.6489520691884689)]
    [InlineData(0.2, 2, 0.4888352840054134)]
    public void Slip_lowers_the_drag(double solidity, double knudsen, double expected) =>
        Assert.Equal(expected, new KuwabaraFlow(solidity, knudsen).Drag / new KuwabaraFlow(solidity, 0).Drag, 1e-6);

    [Theory]
    [InlineData(0.01, 0)]
    [InlineData(0.08, 0.3)]
    [InlineData(0.3, 1)]
    public void The_closed_form_solves_the_linear_system_of_its_conditions(double solidity, double knudsen)
    {
        var closed = new KuwabaraFlow(solidity, knudsen);
        var solved = new CellFlow(solidity, knudsen);
        var middle = 0.5 * (1 + closed.Rim);
        Assert.Equal(solved.Stream(middle), closed.Stream(middle), 1e-10);
        Assert.Equal(solved.StreamSlope(1), closed.SurfaceSpeed, 1e-10);
        Assert.Equal(0.5 * solved.StreamCurvature(1), closed.HalfCurvature, 1e-10);
    }

    [Fact]
    public void A_particle_too_large_for_the_cell_gets_all_its_air() =>
        Assert.Equal(1 / Math.Sqrt(0.2), new KuwabaraFlow(0.2, 0).Interception(5), 1e-12);
}
