namespace FiberScope.Imaging.Files;

/// <summary>What each row of a picture says for or against lying in an information strip.</summary>
internal sealed class StripRows
{
    /// <summary>Neighbours closer than this are equal: a little more than half a step of 8 bits, so that 16-bit copies behave alike.</summary>
    private const float EqualWithin = 0.6f / 255;

    /// <summary>What differs from the ground by less than this is ground, ruffled by JPEG.</summary>
    private const float GroundWithin = 10f / 255;

    /// <summary>A line's pixels lie this close about their median.</summary>
    private const float LineWithin = 25f / 255;

    /// <summary>Looks at every row of a picture.</summary>
    public StripRows(ReadOnlySpan<float> grey, int width, int height)
    {
        (Width, Height) = (width, height);
        (Equal, Ground, OneGrey, _equalOfGround) = (new double[height], new double[height], new double[height], new double[height]);
        var ground = MostCommon(grey[((height - Math.Max(6, height / 64)) * width)..]);
        for (var y = 0; y < height; y++)
        {
            Look(grey.Slice(y * width, width), ground, y);
        }
    }

    private readonly double[] _equalOfGround;

    public int Width { get; }

    public int Height { get; }

    /// <summary>Per row the share of pixels that equal their neighbour.</summary>
    public double[] Equal { get; }

    /// <summary>Per row the share of pixels that have the grey most common at the bottom.</summary>
    public double[] Ground { get; }

    /// <summary>Per row the share of pixels close to the row's median.</summary>
    public double[] OneGrey { get; }

    /// <summary>The mean of <see cref="Equal"/> over rows, the last excluded; what lies outside the picture does not count.</summary>
    public double MeanEqual(int from, int to) => Mean(Equal, from, to);

    /// <summary>The mean of <see cref="Ground"/> over rows, the last excluded; what lies outside the picture does not count.</summary>
    public double MeanGround(int from, int to) => Mean(Ground, from, to);

    /// <summary>Whether the ground from a row on is without the noise that every seen surface has.</summary>
    public bool GroundIsFlat(int from) => Mean(_equalOfGround, from, Height) >= 0.55;

    private void Look(ReadOnlySpan<float> row, float ground, int y)
    {
        var (equal, onGround, equalOnGround) = (0, 0, 0);
        for (var x = 1; x < row.Length; x++)
        {
            var same = Math.Abs(row[x] - row[x - 1]) <= EqualWithin;
            var on = Math.Abs(row[x] - ground) <= GroundWithin;
            equal += same ? 1 : 0;
            onGround += on ? 1 : 0;
            equalOnGround += same && on ? 1 : 0;
        }

        Equal[y] = equal / (double)(row.Length - 1);
        Ground[y] = onGround / (double)(row.Length - 1);
        _equalOfGround[y] = onGround == 0 ? 0 : equalOnGround / (double)onGround;
        var sorted = row.ToArray();
        Array.Sort(sorted);
        var median = sorted[sorted.Length / 2];
        var near = 0;
        foreach (var value in sorted)
        {
            near += Math.Abs(value - median) <= LineWithin ? 1 : 0;
        }

        OneGrey[y] = near / (double)row.Length;
    }

    private static float MostCommon(ReadOnlySpan<float> values)
    {
        var counts = new int[256];
        foreach (var value in values)
        {
            counts[Math.Clamp((int)Math.Round(value * 255), 0, 255)]++;
        }

        return Array.IndexOf(counts, counts.Max()) / 255f;
    }

    private static double Mean(double[] values, int from, int to)
    {
        var (first, last) = (Math.Max(0, from), Math.Min(values.Length, to));
        var sum = 0.0;
        for (var i = first; i < last; i++)
        {
            sum += values[i];
        }

        return last > first ? sum / (last - first) : 0;
    }
}
