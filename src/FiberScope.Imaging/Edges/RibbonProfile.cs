using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Edges;

/// <summary>The mean grey across a traced fibre over its accepted rows, each centred and stretched to the usual width.</summary>
internal sealed class RibbonProfile
{
    private const int MostRows = 120;

    // Samples half a pixel apart hold all that pixels hold; inside a wide fibre nothing changes so fast.
    private const double Fine = 0.5;
    private const double ReachOutside = 9;

    private readonly double[] _offsets, _grey;
    private readonly double _noise, _rows;

    private RibbonProfile(double[] offsets, double[] grey, double width, double noise, double rows, double scatter) =>
        (_offsets, _grey, Width, _noise, _rows, Scatter) = (offsets, grey, width, noise, rows, scatter);

    /// <summary>Distance of the steepest points; pixels.</summary>
    public double Width { get; }

    /// <summary>Standard deviation of the rows' widths about their running median; pixels.</summary>
    public double Scatter { get; }

    public EdgeProfile View => new() { Offsets = _offsets, Grey = _grey, PixelNoise = _noise, Length = _rows, Left = -0.5 * Width, Right = 0.5 * Width };

    public static RibbonProfile? Of(Ribbon ribbon, GreyNoise noise)
    {
        int[] rows = [.. Enumerable.Range(0, ribbon.Strip.Rows).Where(r => ribbon.Accepted[r])];
        if (rows.Length < 4)
        {
            return null;
        }

        var strip = ribbon.Strip;
        var width = Series.Median([.. rows.Select(r => ribbon.Widths[r])]);
        double[] scatter = [.. rows.Select(r => Math.Abs(strip.Left.Offset[r] + strip.Right.Offset[r] - ribbon.Widths[r]))];

        // Rows are laid on the fibre's smooth course: laid on their own noisy edges they would fake a sharper edge at the wrong place.
        double[] middles = [.. Enumerable.Range(0, strip.Rows).Select(r => 0.5 * (strip.Right.Offset[r] - strip.Left.Offset[r]))];
        var centre = Runs.Median(middles, ribbon.Accepted, 12 * width / strip.Step);
        var offsets = Places(width);
        var grey = new double[offsets.Length];
        var stride = Math.Max(1, rows.Length / MostRows);
        var used = 0;
        for (var i = 0; i < rows.Length; i += stride, used++)
        {
            Sum(strip, rows[i], centre[rows[i]], Math.Clamp(ribbon.Widths[rows[i]] / width, 0.8, 1.25), width, offsets, grey);
        }

        for (var i = 0; i < grey.Length; i++)
        {
            grey[i] /= used;
        }

        var middle = grey[grey.Length / 2];
        return new RibbonProfile(offsets, grey, width, noise.At(middle), used * Math.Min(strip.Step * stride, 1), 1.4826 * Series.Median(scatter));
    }

    private static void Sum(RibbonStrip strip, int row, double centre, double stretch, double width, double[] offsets, double[] grey)
    {
        // Inside, the rows are stretched to the same width; outside, shifted, so that the blur stays what it is.
        var half = 0.5 * width;
        for (var i = 0; i < offsets.Length; i++)
        {
            var inside = Math.Clamp(offsets[i], -half, half);
            grey[i] += strip.Grey(row, centre + (inside * stretch) + (offsets[i] - inside));
        }
    }

    private static double[] Places(double width)
    {
        var half = 0.5 * width;
        var edge = Math.Max(0, half - Math.Max(4, 0.15 * width));
        var coarse = Math.Max(Fine, width / 24);
        var right = new List<double>();
        for (var u = 0.5 * Fine; u <= half + ReachOutside; u += u < edge - coarse ? coarse : Fine)
        {
            right.Add(u);
        }

        return [.. right.AsEnumerable().Reverse().Select(u => -u), .. right];
    }
}
