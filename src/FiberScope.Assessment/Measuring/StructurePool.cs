using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Imaging;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Assessment.Measuring;

/// <summary>Pools what the fields of a layer show besides diameters.</summary>
public static class StructurePool
{
    private const int Classes = 12;

    /// <summary>Fewer circles tell nothing of which would be unlikely.</summary>
    private const int LeastCircles = 20;

    /// <summary>An opening is a pinhole when fewer than this many as large would be expected in all fields together.</summary>
    private const double Unlikely = 0.01;

    private const double LargestRatio = 1000;

    /// <summary>The structure of the fields that count.</summary>
    /// <param name="fields">The fields of a layer.</param>
    public static MatStructure Of(IReadOnlyList<FieldFinding> fields)
    {
        FieldMeasurement[] counted = [.. fields.Where(f => f.IsIncluded).Select(f => f.Measurement)];
        return new MatStructure(Orientation(counted), Openings(counted), Uniformity(counted), Defects(counted));
    }

    /// <summary>From the edges where the fields show them, else from the readings: those are rare where fibres lie close and nearly parallel.</summary>
    private static OrientationSummary? Orientation(FieldMeasurement[] fields)
    {
        if (fields.Length == 0 || fields[0].Micrograph.Mode == ImagingMode.CrossSection)
        {
            return null;
        }

        (double Direction, double Weight)[] pieces = fields.Any(f => !f.EdgeShares.IsEmpty)
            ? [.. fields.SelectMany(f => f.EdgeShares.Select((share, i) => ((i + 0.5) * Math.PI / f.EdgeShares.Length, share * Seen(f))))]
            : [.. fields.SelectMany(f => f.Readings.Select(r => (r.Direction, r.RepresentedLength * f.Micrograph.PixelSize.Meters)))];
        var total = pieces.Sum(p => p.Weight);
        return total > 0 ? Orientation(pieces, total) : null;
    }

    private static OrientationSummary Orientation((double Direction, double Weight)[] pieces, double total)
    {
        var (cosine, sine) = (pieces.Sum(p => p.Weight * Math.Cos(2 * p.Direction)), pieces.Sum(p => p.Weight * Math.Sin(2 * p.Direction)));
        var degrees = Math.Atan2(sine, cosine) / 2 * 180 / Math.PI;
        var shares = new double[Classes];
        foreach (var (direction, weight) in pieces)
        {
            shares[(int)Math.Clamp(direction / Math.PI * Classes, 0, Classes - 1)] += weight / total;
        }

        var machine = pieces.Where(p => Math.Cos(2 * p.Direction) < 0).Sum(p => p.Weight);
        return new OrientationSummary
        {
            PrincipalDirection = Angle.FromDegrees(degrees < 0 ? degrees + 180 : degrees),
            Order = Math.Min(1, Math.Sqrt((cosine * cosine) + (sine * sine)) / total),
            Shares = [.. shares],
            MachineToCross = Math.Min(LargestRatio, machine / Math.Max(total - machine, total / LargestRatio / 2)),
        };
    }

    private static OpeningSummary? Openings(FieldMeasurement[] fields)
    {
        var shown = fields.Where(f => f.Openness is not null).ToArray();
        if (shown.Length == 0)
        {
            return null;
        }

        double[] metres = [.. shown.SelectMany(f => f.Openness!.Diameters.Select(d => d * f.Micrograph.PixelSize.Meters)).Order()];
        double[] largest = [.. shown.Where(f => !f.Openness!.Diameters.IsEmpty).Select(f => f.Openness!.Diameters[0] * f.Micrograph.PixelSize.Meters)];
        var byNumber = metres.Length == 0 ? null : WeightedSample.Even(metres);
        return new OpeningSummary
        {
            Diameters = [.. metres.Select(d => Length.FromMeters(d))],
            AreaMedian = Length.FromMeters(metres.Length == 0 ? 0 : new WeightedSample(metres, [.. metres.Select(d => d * d)]).Quantile(0.5)),
            Median = Length.FromMeters(byNumber?.Quantile(0.5) ?? 0),
            GeometricStandardDeviation = byNumber?.GeometricStandardDeviation ?? 1,
            Largest = Length.FromMeters(metres.Length == 0 ? 0 : metres[^1]),
            LargestUncertainty = Length.FromMeters(largest.Length < 2 ? 0 : WeightedSample.Even(largest).StandardDeviation),
            Pinholes = byNumber is null ? 0 : Pinholes(metres, byNumber),
            OpenShare = shown.Average(f => f.Openness!.OpenShare),
        };
    }

