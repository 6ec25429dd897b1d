namespace FiberScope.Imaging.Files;

/// <summary>Turns colour into grey.</summary>
internal static class Luminance
{
    /// <summary>The grey of a colour, Y = 0.2126 R + 0.7152 G + 0.0722 B.</summary>
    /// <remarks>
    /// The weights of ITU-R BT.709-6 (2015), section 3.2, applied to the values as stored. Micrographs that were saved as colour
    /// hold the same grey in all three channels, so the choice of weights matters only for coloured annotation.
    /// </remarks>
    public static float Of(float red, float green, float blue) => (0.2126f * red) + (0.7152f * green) + (0.0722f * blue);
}
