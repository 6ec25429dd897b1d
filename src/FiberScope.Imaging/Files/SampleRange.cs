namespace FiberScope.Imaging.Files;

/// <summary>Finds the white of 16-bit data.</summary>
internal static class SampleRange
{
    /// <summary>The white of the shallowest detector that could have written these values: 8, 10, 12, 14 or 16 bits deep.</summary>
    /// <remarks>Detectors of 12 bits store their values unscaled in 16; taken at face value such a picture is nearly black.</remarks>
    public static int WhiteOf(ReadOnlySpan<ushort> samples)
    {
        var most = 0;
        foreach (var sample in samples)
        {
            most = Math.Max(most, sample);
        }

        return most switch
        {
            < 256 => 255,
            < 1024 => 1023,
            < 4096 => 4095,
            < 16384 => 16383,
            _ => 65535,
        };
    }
}
