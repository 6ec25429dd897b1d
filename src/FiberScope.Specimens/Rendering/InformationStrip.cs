using System.Globalization;
using UnitsNet;

namespace FiberScope.Specimens.Rendering;

/// <summary>Draws the strip under the picture: the scale bar between two end ticks, its length, and what the picture is.</summary>
internal static class InformationStrip
{
    public static void Draw(byte[] bytes, SpecimenRecipe recipe, ulong seed)
    {
        if (recipe.Strip is not { } strip)
        {
            return;
        }

        var (ink, paper) = strip.Light ? ((byte)12, (byte)242) : ((byte)245, (byte)10);
        var (width, top) = (recipe.WidthPixels, recipe.FieldRows);
        bytes.AsSpan(top * width, strip.HeightPixels * width).Fill(paper);
        bytes.AsSpan(top * width, 2 * width).Fill((byte)(strip.Light ? 120 : 96));
        var scale = Math.Max(1, strip.HeightPixels / 22);
        var bar = (int)Math.Floor((strip.ScaleBar.Meters / recipe.PixelSize.Meters) + 0.5);
        var right = width - (8 * scale);
        var middle = top + (strip.HeightPixels / 2);
        var thick = Math.Max(2, scale);
        Fill(bytes, width, right - bar, middle - (thick / 2), bar, thick, ink);
        Fill(bytes, width, right - bar, middle - (3 * scale), thick, 6 * scale, ink);
        Fill(bytes, width, right - thick, middle - (3 * scale), thick, 6 * scale, ink);
        var label = Text(strip.ScaleBar);
        Write(bytes, width, right - bar - PixelFont.WidthOf(label, scale) - (5 * scale), middle - (7 * scale / 2), label, scale, ink);
        var title = $"VIRTUAL {recipe.Name} #{seed.ToString(CultureInfo.InvariantCulture)}".ToUpperInvariant();
        var small = Math.Max(1, scale - 1);
        if (PixelFont.WidthOf(title, small) + (16 * scale) < right - bar - PixelFont.WidthOf(label, scale) - (5 * scale))
        {
            Write(bytes, width, 8 * scale, middle - (7 * small / 2), title, small, ink);
        }
    }

    private static string Text(Length length) => length.Micrometers >= 1
        ? string.Create(CultureInfo.InvariantCulture, $"{length.Micrometers:0.###} µm")
        : string.Create(CultureInfo.InvariantCulture, $"{length.Nanometers:0.###} nm");

    private static void Write(byte[] bytes, int width, int left, int top, string text, int scale, byte ink)
    {
        foreach (var (x, y) in PixelFont.Dots(text))
        {
            Fill(bytes, width, left + (x * scale), top + (y * scale), scale, scale, ink);
        }
    }

    private static void Fill(byte[] bytes, int width, int left, int top, int columns, int rows, byte value)
    {
        for (var y = top; y < top + rows && (y + 1) * width <= bytes.Length; y++)
        {
            var from = Math.Clamp(left, 0, width);
            var to = Math.Clamp(left + columns, 0, width);
            bytes.AsSpan((y * width) + from, to - from).Fill(value);
        }
    }
}
