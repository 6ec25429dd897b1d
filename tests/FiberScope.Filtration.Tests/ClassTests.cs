using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests;

public sealed class ClassTests
{
    private static readonly Area Mask = Area.FromSquareCentimeters(150);

    // EN 1822-1: H13 from 99.95 % at the most-penetrating size, H14 from 99.995 % (read in vendor tables).
    [Fact]
    public void A_medium_of_99_97_percent_at_its_worst_size_is_H13()
    {
        var medium = Layer(6e-7, 0.07, 1.2e-4);
        var thickness = 1.2e-4 * 8.111728 / -Math.Log(MediaModel.Forecast([medium], At(0.0533)).PenetrationAtMostPenetratingSize);
        var judged = MediaClasses.Judge([medium with { Thickness = Length.FromMeters(thickness) }], At(0.0533));
        var classes = judged.Single(c => c.Standard == "EN 1822-1");
        Assert.Equal("H13", classes.Class);
        Assert.True(classes.All[0].Probability >= classes.All[^1].Probability);
        Assert.Equal("35 H", judged.Single(c => c.Standard == "ISO 29463-1").Class);
    }

    [Fact]
    public void An_open_medium_reaches_no_class_but_a_probability_is_still_told()
    {
        var judged = MediaClasses.Judge([Layer(2e-5, 0.05, 2e-4)], At(0.05), null, Mask);
        Assert.Null(judged.Single(c => c.Standard == "EN 149").Class);
        Assert.All(judged, c => Assert.All(c.All, p => Assert.InRange(p.Probability, 0, 1)));
    }

    [Fact]
    public void Higher_classes_are_never_likelier()
    {
        var judged = MediaClasses.Judge([Layer(2.5e-6, 0.07, 4e-4) with { Uncertainty = new LayerUncertainty { DiameterScale = 0.08 } }], At(0.09), new ForecastSettings { Draws = 100 }, Mask);
        foreach (var standard in judged.Where(c => c.Standard is "EN 1822-1" or "42 CFR 84, N series" or "ASHRAE 52.2"))
        {
            Assert.All(standard.All.Zip(standard.All.Skip(1)), pair => Assert.True(pair.First.Probability >= pair.Second.Probability - 1e-12));
        }
    }

    [Fact]
    public void Without_an_area_pressure_limits_are_named_as_not_judged() =>
        Assert.Contains("pressure drop", MediaClasses.Judge([Layer(2.5e-6, 0.07, 4e-4)], At(0.09)).Single(c => c.Standard == "EN 149").NotJudged, StringComparison.Ordinal);

    [Fact]
    public void Every_class_names_its_edition_and_where_its_limits_are_from() =>
        Assert.All(MediaClasses.Judge([Layer(2.5e-6, 0.07, 4e-4)], At(0.09)), c => Assert.True(c.Edition.Length > 3 && c.Provenance.Length > 3 && c.NotJudged.Length > 3));

    // Count median 75 nm and GSD 1.86 (42 CFR 84, from memory); mass median 238 nm (read in PMC10474009, table 1).
    [Fact]
    public void Published_test_aerosols_can_be_had_by_name()
    {
        var salt = TestAerosol.Published.Single(a => a.Id == "cfr84-salt");
        Assert.Equal(238, HatchChoate.Median(salt.Aerosol.CountMedian, salt.Aerosol.GeometricStandardDeviation, 3).Nanometers, 1.0);
        Assert.Equal(85, salt.Flow!.Value.LitersPerMinute, 1e-9);
        Assert.All(TestAerosol.Published, a => Assert.NotEmpty(a.Provenance));
    }

    [Fact]
    public void A_charge_does_not_help_where_the_test_takes_it_off()
    {
        var medium = Layer(4e-6, 0.08, 4e-4);
        var charged = medium with { Charge = new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(5e-5)) };
        double P95(MediaLayer layer) => MediaClasses.Judge([layer], At(0.09), null, Mask).Single(c => c.Standard == "42 CFR 84, P series").All[0].Probability;
        double N95(MediaLayer layer) => MediaClasses.Judge([layer], At(0.09), null, Mask).Single(c => c.Standard == "42 CFR 84, N series").All[0].Probability;
        Assert.Equal(P95(medium), P95(charged), 1e-9);
        Assert.True(N95(charged) > N95(medium));
    }
}
