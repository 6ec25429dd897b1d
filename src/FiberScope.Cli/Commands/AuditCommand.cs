using System.CommandLine;
using FiberScope.Assessment.Auditing;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Json;
using FiberScope.Assessment.Measuring;
using FiberScope.Cli.Console;
using FiberScope.Cli.Output;
using FiberScope.Imaging;
using FiberScope.Reports;

namespace FiberScope.Cli.Commands;

/// <summary><c>audit draw</c> and <c>audit compare</c>: the machine's readings against a person's eye.</summary>
internal static class AuditCommand
{
    private const int Standard = 60;

    public static Command Build(CommandConsole console) => new("audit", "Check the machine's readings against a person's eye.")
    {
        Draw(console), Compare(console),
    };

    private static Command Draw(CommandConsole console)
    {
        var source = new Argument<string>("readings") { Description = "assessment.json, or what measure --json wrote." };
        var count = new Option<int>("--count") { Description = "How many readings to draw.", DefaultValueFactory = _ => Standard };
        var seed = new Option<int>("--seed") { Description = "Seed of the draw; the same seed draws the same readings.", DefaultValueFactory = _ => new MeasuringSettings().Seed };
        var images = new Option<string>("--images") { Description = "The folder that the images' names start from. Default: where the file and its swatch file lie." };
        var output = new Option<string>("--out") { Description = "Folder for the crops and the table to fill in; a new one.", Required = true };
        var command = new Command("draw", "Draw readings at random and cut marked crops for a person to measure blind.") { source, count, seed, images, output };
        command.SetAction((parsed, cancellation) => FiberScopeProgram.GuardAsync(
            console,
            token =>
            {
                var wanted = parsed.GetValue(count);
                if (wanted < AuditSample.Fewest)
                {
                    throw new InputException(FormattableString.Invariant($"--count: {wanted} is too few; draw at least {AuditSample.Fewest}, better 60"));
                }

                Write(console, AuditSource.Read(parsed.GetRequiredValue(source)), parsed.GetValue(images), wanted, parsed.GetValue(seed), parsed.GetRequiredValue(output), token);
                return ExitCode.Done;
            },
            cancellation));
        return command;
    }

    private static void Write(CommandConsole console, AuditSource source, string? images, int count, int seed, string folder, CancellationToken cancellation)
    {
        if (File.Exists(Path.Combine(folder, AuditSheet.FileName)) || File.Exists(Path.Combine(folder, AuditKey.FileName)))
        {
            throw new InputException($"{folder}: holds an audit already; choose another --out, so that no one's numbers are lost");
        }

        OutputBatch.Probe(folder);
        NativeImaging.Check();
        var draw = new AuditDraw(source, images);
        var key = draw.Draw(count, seed);
        using var batch = new OutputBatch();
        foreach (var crop in key.Crops)
        {
            cancellation.ThrowIfCancellationRequested();
            batch.Add(Path.Combine(folder, crop.Name), stream => draw.Write(crop, stream));
        }

        batch.Add(Path.Combine(folder, AuditSheet.FileName), stream => AuditSheet.Write(key, stream));
        batch.Add(Path.Combine(folder, AuditKey.FileName), stream => JsonDocuments.AuditKey(key, stream));
        batch.Publish();
        console.Out.WriteLine(FormattableString.Invariant($"{key.Crops.Length} of {source.Readings.Length} readings drawn into {folder}."));
        console.Out.WriteLine("In each crop measure the fibre in the middle of the ring, from edge to edge along the line between the two strokes.");
        console.Out.WriteLine($"Fill in {AuditSheet.FileName}: diameter_px in pixels of the crop, or diameter_um; leave empty what cannot be measured.");
        console.Out.WriteLine($"Keep {AuditKey.FileName} from whoever measures: it holds the machine's numbers. Then: fiberscope audit compare {Path.Combine(folder, AuditSheet.FileName)}");
    }

    private static Command Compare(CommandConsole console)
    {
        var sheet = new Argument<string>("table") { Description = $"The filled {AuditSheet.FileName}, in the folder that draw made." };
        var output = new Option<string>("--out") { Description = "Folder for audit.json and audit.html. Default: the table's." };
        var json = new Option<string>("--json") { Description = "Where else to write the JSON; - writes to standard output and nothing else." };
        var command = new Command("compare", "Compare a person's diameters with the machine's: bias, limits of agreement, regression.") { sheet, output, json };
        command.SetAction((parsed, cancellation) => FiberScopeProgram.GuardAsync(
            console,
            token =>
            {
                Compared(console, parsed.GetRequiredValue(sheet), parsed.GetValue(output), parsed.GetValue(json), token);
                return ExitCode.Done;
            },
            cancellation));
        return command;
    }

    private static void Compared(CommandConsole console, string sheet, string? wanted, string? json, CancellationToken cancellation)
    {
        var finding = AuditComparison.Of(sheet);
        if (json == "-")
        {
            JsonDocuments.Audit(finding, console.Output);
            console.Output.Flush();
            return;
        }

        var crops = Path.GetDirectoryName(Path.GetFullPath(sheet))!;
        var folder = wanted ?? crops;
        OutputBatch.Probe(folder);
        using var batch = new OutputBatch();
        batch.Add(Path.Combine(folder, "audit.json"), stream => JsonDocuments.Audit(finding, stream));
        batch.Add(Path.Combine(folder, AuditReport.FileName), stream => AuditReport.Write(finding, crops, stream));
        if (json is not null)
        {
            OutputBatch.ProbeFile(json);
            batch.Add(json, stream => JsonDocuments.Audit(finding, stream));
        }

        cancellation.ThrowIfCancellationRequested();
        batch.Publish();
        AuditSummary.Print(console.Out, finding);
        console.Out.WriteLine($"Written to {folder}: audit.json, {AuditReport.FileName}");
    }
}
