namespace FiberScope.Imaging.Fitness;

/// <summary>How much of a field has run into the detector's white.</summary>
internal static class Saturation
{
    private const float White = 0.996f;

    /// <summary>The share of pixels that are white together with all their eight neighbours.</summary>
    /// <remarks>A white pixel alone is noise on a bright fibre and loses nothing; a white patch has lost its edges.</remarks>
    public static double FlatShare(Micrograph micrograph)
    {
        var grey = micrograph.Grey;
        var (width, height) = (micrograph.Width, micrograph.UsableHeight);
        long flat = 0;
        for (var y = 1; y < height - 1; y++)
        {
            var run = 0;
            for (var x = 0; x < width; x++)
            {
                var at = (y * width) + x;
                run = grey[at - width] >= White && grey[at] >= White && grey[at + width] >= White ? run + 1 : 0;
                flat += run >= 3 ? 1 : 0;
            }
        }

        return flat / ((double)width * height);
    }
}
