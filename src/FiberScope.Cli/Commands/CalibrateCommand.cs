using System.CommandLine;
using FiberScope.Assessment.Calibrating;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Json;
using FiberScope.Cli.Console;
using FiberScope.Cli.Output;
using FiberScope.Filtration;

namespace FiberScope.Cli.Commands;

/// <summary><c>calibrate CALIBRATION.yaml</c>: learns from rolls that have both a structure and rig results.</summary>
internal static class CalibrateCommand
{
    public static Command Build(CommandConsole console)
    {
        var file = new Argument<string>("rolls") { Description = "The calibration file (YAML) with the rolls of one grade; - reads it from standard input." };
        var json = new Option<string>("--json") { Description = "Where to write the calibration; - writes to standard output. Default: NAME.calibration.json beside the file." };
        var correlations = CommonOptions.Correlations();
        var command = new Command("calibrate", "Fit a grade's inhomogeneity, unevenness and charge to rolls that were measured on a rig.") { file, json, correlations };
        command.SetAction((parsed, cancellation) => FiberScopeProgram.GuardAsync(
            console,
            token =>
            {
                Run(console, parsed.GetRequiredValue(file), parsed.GetValue(json), CommonOptions.Chosen(parsed, correlations), token);
                return ExitCode.Done;
            },
            cancellation));
        return command;
    }

    private static void Run(CommandConsole console, string source, string? wanted, CorrelationSet? correlations, CancellationToken cancellation)
    {
        var rolls = source == "-"
            ? CalibrationFile.Parse(console.ReadInput(), "standard input", Directory.GetCurrentDirectory())
            : CalibrationFile.Read(source);
        var json = wanted ?? (source == "-" ? "calibration.json" : Path.ChangeExtension(source, ".calibration.json"));
        if (json != "-")
        {
            OutputBatch.ProbeFile(json);
        }

        var standard = new ForecastSettings();
        var finding = Calibrator.Run(rolls, standard with { Correlations = correlations ?? rolls.Correlations ?? standard.Correlations }, cancellation);
        if (json == "-")
        {
            JsonDocuments.Calibration(finding, console.Output);
            console.Output.Flush();
            return;
        }

        using var batch = new OutputBatch();
        batch.Add(json, stream => JsonDocuments.Calibration(finding, stream));
        cancellation.ThrowIfCancellationRequested();
        batch.Publish();
        CalibrationSummary.Print(console.Out, finding);
        console.Out.WriteLine($"Written to {json}; name it as 'calibration:' in the grade, swatch or media files of the next rolls.");
    }
}
