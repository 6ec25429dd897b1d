using System.CommandLine;

namespace FiberScope.Validation.Filtration;

/// <summary>The subcommand <c>filtration</c>: the filtration model against a numerical solution and measured media.</summary>
internal static class FiltrationCommand
{
    /// <summary>Makes the subcommand.</summary>
    public static Command Create()
    {
        var command = new Command("filtration", "Compare the filtration model with the numerical cell solution and with measured media.");
        var tabulate = new Option<bool>("--tabulate") { Description = "Solve the cell anew and rewrite the tables of the set 'cell' (minutes)." };
        command.Add(tabulate);
        command.SetAction(parsed =>
        {
            if (parsed.GetValue(tabulate))
            {
                CellTabulator.Write(Console.Out);
            }

            return 0;
        });
        return command;
    }
}
