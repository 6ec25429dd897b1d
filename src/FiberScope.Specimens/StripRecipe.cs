using UnitsNet;

namespace FiberScope.Specimens;

/// <summary>The information strip under the picture.</summary>
public sealed record StripRecipe
{
    /// <summary>Its height; pixels, 24 to 400.</summary>
    public int HeightPixels { get; init => field = (int)Statistics.Require.Within(value, 24, 400, nameof(HeightPixels)); } = 64;

    /// <summary>The length that the scale bar shows; above zero.</summary>
    public required Length ScaleBar { get; init; }

    /// <summary>Black letters on white instead of white on black.</summary>
    public bool Light { get; init; }
}
