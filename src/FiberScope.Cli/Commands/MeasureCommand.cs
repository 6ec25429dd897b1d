using System.CommandLine;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Json;
using FiberScope.Assessment.Measuring;
using FiberScope.Cli.Console;
using FiberScope.Cli.Output;
using FiberScope.Imaging;

namespace FiberScope.Cli.Commands;

/// <summary><c>measure IMAGES...</c>: fibre diameters alone, for scripts and other programs.</summary>
internal static class MeasureCommand
{
    public static Command Build(CommandConsole console)
    {
        var images = new Argument<string[]>("images") { Description = "Image files or globs; - reads one image from standard input.", Arity = ArgumentArity.OneOrMore };
        var pixelSize = new Option<string>("--pixel-size") { Description = "The side of a pixel on the specimen, such as \"24.8 nm\"." };
        var scaleBar = new Option<string>("--scale-bar") { Description = "The length of the scale bar in the information strip, such as \"10 um\"." };
        var imaging = new Option<string>("--imaging") { Description = "How the micrographs were made.", DefaultValueFactory = _ => "sem" }.AcceptOnlyFromAmong([.. Words.ImagingModes.Keys]);
        var masks = new Option<string>("--masks") { Description = "Folder for NAME.defects.png and NAME.traces.png of every field." };
        var json = new Option<string>("--json") { Description = "Where to write the measurement; - writes to standard output.", Required = true };
        var unfit = CommonOptions.IncludeUnfit();
        var seed = CommonOptions.Seed();
        var command = new Command("measure", "Measure fibre diameters in micrographs.") { images, pixelSize, scaleBar, imaging, masks, json, unfit, seed };
        command.SetAction((parsed, cancellation) => FiberScopeProgram.GuardAsync(
            console,
            token =>
            {
                using var input = new PipedImage(console);
                var set = new ImageSet("", Words.ImagingModes[parsed.GetRequiredValue(imaging)], [Group(parsed.GetRequiredValue(images), parsed.GetValue(pixelSize), parsed.GetValue(scaleBar), input)], Directory.GetCurrentDirectory(), "command line");
                var settings = new MeasuringSettings { IncludeUnfit = parsed.GetValue(unfit), Seed = parsed.GetValue(seed) };
                Run(console, set, settings, parsed.GetRequiredValue(json), parsed.GetValue(masks), token);
                return ExitCode.Done;
            },
            cancellation));
        return command;
    }

    private static ImageGroup Group(string[] images, string? pixelSize, string? scaleBar, PipedImage input) => new()
    {
        Patterns = [.. images.Where(i => i != "-")],
        Given = images.Contains("-", StringComparer.Ordinal) ? [new FoundImage("standard input", input.Path)] : [],
        PixelSize = pixelSize is null ? null : OptionValue.Length("--pixel-size", pixelSize),
        ScaleBar = scaleBar is null ? null : OptionValue.Length("--scale-bar", scaleBar).Value,
    };

    private static void Run(CommandConsole console, ImageSet images, MeasuringSettings settings, string json, string? masks, CancellationToken cancellation)
    {
        if (json != "-")
        {
            OutputBatch.ProbeFile(json);
        }

        if (masks is not null)
        {
            OutputBatch.Probe(masks);
        }

        NativeImaging.Check();
        var run = ProgressDisplay.Run(console, "measuring", progress => MeasurementRun.Of(images, settings, progress, cancellation));
        using var batch = new OutputBatch();
        if (masks is not null)
        {
            MaskFiles.Add(batch, run.Fields, masks);
        }

        if (json == "-")
        {
            batch.Publish();
            JsonDocuments.Measurement(run.Fields, run.Survey, run.Solidity, run.Caveats, console.Output);
            console.Output.Flush();
            return;
        }

        batch.Add(json, stream => JsonDocuments.Measurement(run.Fields, run.Survey, run.Solidity, run.Caveats, stream));
        cancellation.ThrowIfCancellationRequested();
        batch.Publish();
        console.Out.WriteLine(FormattableString.Invariant($"{run.Survey.Readings.Length} readings on {run.Survey.FibreCount} fibres in {run.Survey.FieldCount} fields: length-weighted mean {run.Survey.LengthWeighted.Mean.Micrometers:G4} µm ({run.Survey.MeanInterval95.Low.Micrometers:G4} to {run.Survey.MeanInterval95.High.Micrometers:G4} µm, 95 %)."));
        foreach (var caveat in run.Caveats)
        {
            console.Error.WriteLine(caveat.Message);
        }
    }
}
