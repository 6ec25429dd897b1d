using FiberScope.Imaging.Edges;
using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Selection;

/// <summary>The readings of one fibre: neighbouring rows gathered into one reading each, weighted for what the picture hides.</summary>
internal static class RibbonReadings
{
    /// <summary>Neighbouring rows tell the same: readings closer than this share of the width add nothing.</summary>
    private const double SpacingShare = 1.0 / 3;

    private const double LeastSpacing = 2;

    /// <summary>The readings of a stretch; <paramref name="share"/> is what a length of it counts for, see <see cref="StretchShares"/>.</summary>
    public static IEnumerable<PixelReading> Of(Ribbon ribbon, Correction correction, DetectionCurve detection, double share, int trace)
    {
        var strip = ribbon.Strip;
        var rows = Math.Max(1, (int)Math.Round(Math.Max(LeastSpacing, SpacingShare * ribbon.Width) / strip.Step));
        for (var start = 0; start < strip.Rows; start += rows)
        {
            int[] accepted = [.. Enumerable.Range(start, Math.Min(rows, strip.Rows - start)).Where(r => ribbon.Accepted[r])];
            if (accepted.Length == 0)
            {
                continue;
            }

            var middle = accepted[accepted.Length / 2];
            var width = Math.Max(0.5, accepted.Average(r => ribbon.Widths[r]) - correction.Excess);
            var direction = Math.Atan2(strip.Nx[middle], -strip.Ny[middle]);
            direction -= Math.PI * Math.Floor(direction / Math.PI);
            yield return new PixelReading(
                strip.X[middle] + 0.5, strip.Y[middle] + 0.5, direction, width, correction.Uncertainty, share * accepted.Length * strip.Step / detection.Share(width), trace);
        }
    }
}
