using System.CommandLine;
using System.Text;
using FiberScope.Assessment.Input;
using FiberScope.Cli.Console;
using FiberScope.Cli.Output;
using FiberScope.Specimens;
using FiberScope.Specimens.Files;

namespace FiberScope.Cli.Commands;

/// <summary><c>specimen RECIPE</c>: makes virtual specimens with known truth.</summary>
internal static class SpecimenCommand
{
    private const int MostFields = 1000;

    private static readonly Dictionary<string, (SpecimenFormat Format, string Extension)> Formats = new(StringComparer.Ordinal)
    {
        ["png"] = (SpecimenFormat.Png, "png"),
        ["tiff"] = (SpecimenFormat.Tiff, "tif"),
        ["jpeg"] = (SpecimenFormat.Jpeg, "jpg"),
    };

    public static Command Build(CommandConsole console)
    {
        var recipe = new Argument<string>("recipe") { Description = $"A recipe file (JSON), - for one on standard input, or a family: {string.Join(", ", SpecimenFamilies.All.Select(r => r.Name))}." };
        var seed = new Option<ulong>("--seed") { Description = "Seed of the first field; the others count on from it. The same seed gives the same bytes.", DefaultValueFactory = _ => 1 };
        var fields = new Option<int>("--fields") { Description = "How many fields to make.", DefaultValueFactory = _ => 1 };
        fields.Validators.Add(result =>
        {
            if (result.GetValueOrDefault<int>() is < 1 or > MostFields)
            {
                result.AddError(FormattableString.Invariant($"--fields must lie from 1 to {MostFields}."));
            }
        });
        var output = new Option<string>("--out") { Description = "Folder for the pictures, their truth and the recipe.", Required = true };
        var format = new Option<string>("--format") { Description = "File format of the pictures.", DefaultValueFactory = _ => "png" }.AcceptOnlyFromAmong([.. Formats.Keys]);
        var summary = new Option<bool>("--figures-only") { Description = "Write only the figures of the truth, not every visible stretch of every fibre." };
        var command = new Command("specimen", "Make virtual specimens: micrographs of invented mats, with the truth about them.") { recipe, seed, fields, output, format, summary };
        command.SetAction((parsed, cancellation) => FiberScopeProgram.GuardAsync(
            console,
            token =>
            {
                var order = new Order(
                    Recipe(console, parsed.GetRequiredValue(recipe)),
                    parsed.GetValue(seed),
                    parsed.GetValue(fields),
                    parsed.GetRequiredValue(output),
                    parsed.GetRequiredValue(format),
                    !parsed.GetValue(summary));
                Run(console, order, token);
                return ExitCode.Done;
            },
            cancellation));
        return command;
    }

    private static SpecimenRecipe Recipe(CommandConsole console, string source)
    {
        if (SpecimenFamilies.Find(source) is { } family)
        {
            return family;
        }

        try
        {
            return RecipeFile.Read(source == "-" ? console.ReadInput() : File.ReadAllText(source));
        }
        catch (FormatException e)
        {
            throw new InputException($"{source}: {e.Message}", e);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new InputException($"'{source}' is neither a recipe file nor a family; families: {string.Join(", ", SpecimenFamilies.All.Select(r => r.Name))}", e);
        }
    }

    private static void Run(CommandConsole console, Order order, CancellationToken cancellation)
    {
        OutputBatch.Probe(order.Folder);
        using var batch = new OutputBatch();
        ProgressDisplay.Run(console, "making specimens", progress =>
        {
            for (var i = 0; i < order.Fields; i++)
            {
                Field(batch, order, i, cancellation);
                progress?.Report(new(i + 1, order.Fields, FormattableString.Invariant($"made field {i + 1}")));
            }

            return order.Fields;
        });
        batch.Add(Path.Combine(order.Folder, "recipe.json"), stream => stream.Write(Encoding.UTF8.GetBytes(RecipeFile.Write(order.Recipe))));
        cancellation.ThrowIfCancellationRequested();
        batch.Publish();
        console.Out.WriteLine(FormattableString.Invariant($"Written to {order.Folder}: {order.Fields} field(s) of {order.Recipe.Name} with their truth, and recipe.json."));
    }

    private static void Field(OutputBatch batch, Order order, int index, CancellationToken cancellation)
    {
        Specimen specimen;
        try
        {
            specimen = VirtualSpecimen.Make(order.Recipe, order.Seed + (ulong)index, cancellation);
        }
        catch (ArgumentException e)
        {
            throw new InputException($"{order.Recipe.Name}: {e.Message.ReplaceLineEndings(" ")}", e);
        }

        var (format, extension) = Formats[order.Format];
        var name = Path.Combine(order.Folder, FormattableString.Invariant($"field-{index + 1:00}"));
        batch.Add($"{name}.{extension}", stream => SpecimenWriter.WritePicture(specimen, stream, format));
        batch.Add($"{name}.truth.json", stream => TruthFile.Write(specimen, stream, order.WithFibres));
    }

    private sealed record Order(SpecimenRecipe Recipe, ulong Seed, int Fields, string Folder, string Format, bool WithFibres);
}
