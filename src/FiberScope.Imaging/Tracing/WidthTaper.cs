namespace FiberScope.Imaging.Tracing;

/// <summary>Whether the two edges of a ribbon run parallel, as those of one fibre do and those of two converging fibres do not.</summary>
internal static class WidthTaper
{
    /// <summary>A shorter line would follow the noise of the edges of thin fibres; pixels.</summary>
    private const double LeastReach = 10;

    /// <summary>How many rows either way the line is laid through.</summary>
    public static int Reach(double step, double width) => Math.Max(4, (int)Math.Round(Math.Max(LeastReach, 1.2 * width) / step));

    /// <summary>For each row the change of width along the fibre, per pixel, from a straight line through the accepted rows around it.</summary>
    public static double[] Of(double[] widths, bool[] accepted, double step, double width)
    {
        var reach = Reach(step, width);
        var taper = new double[widths.Length];
        for (var r = 0; r < widths.Length; r++)
        {
            double n = 0, s = 0, ss = 0, w = 0, sw = 0;
            for (var k = Math.Max(0, r - reach); k <= Math.Min(widths.Length - 1, r + reach); k++)
            {
                if (accepted[k])
                {
                    var along = (k - r) * step;
                    n++;
                    s += along;
                    ss += along * along;
                    w += widths[k];
                    sw += along * widths[k];
                }
            }

            var spread = (n * ss) - (s * s);
            taper[r] = n < 5 || spread <= 0 ? 0 : ((n * sw) - (s * w)) / spread;
        }

        return taper;
    }
}
