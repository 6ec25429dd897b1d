namespace FiberScope.Specimens.Tests;

internal static class SmallPicture
{
    public static SpecimenRecipe Of(string family) => SpecimenFamilies.Find(family)! with { WidthPixels = 192, HeightPixels = 160 };
}
