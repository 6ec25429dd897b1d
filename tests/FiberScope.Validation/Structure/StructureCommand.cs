using System.CommandLine;
using FiberScope.Specimens;
using FiberScope.Validation.Imaging;

namespace FiberScope.Validation.Structure;

/// <summary>The subcommand <c>structure</c>: what else a mat shows besides diameters, against the truth of virtual specimens.</summary>
internal static class StructureCommand
{
    public static Command Create()
    {
        var seeds = new Option<string>("--seeds") { Description = "dev: fields for tuning; report: fields for reporting.", DefaultValueFactory = _ => "dev" };
        seeds.AcceptOnlyFromAmong("dev", "report");
        var family = new Option<string>("--family") { Description = "The family.", DefaultValueFactory = _ => "cross-sections" };
        var swatches = new Option<int>("--swatches") { Description = "Swatches.", DefaultValueFactory = _ => 4 };
        var fields = new Option<int>("--fields") { Description = "Fields of each.", DefaultValueFactory = _ => 3 };
        var orientation = new Option<bool>("--orientation") { Description = "Instead of solidity: the orientation of the fibres." };
        var command = new Command("structure", "Measure solidity by images, or orientation, on virtual specimens.") { seeds, family, swatches, fields, orientation };
        command.SetAction(parsed =>
        {
            var reporting = parsed.GetValue(seeds) == "report";
            var recipe = SpecimenFamilies.Find(parsed.GetValue(family)!) ?? throw new ArgumentException("No such family.", nameof(parsed));
            if (parsed.GetValue(orientation))
            {
                var turned = OrientationCheck.Of(recipe, reporting, parsed.GetValue(fields));
                Console.WriteLine(FormattableString.Invariant($"{turned.Family}: direction true {turned.TrueDirection:0.0} read {turned.ReadDirection:0.0}, order true {turned.TrueOrder:0.000} read {turned.ReadOrder:0.000}"));
                FigureStore.Save($"{(reporting ? "report" : "dev")}-{recipe.Name}-orientation", turned);
                return 0;
            }

            SolidityFigures[] rows = [.. SolidityCheck.Of(recipe, reporting, parsed.GetValue(swatches), parsed.GetValue(fields))];
            foreach (var row in rows)
            {
                Console.WriteLine(FormattableString.Invariant($"{row.Family}: solidity true {row.True:0.0000} read {row.Read:0.0000} ({row.RelativeError:+0.0 %;-0.0 %}), {row.Low:0.0000} to {row.High:0.0000}, holds {row.Holds}; share true {row.TrueShare:0.000} read {row.ReadShare:0.000}"));
            }

            FigureStore.Save($"{(reporting ? "report" : "dev")}-{recipe.Name}-solidity", rows);
            return 0;
        });
        return command;
    }
}
