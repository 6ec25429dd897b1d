namespace FiberScope.Imaging.Tracing;

/// <summary>What each row of a straightened fibre looks like between and beside its edges.</summary>
internal sealed class StripLook
{
    private StripLook(int rows)
    {
        ContrastLeft = new double[rows];
        ContrastRight = new double[rows];
        Outside = new double[rows];
        Peak = new double[rows];
        Middle = new double[rows];
        Swing = new double[rows];
        Asymmetry = new double[rows];
    }

    /// <summary>Brightest just inside the left edge less darkest just outside it.</summary>
    public double[] ContrastLeft { get; }

    public double[] ContrastRight { get; }

    /// <summary>Mean of the two outside levels.</summary>
    public double[] Outside { get; }

    /// <summary>Mean of the two inside levels next to the edges.</summary>
    public double[] Peak { get; }

    /// <summary>Darkest place inside.</summary>
    public double[] Middle { get; }

    /// <summary>The smaller of the largest climb and the largest drop of the lateral gradient inside, over that of the outer edges.</summary>
    public double[] Swing { get; }

    /// <summary>Difference of the outside levels over the contrast.</summary>
    public double[] Asymmetry { get; }

    public static StripLook Of(RibbonStrip strip, double width, GreyNoise noise)
    {
        var look = new StripLook(strip.Rows);
        var swing = new double[strip.Rows];
        var slopes = new float[strip.Slope.Length];
        Series.SmoothRows(strip.Slope, slopes, strip.Rows, strip.Columns, Math.Max(0.5, 0.35 * width / strip.Step));
        var blur = Blur(strip);
        var clear = Math.Clamp(1 - (2 * blur / (0.5 * width)), 0, 0.6);
        for (var r = 0; r < strip.Rows; r++)
        {
            look.Levels(strip, r, width);
            var slopeNoise = noise.At(look.Peak[r]) * GreyNoise.SlopeShare(Math.Sqrt((strip.Along * strip.Along) + (0.1225 * width * width)), Math.Max(0.5, 0.015 * width));
            swing[r] = clear * width > 2.5 ? Math.Max(0, Largest(strip, slopes, r, clear) - (2 * slopeNoise)) : 0;
        }

        var smooth = Series.Smooth(swing, Math.Max(0.7, 0.4 * width / strip.Step));
        for (var r = 0; r < strip.Rows; r++)
        {
            look.Swing[r] = smooth[r] / Math.Max(1e-9, 0.5 * (strip.Left.Fall[r] + strip.Right.Fall[r]));
        }

        return look;
    }

    /// <summary>Blur from contrast over slope: an edge of height c blurred by σ has slope c / (σ √(2π)).</summary>
    public static double Blur(RibbonStrip strip)
    {
        var ratios = new List<double>();
        for (var r = 0; r < strip.Rows; r++)
        {
            if (strip.Left.Found[r] && strip.Right.Found[r])
            {
                var gap = Math.Max(1.5, 0.3 * strip.Half[r]);
                var left = strip.At(r, -strip.Left.Offset[r] + gap) - strip.At(r, -strip.Left.Offset[r] - gap);
                var right = strip.At(r, strip.Right.Offset[r] - gap) - strip.At(r, strip.Right.Offset[r] + gap);
                ratios.Add(0.5 * ((left / Math.Max(1e-9, strip.Left.Fall[r])) + (right / Math.Max(1e-9, strip.Right.Fall[r]))));
            }
        }

        return ratios.Count == 0 ? 1 : Math.Max(0.3, Series.Median([.. ratios]) / Math.Sqrt(2 * Math.PI));
    }

    private void Levels(RibbonStrip strip, int r, double width)
    {
        var (left, right) = (-strip.Left.Offset[r], strip.Right.Offset[r]);
        var (gap, inner) = (Math.Max(1.5, 0.22 * width), Math.Max(1, 0.18 * width));
        var (outLeft, outRight) = (Extreme(strip, r, left - gap, left, -1), Extreme(strip, r, right, right + gap, -1));
        var (inLeft, inRight) = (Extreme(strip, r, left, left + inner, 1), Extreme(strip, r, right - inner, right, 1));
        var (centre, half) = (0.5 * (left + right), 0.5 * (right - left));
        ContrastLeft[r] = inLeft - outLeft;
        ContrastRight[r] = inRight - outRight;
        Outside[r] = 0.5 * (outLeft + outRight);
        Peak[r] = 0.5 * (inLeft + inRight);
        Middle[r] = Extreme(strip, r, centre - (0.65 * half), centre + (0.65 * half), -1);
        Asymmetry[r] = (outRight - outLeft) / Math.Max(1e-6, (0.5 * (inLeft + inRight)) - Math.Min(outLeft, outRight));
    }

    private static double Extreme(RibbonStrip strip, int r, double from, double to, int sign)
    {
        var best = double.NegativeInfinity;
        for (var i = 0; i <= 6; i++)
        {
            best = Math.Max(best, sign * strip.At(r, from + ((to - from) * i / 6)));
        }

        return sign * best;
    }

    private static double Largest(RibbonStrip strip, float[] slopes, int r, double clear)
    {
        var centre = 0.5 * (strip.Right.Offset[r] - strip.Left.Offset[r]);
        var half = 0.5 * (strip.Right.Offset[r] + strip.Left.Offset[r]);
        var (from, to) = (strip.Column(centre - (clear * half)), strip.Column(centre + (clear * half)));
        double low = double.PositiveInfinity, high = double.NegativeInfinity, climb = 0, drop = 0;
        for (var c = from; c <= to; c++)
        {
            double value = slopes[(r * strip.Columns) + c];
            low = Math.Min(low, value);
            high = Math.Max(high, value);
            climb = Math.Max(climb, value - low);
            drop = Math.Max(drop, high - value);
        }

        return Math.Min(climb, drop);
    }
}
