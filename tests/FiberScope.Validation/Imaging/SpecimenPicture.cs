using FiberScope.Imaging;
using FiberScope.Specimens;

namespace FiberScope.Validation.Imaging;

/// <summary>Virtual specimens as the measurement takes them, and the seeds that are theirs.</summary>
internal static class SpecimenPicture
{
    // Far apart, so that no field used while tuning is ever reported on.
    private const ulong Development = 1_000, Reporting = 900_000;

    /// <summary>The specimen of one field of a family: the family's recipe, varied from picture to picture.</summary>
    public static SpecimenCase Of(SpecimenRecipe family, bool reporting, int field)
    {
        var seed = (reporting ? Reporting : Development) + (ulong)field;
        return SpecimenCase.Of(SpecimenVariation.Of(family, seed), seed);
    }

    /// <summary>The picture alone: nothing of the truth but the pixel size goes with it.</summary>
    public static Micrograph Micrograph(SpecimenCase specimen)
    {
        var grey = new float[specimen.Pixels.Length];
        for (var i = 0; i < grey.Length; i++)
        {
            grey[i] = specimen.Pixels[i] / 255f;
        }

        return Micrograph(specimen, grey, specimen.Width, specimen.Height, specimen.Recipe.PixelSize);
    }

    /// <summary>Another version of the same picture, such as an enlarged one.</summary>
    public static Micrograph Micrograph(SpecimenCase specimen, float[] grey, int width, int height, UnitsNet.Length pixelSize) =>
        new(grey, width, height, pixelSize, Mode(specimen.Recipe.Kind), new MicrographSource(specimen.Recipe.Name, string.Empty, 0, 8, "recipe"), height * (specimen.Height - specimen.Recipe.FieldRows) / specimen.Height);

    private static ImagingMode Mode(SpecimenKind kind) => kind switch
    {
        SpecimenKind.Transmitted => ImagingMode.Transmitted,
        SpecimenKind.CrossSection => ImagingMode.CrossSection,
        _ => ImagingMode.SecondaryElectron,
    };
}
