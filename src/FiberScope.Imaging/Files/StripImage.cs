namespace FiberScope.Imaging.Files;

/// <summary>The rows of the information strip and the grey of its ground.</summary>
internal sealed class StripImage
{
    private readonly float[] _grey;
    private readonly int _start;

    public StripImage(Picture picture, int rows)
    {
        _grey = picture.Grey;
        Width = picture.Width;
        Rows = rows;
        _start = (picture.Height - rows) * picture.Width;
        Ground = MostCommon(_grey.AsSpan(_start, rows * Width));
    }

    public int Width { get; }

    public int Rows { get; }

    /// <summary>The most common grey of the strip.</summary>
    public float Ground { get; }

    public float this[int x, int y] => _grey[_start + (y * Width) + x];

    private static float MostCommon(ReadOnlySpan<float> values)
    {
        var counts = new int[256];
        foreach (var value in values)
        {
            counts[Math.Clamp((int)Math.Round(value * 255), 0, 255)]++;
        }

        return Array.IndexOf(counts, counts.Max()) / 255f;
    }
}
