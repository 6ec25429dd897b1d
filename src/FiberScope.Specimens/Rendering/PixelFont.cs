namespace FiberScope.Specimens.Rendering;

/// <summary>A small alphabet of dots, five wide and seven high, for the information strip.</summary>
internal static class PixelFont
{
    private const string Letters = "#-.0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZmnµ";

    private static ReadOnlySpan<long> Rows =>
    [
        // Seven rows of five bits each, the top row first.
        0x295F57D4AL, 0x000070000L, 0x00000018CL, 0x3A31AC62EL, 0x11842108EL, 0x3A213221FL, 0x78217043EL, 0x08CA97C42L,
        0x7E1E0862EL, 0x1910F462EL, 0x7C2221108L, 0x3A317462EL, 0x3A317844CL, 0x11518FE31L, 0x7A31F463EL, 0x3A308422EL,
        0x72518C65CL, 0x7E10F421FL, 0x7E10F4210L, 0x3A30BC62EL, 0x4631FC631L, 0x38842108EL, 0x1C4210A4CL, 0x4654C5251L,
        0x42108421FL, 0x4775AC631L, 0x47359C631L, 0x3A318C62EL, 0x7A31F4210L, 0x3A318D64DL, 0x7A31F5251L, 0x3E107043EL,
        0x7C8421084L, 0x46318C62EL, 0x46318C544L, 0x4631AD771L, 0x462A22A31L, 0x462A21084L, 0x7C222221FL, 0x001AAD6B5L,
        0x0016CC631L, 0x00118CFB0L,
    ];

    /// <summary>The width of a text; pixels.</summary>
    public static int WidthOf(string text, int scale) => text.Length * 6 * scale;

    /// <summary>The dots of a text, (column, row) from its top left; unknown letters are blank.</summary>
    public static IEnumerable<(int X, int Y)> Dots(string text)
    {
        for (var i = 0; i < text.Length; i++)
        {
            var letter = Letters.IndexOf(text[i], StringComparison.Ordinal);
            for (var dot = 0; letter >= 0 && dot < 35; dot++)
            {
                if ((Rows[letter] >> (34 - dot) & 1) == 1)
                {
                    yield return ((i * 6) + (dot % 5), dot / 5);
                }
            }
        }
    }
}
