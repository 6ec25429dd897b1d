using System.Collections.Concurrent;
using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Imaging;
using FiberScope.Imaging.Files;

namespace FiberScope.Assessment.Measuring;

/// <summary>From image files to measured fields: finds, reads and measures them on all cores.</summary>
/// <remarks>The same files and settings give the same result, however many fields are measured at the same time.</remarks>
public sealed class Measurer(MeasuringSettings settings)
{
    /// <summary>Measures the images of every layer.</summary>
    /// <param name="sets">The layers' images.</param>
    /// <param name="progress">Told after every step; null when nobody watches.</param>
    /// <param name="cancellation">Stops between and within fields.</param>
    /// <returns>The fields of each layer, in the order given.</returns>
    /// <exception cref="InputException">Images are missing or cannot be read; every one is listed.</exception>
    public ImmutableArray<ImmutableArray<FieldFinding>> Measure(IReadOnlyList<ImageSet> sets, IProgress<RunProgress>? progress, CancellationToken cancellation)
    {
        var files = Find(sets);
        var steps = new StepCounter(progress, files.Count);
        var waiting = Read(sets, files, steps, cancellation);
        steps.Extend(waiting.Length);
        var fields = new FieldFinding[waiting.Length];
        Run(
            waiting.Length,
            i =>
            {
                fields[i] = One(waiting[i], i + 1, cancellation);
                steps.Done("measured " + waiting[i].Name);
            },
            cancellation);
        return [.. sets.Select((_, set) => DiameterSource.Choose(waiting.Zip(fields).Where(p => p.First.Set == set).Select(p => p.Second)))];
    }

    private static List<WantedFile> Find(IReadOnlyList<ImageSet> sets)
    {
        var problems = new List<InputProblem>();
        var files = new List<WantedFile>();
        var owners = new Dictionary<string, string>(StringComparer.Ordinal);
        for (var set = 0; set < sets.Count; set++)
        {
            foreach (var group in sets[set].Groups)
            {
                void Complain(string message) => problems.Add(new InputProblem(sets[set].File, group.Line, message));
                foreach (var file in ImageFinder.Find(group, sets[set].Folder, Complain))
                {
                    if (!owners.TryAdd(Path.GetFullPath(file.Path), file.Name))
                    {
                        Complain($"'{file.Name}' is listed in two image groups; keep it in one");
                    }

                    files.Add(new WantedFile(set, group, file));
                }
            }
        }

        return problems.Count == 0 ? files : throw new InputException(problems);
    }

    private WaitingField[] Read(IReadOnlyList<ImageSet> sets, List<WantedFile> files, StepCounter steps, CancellationToken cancellation)
    {
        var pages = new IReadOnlyList<Micrograph>[files.Count];
        var problems = new ConcurrentBag<(int Order, string Message)>();
        Run(
            files.Count,
            i =>
            {
                try
                {
                    pages[i] = Pages(files[i], files[i].Group.Imaging ?? sets[files[i].Set].Imaging);
                    steps.Done("read " + files[i].Image.Name);
                }
                catch (ImageRejectedException e)
                {
                    problems.Add((i, e.Message));
                }
            },
            cancellation);
        return problems.IsEmpty
            ? [.. files.SelectMany((wanted, i) => pages[i].Select(page => new WaitingField(wanted.Set, Name(wanted, page, pages[i].Count), page, wanted.Group.PixelSize)))]
            : throw new InputException(string.Join('\n', problems.OrderBy(p => p.Order).Select(p => p.Message)));
    }

    private FieldFinding One(WaitingField field, int number, CancellationToken cancellation)
    {
        var measurement = FieldMeter.Measure(field.Micrograph, settings.Fields, cancellation);
        var readings = FieldReadings.Of(measurement, number);
        var survey = readings.Length == 0 ? null : DiameterSurvey.From(readings, new SurveySettings { BootstrapReplicates = 100, Seed = settings.Seed });
        return new FieldFinding
        {
            Number = number,
            Name = field.Name,
            Measurement = measurement,
            LengthWeighted = survey?.LengthWeighted,
            NumberWeighted = survey?.NumberWeighted,
            PixelSizeUncertainty = field.PixelSize?.RelativeUncertainty ?? settings.ScaleUncertainty,
            LeftOutBecause = LeftOutBecause(measurement),
        };
    }

    private string? LeftOutBecause(FieldMeasurement measurement)
    {
        if (measurement.Readings.IsEmpty)
        {
            return "no measurable fibre";
        }

        if (measurement.Fitness.IsFit || settings.IncludeUnfit)
        {
            return null;
        }

        var failed = measurement.Fitness.Checks.Where(c => !c.Passed).ToArray();
        return $"unfit for measuring ({string.Join(", ", failed.Select(c => c.Name))}): {failed[0].Advice}";
    }

    private void Run(int count, Action<int> step, CancellationToken cancellation)
    {
        var options = new ParallelOptions { MaxDegreeOfParallelism = settings.Parallelism, CancellationToken = cancellation };
        try
        {
            Parallel.For(0, count, options, step);
        }
        catch (AggregateException e) when (e.Flatten().InnerExceptions.FirstOrDefault(inner => inner is not OperationCanceledException) is { } first)
        {
            System.Runtime.ExceptionServices.ExceptionDispatchInfo.Throw(first);
        }
        catch (AggregateException) when (cancellation.IsCancellationRequested)
        {
            throw new OperationCanceledException(cancellation);
        }
    }

    private static ScaleRequest Scale(ImageGroup group) => new()
    {
        PixelSize = group.PixelSize?.Value,
        ScaleBarLength = group.ScaleBar,
        GivenBy = "given pixel size",
    };

    private static string Name(WantedFile wanted, Micrograph page, int pages) =>
        pages == 1 ? wanted.Image.Name : FormattableString.Invariant($"{wanted.Image.Name}#{page.Source.Page + 1}");

    private static IReadOnlyList<Micrograph> Pages(WantedFile wanted, ImagingMode imaging)
    {
        try
        {
            return MicrographReader.Read(File.ReadAllBytes(wanted.Image.Path), wanted.Image.Name, Scale(wanted.Group), imaging);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new ImageRejectedException($"{wanted.Image.Name}: cannot be read: {e.Message.Split('\n')[0]}", e);
        }
    }

    private sealed record WantedFile(int Set, ImageGroup Group, FoundImage Image);
}
