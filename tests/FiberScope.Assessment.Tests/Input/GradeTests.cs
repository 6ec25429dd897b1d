using FiberScope.Assessment.Input;
using FiberScope.Conformity;
using UnitsNet;

namespace FiberScope.Assessment.Tests.Input;

public sealed class GradeTests
{
    private const string Good = """
        grade: FM-25
        revision: "3"
        maximum_risk: 4 %
        limits:
          mean_diameter: {at_least: 1.6 um, at_most: 2.4 um}
          diameter_cv: {at_most: 60 %}
          basis_weight: {at_least: 23 gsm, at_most: 27 gsm}
          pressure_drop: {at_most: 6 mmH2O, maximum_risk: 2 %}
          penetration:
            - {particle: 0.3 um, at_most: 12 %}
            - {particle: 1 um, at_most: 3 %}
          air_permeability: {at: 125 Pa, at_least: 100 l/m2/s}
          quality_factor: {at_least: 0.02 1/Pa}
          shot_count: {at_most: 5 per mm2}
        """;

    [Fact]
    public void A_good_file_is_understood()
    {
        var grade = GradeReader.Parse(Good, "grade.yaml");
        Assert.Equal("FM-25 revision 3", grade.Name);
        Assert.Equal(9, grade.Limits.Length);
        Assert.Equal(0.04, Of(grade, "mean_diameter").MaximumRisk);
        Assert.Equal(0.02, Of(grade, "pressure_drop").MaximumRisk);
        Assert.Equal("at most 2.4 µm", new Limit(Characteristic.MeanDiameter, null, Of(grade, "mean_diameter").AtMost).Bounds);
        Assert.Equal([0.3, 1.0], grade.Limits.Where(l => l.Particle is not null).Select(l => Math.Round(l.Particle!.Value.Micrometers, 9)));
        // 1 l/(m² s) is 1 mm/s: the same volume flow over the same area.
        Assert.Equal(100, ((Speed)Of(grade, "air_permeability").AtLeast!).MillimetersPerSecond, 1e-9);
    }

    [Theory]
    [InlineData("mean_diameter:", "mean_diametre:", 5, "did you mean 'mean_diameter'?")]
    [InlineData("at_most: 2.4 um", "at_most: 1.4 um", 5, "must be below at_most")]
    [InlineData("at_most: 2.4 um", "at_most: 2.4", 5, "no unit")]
    [InlineData("at_most: 60 %", "risk: 5 %", 6, "needs at_least, at_most or both")]
    [InlineData("at: 125 Pa, ", "", 12, "needs 'at'")]
    [InlineData("particle: 1 um, ", "", 11, "needs 'particle'")]
    [InlineData("maximum_risk: 4 %", "maximum_risk: 60 %", 3, "between 0 and 0.5")]
    [InlineData("grade: FM-25", "name: FM-25", 1, "grade is missing")]
    public void A_mistake_is_told_with_its_line(string right, string wrong, int line, string told)
    {
        var problems = Assert.Throws<InputException>(() => GradeReader.Parse(Good.Replace(right, wrong, StringComparison.Ordinal), "grade.yaml")).Problems;
        Assert.Contains(problems, p => p.Line == line && p.Message.Contains(told, StringComparison.Ordinal));
    }

    private static Limit Of(Grade grade, string key) => grade.Limits.First(l => l.Characteristic.Key == key);
}
