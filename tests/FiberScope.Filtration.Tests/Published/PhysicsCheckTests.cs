using FiberScope.Filtration.Mechanisms;
using UnitsNet;

namespace FiberScope.Filtration.Tests.Published;

/// <summary>Every value of physics-checks.json, each with its source beside it.</summary>
public sealed class PhysicsCheckTests
{
    public static TheoryData<string> Names => [.. PhysicsCheck.All.Select(c => c.Name).Distinct(StringComparer.Ordinal).Where(n => !PhysicsChecks.NumericalReference.Contains(n) && n != "iso16890_weights_ePM10")];

    [Theory]
    [MemberData(nameof(Names))]
    public void A_published_value_is_met_within_its_tolerance(string name) =>
        Assert.All(PhysicsCheck.All.Where(c => c.Name == name), check =>
        {
            var found = PhysicsChecks.Evaluators[name](check);
            Assert.True(Math.Abs(found - check.Expected) <= check.Tolerance * Math.Abs(check.Expected), FormattableString.Invariant($"{name} {check.Inputs}: {found} instead of {check.Expected} ± {check.Tolerance:P4} ({check.Source})"));
        });

    [Fact]
    public void Every_check_has_a_calculation_and_every_calculation_a_check()
    {
        var names = PhysicsCheck.All.Select(c => c.Name).ToHashSet(StringComparer.Ordinal);
        Assert.Empty(names.Except(PhysicsChecks.Evaluators.Keys).Except(PhysicsChecks.NumericalReference));
        Assert.Empty(PhysicsChecks.Evaluators.Keys.Concat(PhysicsChecks.NumericalReference).Except(names));
        Assert.True(PhysicsCheck.All.Count > 600);
        Assert.All(PhysicsCheck.All, c => Assert.NotEmpty(c.Source));
    }

    [Fact]
    public void Weights_of_the_ambient_dust_for_ePM10_are_met()
    {
        var check = PhysicsCheck.All.Single(c => c.Name == "iso16890_weights_ePM10");
        var expected = check.Output.EnumerateArray().Select(e => e.GetDouble()).ToArray();
        var found = AmbientDust.Channels(Length.FromMicrometers(10)).Select(c => c.Weight).ToArray();
        Assert.Equal(expected.Length, found.Length);
        Assert.All(expected.Zip(found), pair => Assert.Equal(pair.First, pair.Second, (check.Tolerance * pair.First) + 5e-7));
    }

    // The fit's own bounds: root-mean-square error of ln E 0.08, worst 0.42 near the threshold, for R 0.1 to 1 and α 0.02 to 0.2.
    [Fact]
    public void The_impaction_fit_stays_near_the_trajectories()
    {
        var errors = PhysicsCheck.All.Where(c => c.Name == "cell_numeric_E_inertia_interception" && c["R"] is >= 0.1 and <= 1 && c["alpha"] >= 0.02)
            .Select(c => Math.Log((KuwabaraCell.ExactInterception(c["alpha"], c["R"]) + Impaction.TrajectoryFit(c["alpha"], c["R"], c["Stk"])) / c.Expected)).ToArray();
        Assert.True(errors.Length > 20);
        Assert.InRange(Math.Sqrt(errors.Average(e => e * e)), 0, 0.12);
        Assert.All(errors, e => Assert.InRange(e, -0.43, 0.43));
    }

    [Fact]
    public void The_polarisation_fit_stays_within_its_bound_of_the_trajectories() =>
        Assert.All(PhysicsCheck.All.Where(c => c.Name == "cell_numeric_E_polarisation"), c =>
            Assert.Equal(c.Expected, Electrostatic.Polarisation(c["N_sigma0"], KuwabaraCell.WallFactor(c["alpha"])), 0.026 * c.Expected));

    // ln(model / numerical) of the series form with A for 1/Ku: mean 0.019, worst 0.06, for Pe of 10 and above, R up to 0.3.
    [Fact]
    public void The_thin_layer_series_stays_near_the_grid_solution() =>
        Assert.All(PhysicsCheck.All.Where(c => c.Name == "cell_numeric_E_diffusion_interception" && c["Pe"] >= 10 && c["R"] <= 0.3), c =>
        {
            var (alpha, pe, r) = (c["alpha"], c["Pe"], c["R"]);
            var wall = KuwabaraCell.WallFactor(alpha);
            var e = Diffusion.BoundaryLayer(wall, pe) + Diffusion.SecondTerm(pe) + Diffusion.WithInterception(wall, pe, r) + KuwabaraCell.ExactInterception(alpha, r);
            Assert.InRange(Math.Log(e / c.Expected), -0.07, 0.07);
        });
}
