using System.CommandLine;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Json;
using FiberScope.Assessment.Predicting;
using FiberScope.Cli.Console;
using FiberScope.Cli.Output;
using FiberScope.Filtration;

namespace FiberScope.Cli.Commands;

/// <summary><c>predict MEDIA.yaml</c>: the filtration forecast alone, for scripts and other programs.</summary>
internal static class PredictCommand
{
    public static Command Build(CommandConsole console)
    {
        var media = new Argument<string>("media") { Description = "The media file (YAML); - reads it from standard input." };
        var json = new Option<string>("--json") { Description = "Where to write the prediction; - writes to standard output.", Required = true };
        var correlations = CommonOptions.Correlations();
        var seed = CommonOptions.Seed();
        var command = new Command("predict", "Forecast penetration and pressure drop of a medium from its structure.") { media, json, correlations, seed };
        command.SetAction((parsed, cancellation) => FiberScopeProgram.GuardAsync(
            console,
            token =>
            {
                var standard = new ForecastSettings { Seed = parsed.GetValue(seed) };
                Run(console, parsed.GetRequiredValue(media), parsed.GetRequiredValue(json), CommonOptions.Chosen(parsed, correlations), standard, token);
                return ExitCode.Done;
            },
            cancellation));
        return command;
    }

    private static void Run(CommandConsole console, string source, string json, CorrelationSet? correlations, ForecastSettings standard, CancellationToken cancellation)
    {
        var media = source == "-"
            ? MediaFile.Parse(console.ReadInput(), "standard input", Directory.GetCurrentDirectory())
            : MediaFile.Read(source);
        if (json != "-")
        {
            OutputBatch.ProbeFile(json);
        }

        var prediction = Predictor.Predict(media, correlations, standard, cancellation);
        if (json == "-")
        {
            JsonDocuments.Prediction(prediction, console.Output);
            console.Output.Flush();
            return;
        }

        using var batch = new OutputBatch();
        batch.Add(json, stream => JsonDocuments.Prediction(prediction, stream));
        batch.Publish();
        PredictionSummary.Print(console.Out, prediction);
        foreach (var caveat in prediction.Forecast.Caveats)
        {
            console.Error.WriteLine(caveat.Message);
        }
    }
}
