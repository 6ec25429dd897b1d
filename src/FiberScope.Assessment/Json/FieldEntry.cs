using System.Collections.Immutable;
using System.Text.Json.Serialization;
using FiberScope.Imaging;

namespace FiberScope.Assessment.Json;

/// <summary>One field of a measurement file.</summary>
internal sealed record FieldEntry
{
    public required string Image { get; init; }

    public required string Sha256 { get; init; }

    public required int Page { get; init; }

    public required double PixelSizeUm { get; init; }

    public required string PixelSizeOrigin { get; init; }

    public required int WidthPx { get; init; }

    public required int HeightPx { get; init; }

    public required int ExcludedRowsPx { get; init; }

    public required string? LeftOutBecause { get; init; }

    public required FitnessEntry Fitness { get; init; }

    public required double DetectionLimitUm { get; init; }

    public required double BlurPx { get; init; }

    public required double? FibreShare { get; init; }

    public required string Algorithm { get; init; }

    public required ReadingEntry[] Readings { get; init; }

    public required ImmutableSortedDictionary<string, int> Rejected { get; init; }

    public required StatisticsEntry? LengthWeighted { get; init; }

    public required StatisticsEntry? NumberWeighted { get; init; }

    public required OrientationEntry? Orientation { get; init; }

    public required DefectEntry[] Defects { get; init; }

    public static FieldEntry Of(FieldFinding field)
    {
        var measurement = field.Measurement;
        var picture = measurement.Micrograph;
        var pixel = picture.PixelSize.Micrometers;
        return new FieldEntry
        {
            Image = field.Name,
            Sha256 = picture.Source.Sha256,
            Page = picture.Source.Page,
            PixelSizeUm = pixel,
            PixelSizeOrigin = picture.Source.PixelSizeOrigin,
            WidthPx = picture.Width,
            HeightPx = picture.Height,
            ExcludedRowsPx = picture.ExcludedBottomRows,
            LeftOutBecause = field.LeftOutBecause,
            Fitness = new FitnessEntry(measurement.Fitness.IsFit, measurement.Fitness.Checks),
            DetectionLimitUm = measurement.DetectionLimitPixels * pixel,
            BlurPx = measurement.BlurPixels,
            FibreShare = measurement.FibreShare,
            Algorithm = measurement.Algorithm,
            Readings = [.. measurement.Readings.Select(r => new ReadingEntry(r.X, r.Y, r.Diameter * pixel, r.StandardUncertainty * pixel, r.RepresentedLength * pixel, r.Trace, r.Direction * 180 / Math.PI))],
            Rejected = measurement.Rejected,
            LengthWeighted = field.LengthWeighted is { } byLength ? StatisticsEntry.Of(byLength) : null,
            NumberWeighted = field.NumberWeighted is { } byNumber ? StatisticsEntry.Of(byNumber) : null,
            Orientation = OrientationEntry.Of(measurement),
            Defects = [.. measurement.Defects.Select(d => DefectEntry.Of(d, pixel))],
        };
    }
}

/// <summary>Whether a field can be measured, check by check.</summary>
internal sealed record FitnessEntry(bool Fit, ImmutableArray<FitnessCheck> Checks);

/// <summary>One reading; the direction runs from the x axis towards the y axis, which points down.</summary>
internal sealed record ReadingEntry(double XPx, double YPx, double DiameterUm, double UUm, double LengthUm, int Trace, double DirectionDeg);

/// <summary>One defect region.</summary>
internal sealed record DefectEntry(
    string Kind,
    int Code,
    double AreaPx,
    [property: JsonPropertyName("area_um2")] double Area,
    int[][] OutlinePx)
{
    public static DefectEntry Of(DefectRegion defect, double pixelMicrometres) => new(
        defect.Kind.ToString().ToLowerInvariant(),
        (int)defect.Kind,
        defect.AreaPixels,
        defect.AreaPixels * pixelMicrometres * pixelMicrometres,
        [.. defect.Outline.Select(c => new[] { c.X, c.Y })]);
}

/// <summary>The length-weighted directions of a field's readings.</summary>
internal sealed record OrientationEntry(double PrincipalDirectionDeg, double OrderParameter)
{
    /// <summary>The principal direction and ⟨cos 2θ⟩ about it: the first moment of doubled angles, weighted by length.</summary>
    public static OrientationEntry? Of(FieldMeasurement measurement)
    {
        double length = 0, cosine = 0, sine = 0;
        foreach (var reading in measurement.Readings)
        {
            length += reading.RepresentedLength;
            cosine += reading.RepresentedLength * Math.Cos(2 * reading.Direction);
            sine += reading.RepresentedLength * Math.Sin(2 * reading.Direction);
        }

        if (!(length > 0))
        {
            return null;
        }

        var degrees = Math.Atan2(sine, cosine) / 2 * 180 / Math.PI;
        return new OrientationEntry(degrees < 0 ? degrees + 180 : degrees, Math.Sqrt((cosine * cosine) + (sine * sine)) / length);
    }
}
