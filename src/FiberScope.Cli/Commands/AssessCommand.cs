using System.CommandLine;
using FiberScope.Assessment;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Json;
using FiberScope.Assessment.Measuring;
using FiberScope.Cli.Console;
using FiberScope.Cli.Output;
using FiberScope.Conformity;
using FiberScope.Imaging;
using FiberScope.Reports;

namespace FiberScope.Cli.Commands;

/// <summary><c>assess SWATCH.yaml</c>: the main job.</summary>
internal static class AssessCommand
{
    private static readonly IReadOnlyList<IReportWriter> Reports = [new HtmlReport()];

    public static Command Build(CommandConsole console, TimeProvider clock)
    {
        var swatch = new Argument<string>("swatch") { Description = "The swatch file (YAML); - reads it from standard input." };
        var output = new Option<string>("--out") { Description = "Folder for assessment.json, readings.csv and report.html. Default: NAME-assessment beside the swatch file." };
        var correlations = CommonOptions.Correlations();
        var unfit = CommonOptions.IncludeUnfit();
        var seed = CommonOptions.Seed();
        var telling = new Option<bool>("--fail-on-verdict") { Description = "Tell the verdict by the exit code: 0 pass, 1 fail, 5 undecided." };
        var command = new Command("assess", "Measure the micrographs of a swatch, forecast its filtration and judge it against its grade.")
        {
            swatch, output, correlations, unfit, seed, telling,
        };
        command.SetAction((parsed, cancellation) => FiberScopeProgram.GuardAsync(
            console,
            token =>
            {
                var settings = new AssessmentSettings
                {
                    Correlations = CommonOptions.Chosen(parsed, correlations),
                    Measuring = new MeasuringSettings { IncludeUnfit = parsed.GetValue(unfit), Seed = parsed.GetValue(seed) },
                };
                var run = new Run(console, new Assessor(settings, clock));
                var assessment = run.Assess(parsed.GetRequiredValue(swatch), parsed.GetValue(output), token);
                return parsed.GetValue(telling) ? Code(assessment.Verdict) : ExitCode.Done;
            },
            cancellation));
        return command;
    }

    private static int Code(GradeVerdict? verdict) => verdict?.Decision switch
    {
        Decision.Fail => ExitCode.VerdictFail,
        Decision.Undecided => ExitCode.VerdictUndecided,
        _ => ExitCode.Done,
    };

    private sealed class Run(CommandConsole console, Assessor assessor)
    {
        public SwatchAssessment Assess(string source, string? wanted, CancellationToken cancellation)
        {
            var swatch = source == "-"
                ? SwatchFile.Parse(console.ReadInput(), "standard input", Directory.GetCurrentDirectory())
                : SwatchFile.Read(source);
            var folder = wanted ?? Path.Combine(swatch.Folder, (source == "-" ? "swatch" : Path.GetFileNameWithoutExtension(source)) + "-assessment");
            OutputBatch.Probe(folder);
            NativeImaging.Check();
            var assessment = ProgressDisplay.Run(console, "measuring", progress => assessor.Assess(swatch, progress, cancellation));
            Write(assessment, folder, cancellation);
            AssessmentSummary.Print(CommandConsole.For(console.Out, console.OutIsTerminal), assessment);
            console.Out.WriteLine($"Written to {folder}: assessment.json, readings.csv{string.Concat(Reports.Select(r => ", " + r.FileName))}");
            return assessment;
        }

        private static void Write(SwatchAssessment assessment, string folder, CancellationToken cancellation)
        {
            using var batch = new OutputBatch();
            batch.Add(Path.Combine(folder, "assessment.json"), stream => JsonDocuments.Assessment(assessment, stream));
            batch.Add(Path.Combine(folder, "readings.csv"), stream => ReadingsCsv.Write(assessment.Layers.Select(l => (l.Name, l.Fields.AsEnumerable())), stream));
            foreach (var report in Reports)
            {
                batch.Add(Path.Combine(folder, report.FileName), stream => report.Write(assessment, stream, cancellation));
            }

            cancellation.ThrowIfCancellationRequested();
            batch.Publish();
        }
    }
}