    /// <summary>Openings that the rest of them, taken for log-normal, would make unlikely; the quartiles are not moved by a few holes.</summary>
    private static int Pinholes(double[] ascending, WeightedSample byNumber)
    {
        if (ascending.Length < LeastCircles)
        {
            return 0;
        }

        // The upper half alone tells how the large ones fall off: small circles end where looking for them ends.
        var (median, upper) = (Math.Log(byNumber.Quantile(0.5)), Math.Log(byNumber.Quantile(0.9)));
        var spread = Math.Max(0.05, (upper - median) / 1.2816);
        var limit = Math.Exp(median + (spread * MathNet.Numerics.Distributions.Normal.InvCDF(0, 1, 1 - (Unlikely / ascending.Length))));
        return ascending.Count(d => d > limit);
    }

    private static UniformitySummary? Uniformity(FieldMeasurement[] fields)
    {
        var shown = fields.Where(f => f.Openness is not null).ToArray();
        if (shown.Length == 0 || shown.Any(f => Math.Abs((f.Micrograph.PixelSize / shown[0].Micrograph.PixelSize) - 1) > 0.05))
        {
            return null;
        }

        var pixel = shown[0].Micrograph.PixelSize;
        var readings = shown.SelectMany(f => f.Readings).ToArray();
        var diameters = new WeightedSample([.. readings.Select(r => r.Diameter)], [.. readings.Select(r => r.RepresentedLength)]);
        var cover = 1 - shown.Average(f => f.Openness!.OpenShare);
        var windows = ImmutableArray.CreateBuilder<UniformityAtWindow>();
        foreach (var side in shown.SelectMany(f => f.Openness!.Cover.Select(c => c.Side)).Distinct().Order())
        {
            double[] shares = [.. shown.SelectMany(f => f.Openness!.Cover.Where(c => c.Side == side).SelectMany(c => c.Shares))];
            if (shares.Length >= 6 && cover is > 0.02 and < 0.98)
            {
                windows.Add(new UniformityAtWindow(pixel * side, WeightedSample.Even(shares).StandardDeviation, RandomMat.CoverDeviation(cover, diameters, side)));
            }
        }

        var telling = windows.Where(w => w.StandardDeviation > 0).ToArray();
        return telling.Length == 0 ? null : new UniformitySummary
        {
            Windows = windows.ToImmutable(),
            Unevenness = Math.Exp(telling.Average(w => Math.Log(w.StandardDeviation / w.RandomStandardDeviation))),
        };
    }

    private static DefectSummary Defects(FieldMeasurement[] fields)
    {
        var area = fields.Sum(Seen);
        return new DefectSummary(Area.FromSquareMeters(area), [.. Enum.GetValues<DefectKind>().Select(kind =>
        {
            var count = fields.Sum(f => f.Defects.Count(d => d.Kind == kind));
            var taken = fields.Sum(f => f.Defects.Where(d => d.Kind == kind).Sum(d => d.AreaPixels) * Math.Pow(f.Micrograph.PixelSize.Meters, 2));
            return new DefectShare(kind.ToString().ToLowerInvariant(), count, area > 0 ? count / (area * 1e6) : 0, area > 0 ? taken / area : 0);
        })]);
    }

    private static double Seen(FieldMeasurement field) =>
        field.Micrograph.Width * (double)field.Micrograph.UsableHeight * Math.Pow(field.Micrograph.PixelSize.Meters, 2);
}
