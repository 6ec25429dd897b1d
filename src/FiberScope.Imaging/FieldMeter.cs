using System.Collections.Immutable;
using FiberScope.Imaging.Coverage;
using FiberScope.Imaging.Defects;
using FiberScope.Imaging.Edges;
using FiberScope.Imaging.Fitness;
using FiberScope.Imaging.Openness;
using FiberScope.Imaging.Sections;
using FiberScope.Imaging.Selection;
using FiberScope.Imaging.Tracing;
using FiberScope.Imaging.Transmitted;

namespace FiberScope.Imaging;

/// <summary>Measures one field of view.</summary>
public static class FieldMeter
{
    /// <summary>Name and version of the algorithm.</summary>
    public const string Algorithm = "paired-edges@3";

    /// <summary>Measures the fibres of a micrograph.</summary>
    /// <param name="micrograph">The picture.</param>
    /// <param name="settings">Every threshold.</param>
    /// <param name="cancellation">Stops the work between fibres.</param>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static FieldMeasurement Measure(Micrograph micrograph, MeasurementSettings settings, CancellationToken cancellation = default)
    {
        if (micrograph.Mode == ImagingMode.CrossSection)
        {
            return SectionMeter.Measure(micrograph, settings, cancellation);
        }

        if (micrograph.Mode == ImagingMode.Transmitted)
        {
            return LightMeter.Measure(micrograph, settings, cancellation);
        }

        var tracing = settings.Tracing;
        var widest = tracing.WidestShare * Math.Min(micrograph.Width, micrograph.UsableHeight);
        if (StabilisedPicture.From(micrograph, widest) is not { } picture)
        {
            return Result(micrograph, settings, [], [], ImmutableSortedDictionary<string, int>.Empty, 0);
        }

        var tracer = new FibreTracer(picture, tracing, widest);
        var ribbons = tracer.Run(cancellation);
        var traces = ImmutableArray.CreateBuilder<Trace>();
        var readings = ImmutableArray.CreateBuilder<PixelReading>();
        var (corrections, priors) = WidthCorrection.Of(ribbons, picture.GreyNoise);
        var blur = ribbons.Count == 0 ? 0 : priors.Blur;
        var detection = DetectionCurve.Of(picture.GreyNoise);
        var shares = StretchShares.Of(ribbons);
        foreach (var (ribbon, correction) in ribbons.Zip(corrections))
        {
            readings.AddRange(RibbonReadings.Of(ribbon, correction, detection, shares[traces.Count], traces.Count));
            traces.Add(new Trace(traces.Count, CentreLine(ribbon)));
        }

        return Result(micrograph, settings, traces.ToImmutable(), readings.ToImmutable(), tracer.Judge.Refused.ToImmutableSortedDictionary(), blur);
    }

    private static ImmutableArray<TracePoint> CentreLine(Ribbon ribbon) =>
        [.. Enumerable.Range(0, ribbon.Strip.Rows).Select(r => new TracePoint(ribbon.Strip.X[r] + 0.5, ribbon.Strip.Y[r] + 0.5, ribbon.Width / 2))];

    private static FieldMeasurement Result(
        Micrograph micrograph, MeasurementSettings settings, ImmutableArray<Trace> traces, ImmutableArray<PixelReading> found, ImmutableSortedDictionary<string, int> rejected, double blur)
    {
        var defects = DefectFinder.Find(micrograph, found, settings.Defects);
        var readings = DefectMask.Off(micrograph, defects, found);
        return new FieldMeasurement
        {
            Micrograph = micrograph,
            Fitness = FitnessMeter.Check(micrograph, new FieldEvidence { Readings = readings, Defects = defects }, settings.Fitness),
            Traces = traces,
            Readings = readings,
            Rejected = readings.Length < found.Length ? rejected.SetItem("on-defect", found.Length - readings.Length) : rejected,
            Defects = defects,
            DetectionLimitPixels = Math.Max(2.5, 2 * blur),
            BlurPixels = blur,
            Openness = readings.IsEmpty ? null : FieldOpenness.Of(micrograph, new FieldEvidence { Readings = readings }.MedianDiameter ?? 1),
            EdgeShares = EdgeDirections.Of(micrograph),
            FibreShare = GroundCoverage.Of(micrograph, readings, settings.Coverage),
            Algorithm = Algorithm,
        };
    }
}
