using System.Text;
using BitMiracle.LibTiff.Classic;

namespace FiberScope.Imaging.Files;

/// <summary>Gathers the text that a page of a TIFF carries: its description and the instrument's private tags.</summary>
internal static class TiffText
{
    private static readonly UTF8Encoding StrictUtf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>The description, then every private tag that holds text, one after the other.</summary>
    public static string Read(Tiff tiff)
    {
        var text = new StringBuilder();
        if (tiff.GetField(TiffTag.IMAGEDESCRIPTION) is [var description, ..])
        {
            text.AppendLine(AsText(description));
        }

        for (var i = 0; i < tiff.GetTagListCount(); i++)
        {
            var tag = (TiffTag)tiff.GetTagListEntry(i);
            if (tag != TiffTag.IMAGEDESCRIPTION && tiff.GetField(tag) is { Length: > 0 } values)
            {
                text.AppendLine(AsText(values[^1]));
            }
        }

        return text.ToString().Trim('\r', '\n', '\0', ' ');
    }

    private static string AsText(FieldValue value) => value.Value switch
    {
        string text => Repaired(text),
        byte[] bytes when LooksLikeText(bytes) => Decoded(bytes),
        _ => string.Empty,
    };

    /// <summary>The library hands strings over as Latin-1; many writers use UTF-8.</summary>
    private static string Repaired(string text) => text.All(c => c < 256) ? Decoded(Encoding.Latin1.GetBytes(text)) : text;

    private static string Decoded(byte[] bytes)
    {
        try
        {
            return StrictUtf8.GetString(bytes);
        }
        catch (DecoderFallbackException)
        {
            return Encoding.Latin1.GetString(bytes);
        }
    }

    private static bool LooksLikeText(byte[] bytes) =>
        bytes.Length > 8 && bytes.Count(b => b is 9 or 10 or 13 or (>= 32 and not 127) or 0) >= 0.98 * bytes.Length && bytes.Count(b => b == 0) < 0.1 * bytes.Length;
}
