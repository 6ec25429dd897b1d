using System.CommandLine;
using System.Diagnostics;
using FiberScope.Validation.Filtration.Measured;
using FiberScope.Validation.Filtration.Sections;

namespace FiberScope.Validation.Filtration;

/// <summary>The subcommand <c>filtration</c>: the filtration model against a numerical solution and measured media.</summary>
internal static class FiltrationCommand
{
    /// <summary>Makes the subcommand.</summary>
    public static Command Create()
    {
        var command = new Command("filtration", "Compare the filtration model with the numerical cell solution and with measured media.");
        var tabulate = new Option<bool>("--tabulate") { Description = "Solve the cell anew and rewrite the tables of the set 'cell' (minutes)." };
        var media = new Option<bool>("--media") { Description = "Only compare with the measured media, and print instead of writing." };
        command.Add(tabulate);
        command.Add(media);
        command.SetAction(parsed =>
        {
            if (parsed.GetValue(tabulate))
            {
                CellTabulator.Write(Console.Out);
            }
            else if (parsed.GetValue(media))
            {
                var text = new MarkdownText();
                Media(text);
                Console.Out.WriteLine(text.ToString());
            }
            else
            {
                Report(Console.Out);
            }

            return 0;
        });
        return command;
    }

    private static void Media(MarkdownText text)
    {
        var stacks = MeasuredStack.ReadAll();
        UnfittedSection.Write(text, stacks);
        StackSection.Write(text, stacks);
        ChargeSection.Write(text, stacks);
        DefaultSection.Write(text);
    }

    private static void Report(TextWriter log)
    {
        var clock = Stopwatch.StartNew();
        var text = new MarkdownText();
        text.Heading(2, "Filtration").Paragraph($"Written by `dotnet run --project tests/FiberScope.Validation -c Release -- filtration`.");
        void Run(string name, Action section)
        {
            section();
            log.WriteLine(FormattableString.Invariant($"{clock.Elapsed.TotalSeconds,6:F0} s  {name}"));
        }

        Run("reference", () => ReferenceSection.Write(text));
        Run("cell set", () => CellSetSection.Write(text));
        var grid = ReferenceGrid.Solve();
        Run("closed forms", () => ClosedFormSection.Write(text, grid));
        Run("correlation sets", () => SetSection.Write(text, grid));
        Run("measured media", () => Media(text));
        MarkedSection.Write(Repository.Locate("docs", "validation.md"), "filtration", text.ToString(), "Validation");
    }
}
