namespace FiberScope.Specimens.Mats;

/// <summary>The mat's dimensions in pixels.</summary>
internal sealed class MatScale
{
    public MatScale(SpecimenRecipe recipe)
    {
        Recipe = recipe;
        Diameters = new DiameterLaw(recipe.Mat, recipe.PixelSize.Meters);
        MeanDiameter = Diameters.Moment(1);
        LengthPerVolume = recipe.Mat.Solidity * 4 / (Math.PI * Diameters.Moment(2));
        MeanDepth = 1 / (LengthPerVolume * MeanDiameter);
        Thickness = recipe.Mat.Thickness.Meters / recipe.PixelSize.Meters;
        LaidDepth = Math.Min(Thickness, recipe.Mat.DeepestCover * MeanDepth);
    }

    public SpecimenRecipe Recipe { get; }

    public DiameterLaw Diameters { get; }

    /// <summary>Length-weighted mean diameter; pixels.</summary>
    public double MeanDiameter { get; }

    /// <summary>Fibre length per volume; pixels⁻². Solidity = length per volume × π ⟨d²⟩ / 4.</summary>
    public double LengthPerVolume { get; }

    /// <summary>Mean depth at which a ray from above meets its first fibre, 1 / (length per volume × ⟨d⟩); pixels.</summary>
    public double MeanDepth { get; }

    public double Thickness { get; }

    /// <summary>The depth of mat that is laid for the picture; pixels.</summary>
    public double LaidDepth { get; }

    public int Width => Recipe.WidthPixels;

    public int Height => Recipe.FieldRows;
}
