using System.Collections.Immutable;
using FiberScope.Imaging.Edges;
using FiberScope.Imaging.Fitness;
using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging;

/// <summary>Measures one field of view.</summary>
public static class FieldMeter
{
    /// <summary>Name and version of the algorithm.</summary>
    public const string Algorithm = "paired-edges@1";

    /// <summary>Measures the fibres of a micrograph.</summary>
    /// <param name="micrograph">The picture.</param>
    /// <param name="settings">Every threshold.</param>
    /// <param name="cancellation">Stops the work between fibres.</param>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static FieldMeasurement Measure(Micrograph micrograph, MeasurementSettings settings, CancellationToken cancellation = default)
    {
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
        foreach (var (ribbon, correction) in ribbons.Zip(corrections))
        {
            Add(ribbon, correction, traces, readings);
        }

        var blur = ribbons.Count == 0 ? 0 : priors.Blur;
        return Result(micrograph, settings, traces.ToImmutable(), readings.ToImmutable(), tracer.Judge.Refused.ToImmutableSortedDictionary(), blur);
    }

    private static void Add(Ribbon ribbon, Correction correction, ImmutableArray<Trace>.Builder traces, ImmutableArray<PixelReading>.Builder readings)
    {
        var strip = ribbon.Strip;
        var id = traces.Count;
        var points = Enumerable.Range(0, strip.Rows).Select(r => new TracePoint(strip.X[r] + 0.5, strip.Y[r] + 0.5, ribbon.Width / 2));
        traces.Add(new Trace(id, [.. points]));
        for (var r = 0; r < strip.Rows; r++)
        {
            if (ribbon.Accepted[r])
            {
                var direction = Math.Atan2(strip.Nx[r], -strip.Ny[r]);
                direction -= Math.PI * Math.Floor(direction / Math.PI);
                readings.Add(new PixelReading(strip.X[r] + 0.5, strip.Y[r] + 0.5, direction, Math.Max(0.5, ribbon.Widths[r] - correction.Excess), correction.Uncertainty, strip.Step, id));
            }
        }
    }

    private static FieldMeasurement Result(
        Micrograph micrograph, MeasurementSettings settings, ImmutableArray<Trace> traces, ImmutableArray<PixelReading> readings, ImmutableSortedDictionary<string, int> rejected, double blur) => new()
    {
        Micrograph = micrograph,
        Fitness = FitnessMeter.Check(micrograph, new FieldEvidence { Readings = readings }, settings.Fitness),
        Traces = traces,
        Readings = readings,
        Rejected = rejected,
        Defects = [],
        DetectionLimitPixels = Math.Max(2.5, 2 * blur),
        BlurPixels = blur,
        Algorithm = Algorithm,
    };
}
