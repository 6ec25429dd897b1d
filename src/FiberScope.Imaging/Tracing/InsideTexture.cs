namespace FiberScope.Imaging.Tracing;

/// <summary>How much of a ribbon's inside is crossed by edges of the full picture.</summary>
internal static class InsideTexture
{
    private const double Strong = 0.45;

    /// <summary>For each row the share of the inside, rims left out, whose gradient is strong against the ribbon's own edges.</summary>
    public static double[] Of(RibbonStrip strip, EdgeMap edges)
    {
        var share = new double[strip.Rows];
        var own = Series.Median([.. Enumerable.Range(0, strip.Rows).Select(r => Math.Min(Own(strip, edges, r, -1), Own(strip, edges, r, 1)))]);
        var limit = Math.Max(Strong * own, 5 * edges.Noise);
        for (var r = 0; r < strip.Rows; r++)
        {
            var (left, right) = (-strip.Left.Offset[r], strip.Right.Offset[r]);
            var margin = Math.Max(3, 0.2 * (right - left));
            var (count, strong) = (0, 0);
            for (var u = left + margin; u <= right - margin; u += 1)
            {
                count++;
                strong += edges.Strength.Sample((float)(strip.X[r] + (u * strip.Nx[r])), (float)(strip.Y[r] + (u * strip.Ny[r]))) > limit ? 1 : 0;
            }

            share[r] = count < 3 ? 0 : strong / (double)count;
        }

        return share;
    }

    private static double Own(RibbonStrip strip, EdgeMap edges, int r, int side)
    {
        var offset = side < 0 ? -strip.Left.Offset[r] : strip.Right.Offset[r];
        return edges.Strength.Sample((float)(strip.X[r] + (offset * strip.Nx[r])), (float)(strip.Y[r] + (offset * strip.Ny[r])));
    }
}
