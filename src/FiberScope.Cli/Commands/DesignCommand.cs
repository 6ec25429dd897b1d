using System.CommandLine;
using FiberScope.Assessment.Designing;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Json;
using FiberScope.Assessment.Predicting;
using FiberScope.Cli.Console;
using FiberScope.Cli.Output;
using FiberScope.Filtration;
using FiberScope.Reports;

namespace FiberScope.Cli.Commands;

/// <summary><c>design DESIGN.yaml</c>: which structures reach given targets.</summary>
internal static class DesignCommand
{
    public static Command Build(CommandConsole console)
    {
        var file = new Argument<string>("design") { Description = "The design file (YAML); - reads it from standard input." };
        var output = new Option<string>("--out") { Description = "Folder for design.json and design.html. Default: NAME-design beside the design file, unless --json alone is given." };
        var json = new Option<string>("--json") { Description = "Where else to write the JSON; - writes to standard output." };
        var correlations = CommonOptions.Correlations();
        var seed = CommonOptions.Seed();
        var command = new Command("design", "Find the structures that reach given targets of penetration, pressure drop, weight and thickness.") { file, output, json, correlations, seed };
        command.SetAction((parsed, cancellation) => FiberScopeProgram.GuardAsync(
            console,
            token =>
            {
                var run = new Run(console, parsed.GetRequiredValue(file), parsed.GetValue(output), parsed.GetValue(json));
                run.Do(CommonOptions.Chosen(parsed, correlations), new ForecastSettings { Seed = parsed.GetValue(seed) }, token);
                return ExitCode.Done;
            },
            cancellation));
        return command;
    }

    private sealed class Run(CommandConsole console, string source, string? wanted, string? json)
    {
        public void Do(CorrelationSet? correlations, ForecastSettings standard, CancellationToken cancellation)
        {
            var design = source == "-"
                ? DesignFile.Parse(console.ReadInput(), "standard input", Directory.GetCurrentDirectory())
                : DesignFile.Read(source);
            var folder = wanted ?? (json is null ? DefaultFolder() : null);
            Probe(folder);
            var settings = Predictor.Settings(design.Start.Request, correlations ?? design.Start.Correlations, standard);
            var finding = Designer.Run(design, settings, cancellation);
            Write(finding, folder, cancellation);
        }

        private string DefaultFolder() => source == "-"
            ? "design"
            : Path.Combine(Path.GetDirectoryName(Path.GetFullPath(source))!, Path.GetFileNameWithoutExtension(source) + "-design");

        private void Probe(string? folder)
        {
            if (folder is not null)
            {
                OutputBatch.Probe(folder);
            }

            if (json is not null and not "-")
            {
                OutputBatch.ProbeFile(json);
            }
        }

        private void Write(DesignFinding finding, string? folder, CancellationToken cancellation)
        {
            using var batch = new OutputBatch();
            if (folder is not null)
            {
                batch.Add(Path.Combine(folder, "design.json"), stream => JsonDocuments.Design(finding, stream));
                batch.Add(Path.Combine(folder, DesignReport.FileName), stream => DesignReport.Write(finding, stream));
            }

            if (json is not null and not "-")
            {
                batch.Add(json, stream => JsonDocuments.Design(finding, stream));
            }

            cancellation.ThrowIfCancellationRequested();
            batch.Publish();
            if (json == "-")
            {
                JsonDocuments.Design(finding, console.Output);
                console.Output.Flush();
                return;
            }

            DesignSummary.Print(console.Out, finding);
            if (folder is not null)
            {
                console.Out.WriteLine($"Written to {folder}: design.json, {DesignReport.FileName}");
            }
        }
    }
}
