using FiberScope.Specimens.Files;
using UnitsNet;

namespace FiberScope.Specimens.Tests;

public sealed class RecipeFileTests
{
    public static TheoryData<string> Families => [.. SpecimenFamilies.All.Select(r => r.Name)];

    [Theory]
    [MemberData(nameof(Families))]
    public void A_recipe_comes_back_from_its_file_as_it_was(string family)
    {
        var recipe = SpecimenFamilies.Find(family)! with { Strip = new StripRecipe { ScaleBar = Length.FromMicrometers(20) } };
        Assert.Equal(recipe, RecipeFile.Read(RecipeFile.Write(recipe)));
    }

    [Theory]
    [InlineData("{", "line 1")]
    [InlineData("{\"name\":\"x\",\"pixel_size\":\"24.8 kg\",\"mat\":{\"fibres\":[]}}", "24.8 kg")]
    [InlineData("{\"name\":\"x\",\"pixel_size\":\"24.8 nm\",\"colour\":1,\"mat\":{\"fibres\":[]}}", "colour")]
    [InlineData("{\"name\":\"x\",\"mat\":{\"fibres\":[]}}", "pixel_size")]
    [InlineData("{\"name\":\"x\",\"pixel_size\":\"24.8 nm\",\"mat\":{\"fibres\":[],\"solidity\":1.2}}", "Solidity")]
    public void A_mistake_is_told_in_one_line(string json, string mentioned)
    {
        var problem = Assert.Throws<FormatException>(() => RecipeFile.Read(json));
        Assert.Contains(mentioned, problem.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', problem.Message);
    }

    [Fact]
    public void A_picture_of_one_pixel_thick_fibres_is_refused_with_the_reason()
    {
        var recipe = SpecimenFamilies.Find("thin-fibres")! with { PixelSize = Length.FromMicrometers(1) };
        var problem = Assert.Throws<ArgumentException>(() => VirtualSpecimen.Make(recipe, 1, TestContext.Current.CancellationToken));
        Assert.Contains("mean fibre diameter", problem.Message, StringComparison.Ordinal);
    }
}
