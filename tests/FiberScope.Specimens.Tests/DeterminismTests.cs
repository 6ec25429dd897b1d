using System.Security.Cryptography;

namespace FiberScope.Specimens.Tests;

public sealed class DeterminismTests
{
    public static TheoryData<string> Families => [.. SpecimenFamilies.All.Select(r => r.Name)];

    [Theory]
    [MemberData(nameof(Families))]
    public void The_same_recipe_and_seed_give_the_same_bytes_and_another_seed_gives_others(string family)
    {
        var recipe = SmallPicture.Of(family);
        var first = Hash(VirtualSpecimen.Make(recipe, 5, TestContext.Current.CancellationToken));
        Assert.Equal(first, Hash(VirtualSpecimen.Make(recipe, 5, TestContext.Current.CancellationToken)));
        Assert.NotEqual(first, Hash(VirtualSpecimen.Make(recipe, 6, TestContext.Current.CancellationToken)));
    }

    private static string Hash(Specimen specimen) => Convert.ToHexString(SHA256.HashData(specimen.Pixels));
}
