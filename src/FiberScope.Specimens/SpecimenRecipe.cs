using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Specimens;

/// <summary>All that a virtual specimen is made from; with a seed it fixes every byte of the picture.</summary>
public sealed record SpecimenRecipe
{
    /// <summary>A short name, such as <c>fine-melt-blown</c>.</summary>
    public required string Name { get; init; }

    /// <summary>How the specimen is looked at.</summary>
    public SpecimenKind Kind { get; init; } = SpecimenKind.SecondaryElectron;

    /// <summary>Columns of the picture; 64 to 8192.</summary>
    public int WidthPixels { get; init => field = (int)Require.Within(value, 64, 8192, nameof(WidthPixels)); } = 2048;

    /// <summary>Rows of the picture, the information strip included; 64 to 8192.</summary>
    public int HeightPixels { get; init => field = (int)Require.Within(value, 64, 8192, nameof(HeightPixels)); } = 1536;

    /// <summary>The side of a pixel on the specimen; above zero.</summary>
    public required Length PixelSize { get; init; }

    /// <summary>The mat.</summary>
    public required MatRecipe Mat { get; init; }

    /// <summary>How it shines under the electron beam.</summary>
    public ElectronLook Electrons { get; init; } = new();

    /// <summary>How it looks in transmitted light.</summary>
    public LightLook Light { get; init; } = new();

    /// <summary>How a section of it looks.</summary>
    public SectionLook Section { get; init; } = new();

    /// <summary>What the instrument does to the picture.</summary>
    public CameraRecipe Camera { get; init; } = new();

    /// <summary>What is in the mat that is not a single fibre.</summary>
    public DefectRecipe Defects { get; init; } = new();

    /// <summary>The information strip; none when null.</summary>
    public StripRecipe? Strip { get; init; }

    /// <summary>Rows that show the specimen.</summary>
    public int FieldRows => HeightPixels - (Strip?.HeightPixels ?? 0);
}
