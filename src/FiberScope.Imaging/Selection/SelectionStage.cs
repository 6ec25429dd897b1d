using FiberScope.Imaging.Edges;
using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Selection;

/// <summary>Finds out how evenly a picture's fibres are read, by reading the same fibres again when they are thinner.</summary>
internal static class SelectionStage
{
    private const double ClassWidth = 0.18;
    private const int NoiseSeed = 20_117;

    /// <summary>The share of fibres read against their width.</summary>
    public static DetectionCurve Curve(
        Micrograph micrograph, StabilisedPicture picture, IReadOnlyList<Ribbon> ribbons, IReadOnlyList<Correction> corrections, double blur, TracingSettings settings, CancellationToken cancellation)
    {
        if (ribbons.Count < 30)
        {
            return DetectionCurve.Even;
        }

        var copy = ShrunkenCopy.Of(micrograph, blur, NoiseOnRoot(micrograph, picture), NoiseSeed);
        var widest = settings.WidestShare * Math.Min(copy.Picture.Width, copy.Picture.Height);
        if (StabilisedPicture.From(copy.Picture, widest) is not { } thin)
        {
            return DetectionCurve.Even;
        }

        var again = new FibreTracer(thin, settings, widest).Run(cancellation);
        return DetectionCurve.Fit(Classes(ribbons, corrections, copy, again), ShrunkenCopy.Shrink);
    }

    /// <summary>The noise is known for the stretched picture; here it is wanted for grey from 0 to 1.</summary>
    private static double NoiseOnRoot(Micrograph micrograph, StabilisedPicture picture)
    {
        var (low, high) = (float.PositiveInfinity, float.NegativeInfinity);
        var (first, last) = (0f, 0f);
        for (var i = 0; i < picture.Linear.Data.Length; i += 97)
        {
            var stretched = picture.Linear.Data[i];
            if (stretched < low)
            {
                (low, first) = (stretched, micrograph.Grey[i]);
            }

            if (stretched > high)
            {
                (high, last) = (stretched, micrograph.Grey[i]);
            }
        }

        return picture.Noise[0] * Math.Sqrt(Math.Max(1e-6, (last - first) / Math.Max(1e-6, high - low)));
    }

    private static List<RereadClass> Classes(IReadOnlyList<Ribbon> ribbons, IReadOnlyList<Correction> corrections, ShrunkenCopy copy, List<Ribbon> again)
    {
        var read = new ClaimMap(copy.Picture.Width, copy.Picture.Height);
        foreach (var ribbon in again)
        {
            for (var r = 0; r < ribbon.Strip.Rows; r++)
            {
                if (ribbon.Accepted[r])
                {
                    read.Take(ribbon.Strip.X[r], ribbon.Strip.Y[r], Normal(ribbon.Strip, r), 0.35 * ribbon.Width, ribbon.Strip.Step);
                }
            }
        }

        return
        [
            .. ribbons.Zip(corrections)
                .Select(p => (Width: Math.Max(0.5, p.First.Width - p.Second.Excess) / ShrunkenCopy.Shrink, Share: Reread(p.First, copy, read)))
                .Where(p => double.IsFinite(p.Share))
                .GroupBy(p => Math.Round(Math.Log(p.Width) / ClassWidth))
                .Select(g => new RereadClass(g.Average(p => p.Width), g.Average(p => p.Share), g.Count())),
        ];
    }

    /// <summary>The share of a fibre's accepted rows that lie on ground read again in its direction; NaN outside the copy.</summary>
    private static double Reread(Ribbon ribbon, ShrunkenCopy copy, ClaimMap read)
    {
        var (inside, found) = (0, 0);
        var strip = ribbon.Strip;
        for (var r = 0; r < strip.Rows; r++)
        {
            var (x, y) = (strip.X[r] + 0.5 - copy.Left, strip.Y[r] + 0.5 - copy.Top);
            if (!ribbon.Accepted[r] || x < 12 || y < 12 || x > copy.Width - 12 || y > copy.Height - 12)
            {
                continue;
            }

            inside++;
            found += read.Holds((x / ShrunkenCopy.Shrink) - 0.5, (y / ShrunkenCopy.Shrink) - 0.5, Normal(strip, r), 0.3) ? 1 : 0;
        }

        return inside < 5 ? double.NaN : found / (double)inside;
    }

    private static double Normal(RibbonStrip strip, int row) => Math.Atan2(strip.Ny[row], strip.Nx[row]);
}
