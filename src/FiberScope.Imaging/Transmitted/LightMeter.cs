using System.Collections.Immutable;
using FiberScope.Imaging.Edges;
using FiberScope.Imaging.Fitness;
using FiberScope.Imaging.Selection;
using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Transmitted;

/// <summary>Measures one field in transmitted light: fibres in focus are read, the others left out.</summary>
internal static class LightMeter
{
    /// <summary>Name and version of the algorithm.</summary>
    public const string Algorithm = "lens-rims@1";

    /// <summary>Fibres hide nothing of one another here and noise is low: every width is read alike.</summary>
    private static readonly DetectionCurve Everywhere = new(0);

    public static FieldMeasurement Measure(Micrograph micrograph, MeasurementSettings settings, CancellationToken cancellation)
    {
        var tracing = settings.Tracing with { LeastSolid = 0, LargestSwing = 2, LargestTexture = 0.9 };
        var widest = tracing.WidestShare * Math.Min(micrograph.Width, micrograph.UsableHeight);
        if (LightField.Of(micrograph) is not { } light || StabilisedPicture.From(ShadePicture.Of(light, micrograph, settings.Transmitted.CoreFill), widest) is not { } picture)
        {
            return Result(micrograph, settings, [], [], new Dictionary<string, int>(StringComparer.Ordinal), 0, null);
        }

        var tracer = new FibreTracer(picture, tracing, widest) { WantsRims = true };
        var passed = new Plane(light.Width, light.Height, light.Passed);
        var lines = tracer.Run(cancellation);
        var fibres = new RimPairs(picture, passed, tracer.Judge, settings.Transmitted.LeastEvenFlanks).Fibres(lines).Select(r => (Ribbon: r, Fit: RimProfile.Of(r, passed) is { } profile ? RimModel.Fit(profile) : null)).ToArray();
        var rejected = new SortedDictionary<string, int>(tracer.Judge.Refused.ToDictionary(), StringComparer.Ordinal);
        var sharpest = Sharpest(fibres, settings.Transmitted);
        var (traces, readings) = (new List<Trace>(), new List<PixelReading>());
        var taken = new List<(double Share, double Length)>();
        foreach (var (ribbon, found) in fibres)
        {
            cancellation.ThrowIfCancellationRequested();
            var length = ribbon.Accepted.Count(a => a);
            if (found is not { } fit || Refusal(ribbon, fit, sharpest, settings) is not null)
            {
                var why = found is { } known ? Refusal(ribbon, known, sharpest, settings)! : "no-rims";
                rejected[why] = rejected.GetValueOrDefault(why) + length;
                continue;
            }

            var correction = new Correction(-2 * fit.Outward, 2 * fit.Uncertainty, fit.Blur, true);
            readings.AddRange(RibbonReadings.Of(ribbon, correction, Everywhere, 1, traces.Count));
            traces.Add(new Trace(traces.Count, [.. Enumerable.Range(0, ribbon.Strip.Rows).Select(r => new TracePoint(ribbon.Strip.X[r] + 0.5, ribbon.Strip.Y[r] + 0.5, (ribbon.Width / 2) + fit.Outward))]));
            taken.Add((fit.LightTaken, length * ribbon.Strip.Step));
        }

        return Result(micrograph, settings, traces, readings, rejected, sharpest, Coverage(light, taken));
    }

    private static string? Refusal(Ribbon ribbon, RimFit fit, double sharpest, MeasurementSettings settings)
    {
        var diameter = ribbon.Width + (2 * fit.Outward);
        return fit.Contrast < settings.Transmitted.LeastContrast ? "faint"
            : fit.Blur > settings.Transmitted.LargestBlurRatio * sharpest ? "out-of-focus"
            : diameter < settings.Tracing.Narrowest ? "too-thin"
            : null;
    }

    /// <summary>The blur of the fibres in focus; pixels.</summary>
    private static double Sharpest((Ribbon Ribbon, RimFit? Fit)[] fibres, TransmittedSettings settings)
    {
        var fitted = fibres.Where(f => f.Fit is not null).ToArray();
        return fitted.Length == 0 ? 0 : new Statistics.WeightedSample(
            [.. fitted.Select(f => f.Fit!.Value.Blur)],
            [.. fitted.Select(f => Math.Max(1e-3, f.Ribbon.Accepted.Count(a => a) * f.Ribbon.Strip.Step))]).Quantile(settings.SharpestShare);
    }

    /// <summary>The share of the field that fibres at every depth cover.</summary>
    /// <remarks>
    /// The light that a fibre takes, summed across it, is the same in and out of focus, for blur only moves it about. Shades of fibres
    /// laid at random multiply, and the mean of such a product is exp(−Σ L d / A × light taken per width) (the mean of a product over a
    /// Poisson process; Daley and Vere-Jones 2003, from memory). So −ln(mean light) over what one fibre in focus takes is Σ L d / A,
    /// whatever is in focus; fibres at random cover 1 − exp(−Σ L d / A).
    /// </remarks>
    private static double? Coverage(LightField light, List<(double Share, double Length)> taken)
    {
        if (taken.Count < 3)
        {
            return null;
        }

        var mean = -Math.Log(Math.Max(0.02, light.Passed.Average()));
        var each = new Statistics.WeightedSample([.. taken.Select(t => t.Share)], [.. taken.Select(t => t.Length)]).Quantile(0.5);
        var coverage = 1 - Math.Exp(-mean / each);
        return each > 0.02 && coverage is > 0 and < 1 ? coverage : null;
    }

    private static FieldMeasurement Result(
        Micrograph micrograph, MeasurementSettings settings, IReadOnlyList<Trace> traces, IReadOnlyList<PixelReading> readings, IReadOnlyDictionary<string, int> rejected, double blur, double? coverage) => new()
        {
            Micrograph = micrograph,
            Fitness = FitnessMeter.Check(micrograph, new FieldEvidence { Readings = [.. readings], Defects = [] }, settings.Fitness),
            Traces = [.. traces],
            Readings = [.. readings],
            Rejected = rejected.ToImmutableSortedDictionary(StringComparer.Ordinal),
            Defects = [],
            DetectionLimitPixels = Math.Max(settings.Tracing.Narrowest, 3 * blur),
            BlurPixels = blur,
            FibreShare = coverage,
            Algorithm = Algorithm,
        };
}
