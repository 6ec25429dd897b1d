namespace FiberScope.Specimens.Tests;

internal static class SmallPicture
{
    public static SpecimenRecipe Of(string family) => SpecimenFamilies.Find(family)! with { WidthPixels = 320, HeightPixels = 256 };
}
