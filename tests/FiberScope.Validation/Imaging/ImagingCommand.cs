using System.CommandLine;
using FiberScope.Specimens;

namespace FiberScope.Validation.Imaging;

/// <summary>The subcommand <c>imaging</c>: measured virtual specimens against their truth.</summary>
internal static class ImagingCommand
{
    public static Command Create()
    {
        var family = new Option<string[]>("--family") { Description = "Families to run, all when left out: " + string.Join(", ", SpecimenFamilies.All.Select(r => r.Name)), AllowMultipleArgumentsPerToken = true };
        family.AcceptOnlyFromAmong([.. SpecimenFamilies.All.Select(r => r.Name)]);
        var seeds = new Option<string>("--seeds") { Description = "dev: fields for tuning; report: fields for reporting.", DefaultValueFactory = _ => "dev" };
        seeds.AcceptOnlyFromAmong("dev", "report");
        var fields = new Option<int>("--fields") { Description = "Fields of each family.", DefaultValueFactory = _ => 6 };
        var quick = new Option<bool>("--quick") { Description = "Measure the quick way (threshold, skeleton, distance map)." };
        var brief = new Option<bool>("--brief") { Description = "One line for each family." };
        var pictures = new Option<string?>("--pictures") { Description = "Folder for pictures with every reading drawn in the colour of its error." };
        var command = new Command("imaging", "Measure virtual specimens and compare every reading with the fibre that it lies on.") { family, seeds, fields, quick, brief, pictures };
        command.SetAction(parsed =>
        {
            var names = parsed.GetValue(family) ?? [];
            foreach (var recipe in SpecimenFamilies.All.Where(r => names.Length == 0 || names.Contains(r.Name, StringComparer.Ordinal)))
            {
                var check = FamilyRun.Of(recipe, parsed.GetValue(seeds) == "report", parsed.GetValue(fields), parsed.GetValue(quick));
                Console.WriteLine(parsed.GetValue(brief) ? Diagnosis.Line(check) : Diagnosis.Of(check));
                SavePictures(check, parsed.GetValue(pictures));
            }

            return 0;
        });
        return command;
    }

    private static void SavePictures(FamilyCheck check, string? folder)
    {
        if (folder is null)
        {
            return;
        }

        Directory.CreateDirectory(folder);
        foreach (var (field, i) in check.Fields.Select((f, i) => (f, i)))
        {
            ErrorPicture.Save(field, Path.Combine(folder, FormattableString.Invariant($"{check.Family.Name}-{i}.png")));
        }
    }
}
