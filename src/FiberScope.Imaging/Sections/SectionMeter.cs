using System.Collections.Immutable;
using FiberScope.Imaging.Fitness;
using OpenCvSharp;

namespace FiberScope.Imaging.Sections;

/// <summary>Measures an embedded and polished section: every cut fibre is an ellipse whose minor axis is the fibre's diameter.</summary>
/// <remarks>
/// A fibre that crosses the plane at an angle φ to its normal shows as an ellipse of axes d and d / cos φ and is met with a
/// probability in proportion to cos φ; a reading therefore stands for major / minor of fibre length. Ellipses that touch the border
/// cannot be read, and large ones touch it more often: each reading also counts by the inverse of its chance to lie whole in the
/// field, W H / ((W − w)(H − h)) (R. E. Miles 1974; P. Lantuéjoul 1980; from memory).
/// </remarks>
public static class SectionMeter
{
    /// <summary>Name and version of the algorithm.</summary>
    public const string Algorithm = "section-ellipses@1";

    /// <summary>Measures the cut fibres of a section.</summary>
    /// <param name="micrograph">The picture.</param>
    /// <param name="settings">Every threshold.</param>
    /// <param name="cancellation">Stops the work between fibres.</param>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static FieldMeasurement Measure(Micrograph micrograph, MeasurementSettings settings, CancellationToken cancellation = default)
    {
        using var mask = SectionMask.Of(micrograph, settings.Sections);
        if (mask is null)
        {
            return Result(micrograph, settings, [], [], null, 0);
        }

        var spread = mask.Variance;
        var blur = Math.Sqrt(Math.Max(0.01, spread - (settings.Sections.SmoothingPixels * settings.Sections.SmoothingPixels)));
        var labels = SectionLabels.Split(mask.Mask, settings.Sections, out var count);
        var pieces = SectionPiece.All(labels, mask.Mask.Width, count);
        var reader = new EllipseReader(mask.Excess, labels);
        var rejected = new SortedDictionary<string, int>(StringComparer.Ordinal);
        var ellipses = new List<SectionEllipse>();
        foreach (var piece in pieces)
        {
            cancellation.ThrowIfCancellationRequested();
            if (Refusal(piece, reader, settings.Sections, mask.Mask.Size(), out var ellipse) is { } reason)
            {
                rejected[reason] = rejected.GetValueOrDefault(reason) + 1;
            }
            else
            {
                ellipses.Add(Sharpened(ellipse, spread));
            }
        }

        return Result(micrograph, settings, ellipses, rejected, AreaShare(mask.Mask, spread), blur);
    }

    private static string? Refusal(SectionPiece piece, EllipseReader reader, SectionSettings settings, Size field, out SectionEllipse ellipse)
    {
        ellipse = default;
        if (piece.Area < 0.7 * settings.SmallestPixels * settings.SmallestPixels)
        {
            return "too-small";
        }

        if (piece.Left <= 1 || piece.Top <= 1 || piece.Right >= field.Width - 2 || piece.Bottom >= field.Height - 2)
        {
            return "cut-by-border";
        }

        if (reader.Read(piece.Label, piece.X, piece.Y, piece.Reach) is not { } read || read.Seen < settings.LeastOutline)
        {
            return "outline-hidden";
        }

        ellipse = read.Ellipse;
        var area = Math.PI / 4 * ellipse.Minor * ellipse.Major;
        return ellipse.Minor < settings.SmallestPixels ? "too-small"
            : ellipse.Departure > Math.Max(0.35, settings.LargestDeparture * ellipse.Minor) || Math.Abs((area / piece.Area) - 1) > 0.25 ? "no-ellipse"
            : null;
    }

    /// <summary>Takes off what blur and smoothing do to a curved outline.</summary>
    /// <remarks>
    /// The half-level line of an edge of curvature κ under a Gaussian of variance σ² lies σ² κ / 2 inside the edge (to first order; it
    /// moves as a front does under diffusion); the curvatures at the ends of the axes are b / a² and a / b².
    /// </remarks>
    private static SectionEllipse Sharpened(SectionEllipse ellipse, double variance)
    {
        var (a, b) = (ellipse.Major / 2, ellipse.Minor / 2);
        return ellipse with { Minor = ellipse.Minor + (variance * b / (a * a)), Major = ellipse.Major + (variance * a / (b * b)) };
    }

    /// <summary>The share of the field that is cut fibre; the outlines' total curvature is 2π each, less 2π for each hole.</summary>
    private static double AreaShare(Mat mask, double variance)
    {
        using var one = new Mat();
        var outlines = Cv2.ConnectedComponents(mask, one) - 1;
        return Math.Min(1, (Cv2.CountNonZero(mask) + (Math.PI * variance * outlines)) / mask.Total());
    }

    private static FieldMeasurement Result(
        Micrograph micrograph, MeasurementSettings settings, List<SectionEllipse> ellipses, SortedDictionary<string, int> rejected, double? share, double blur)
    {
        var readings = ImmutableArray.CreateRange(ellipses.Select((ellipse, id) => Reading(ellipse, id, micrograph)));
        return new FieldMeasurement
        {
            Micrograph = micrograph,
            Fitness = FitnessMeter.Check(micrograph, new FieldEvidence { Readings = readings }, settings.Fitness),
            Traces = [.. ellipses.Select(Axis)],
            Readings = readings,
            Rejected = rejected.ToImmutableSortedDictionary(StringComparer.Ordinal),
            Defects = [],
            DetectionLimitPixels = Math.Max(settings.Sections.SmallestPixels, 3 * blur),
            BlurPixels = blur,
            Algorithm = Algorithm,
            FibreShare = share,
        };
    }

    private static PixelReading Reading(SectionEllipse ellipse, int id, Micrograph micrograph)
    {
        var whole = (1 - (2 * ellipse.HalfWidth / micrograph.Width)) * (1 - (2 * ellipse.HalfHeight / micrograph.UsableHeight));
        var length = ellipse.Major / ellipse.Minor / Math.Max(0.05, whole);

        // Five numbers are fitted to points whose neighbours share the smoothing's noise; edges brighter than the core, which shift the half-way level, add 0.15 px.
        var uncertainty = Math.Sqrt(Math.Pow(2 * ellipse.Departure / Math.Sqrt(Math.Max(1, (ellipse.Points / 3.0) - 5)), 2) + 0.0225);
        return new PixelReading(ellipse.X, ellipse.Y, ellipse.Direction, ellipse.Minor, uncertainty, length, id);
    }

    private static Trace Axis(SectionEllipse ellipse, int id)
    {
        var (dx, dy) = (ellipse.Major / 2 * Math.Cos(ellipse.Direction), ellipse.Major / 2 * Math.Sin(ellipse.Direction));
        return new Trace(id, [new(ellipse.X - dx, ellipse.Y - dy, ellipse.Minor / 2), new(ellipse.X + dx, ellipse.Y + dy, ellipse.Minor / 2)]);
    }
}
