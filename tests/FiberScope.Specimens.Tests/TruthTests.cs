using UnitsNet;

namespace FiberScope.Specimens.Tests;

public sealed class TruthTests
{
    [Fact]
    public void The_length_laid_per_area_is_what_solidity_and_diameters_ask_for()
    {
        // Solidity = length per volume × π⟨d²⟩/4, here with one diameter; the mat is laid 5 mean depths deep.
        var recipe = Mat(order: 0);
        var lengths = Enumerable.Range(0, 8).Select(i => Make(recipe, (ulong)i).Mat.LengthPixels).ToArray();
        var perArea = lengths.Average() / (400.0 * 300.0);
        Assert.InRange(perArea * 10 / 5, 0.95, 1.05);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.4)]
    [InlineData(0.8)]
    public void Fibres_are_as_aligned_as_the_recipe_says(double order)
    {
        var truths = Enumerable.Range(0, 8).Select(i => Make(Mat(order), (ulong)i).MatOrientation).ToArray();
        var along = truths.Average(t => t.Order * Math.Cos(2 * (t.PrincipalDirection.Radians - (30 * Math.PI / 180))));
        Assert.InRange(along, order - 0.06, order + 0.06);
    }

    [Fact]
    public void What_is_visible_lies_under_the_pixel_that_shows_it()
    {
        var specimen = VirtualSpecimen.Make(SmallPicture.Of("fine-melt-blown"), 4, TestContext.Current.CancellationToken);
        Assert.NotEmpty(specimen.Truth.Stations);
        Assert.All(specimen.Truth.Stations, s => Assert.Equal(s.Fibre, specimen.TopFibre[((int)s.Y * specimen.Width) + (int)s.X]));
    }

    [Fact]
    public void A_section_covers_the_area_that_the_solidity_asks_for()
    {
        var recipe = SpecimenFamilies.Find("cross-sections")! with { WidthPixels = 1000, HeightPixels = 800 };
        var share = Enumerable.Range(0, 3).Average(i => Make(recipe, (ulong)i).Solidity);
        Assert.InRange(share, recipe.Mat.Solidity - 0.01, recipe.Mat.Solidity + 0.01);
    }

    [Fact]
    public void Defects_are_counted_where_they_can_be_seen()
    {
        var specimen = VirtualSpecimen.Make(SpecimenFamilies.Find("ropes-shot-films")! with { WidthPixels = 900, HeightPixels = 700 }, 2, TestContext.Current.CancellationToken);
        foreach (var kind in Enum.GetValues<DefectForm>())
        {
            var marked = specimen.DefectMask.Count((byte)kind);
            Assert.True(marked > 0, $"No {kind} to be seen.");
            Assert.InRange(specimen.Truth.Defects.Where(d => d.Kind == kind).Sum(d => d.AreaPixels), marked, marked * 1.3);
        }
    }

    private static SpecimenTruth Make(SpecimenRecipe recipe, ulong seed) => VirtualSpecimen.Make(recipe, seed, TestContext.Current.CancellationToken).Truth;

    private static SpecimenRecipe Mat(double order) => new()
    {
        Name = "mat",
        WidthPixels = 400,
        HeightPixels = 300,
        PixelSize = Length.FromMicrometers(1),
        Mat = new MatRecipe
        {
            Fibres = [new FibrePopulation { MedianDiameter = Length.FromMicrometers(10), GeometricStandardDeviation = 1 }],
            Thickness = Length.FromMillimeters(5),
            OrientationOrder = order,
            PreferredDirection = Angle.FromDegrees(30),
            DeepestCover = 5,
            Wander = Angle.FromRadians(0.03),
        },
    };
}
