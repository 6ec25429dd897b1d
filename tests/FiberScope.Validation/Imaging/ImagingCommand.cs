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
        var coverage = new Option<int>("--coverage") { Description = "Instead: count over so many small swatches how often the 95 % interval holds the mean." };
        var invariance = new Option<int>("--invariance") { Description = "Instead: turn, flip, brighten and enlarge so many pictures of each kind and measure them again." };
        var write = new Option<bool>("--write") { Description = "Instead: write the section of docs/validation.md from what runs with --seeds report have found." };
        var command = new Command("imaging", "Measure virtual specimens and compare every reading with the fibre that it lies on.") { family, seeds, fields, quick, brief, pictures, coverage, invariance, write };
        command.SetAction(parsed =>
        {
            var reporting = parsed.GetValue(seeds) == "report";
            if (parsed.GetValue(write))
            {
                ImagingSection.Write();
            }
            else if (parsed.GetValue(coverage) > 0)
            {
                Coverage(parsed.GetValue(coverage), reporting);
            }
            else if (parsed.GetValue(invariance) > 0)
            {
                Invariance(parsed.GetValue(invariance));
            }
            else
            {
                Families(parsed.GetValue(family) ?? [], reporting, parsed.GetValue(fields), parsed.GetValue(quick), parsed.GetValue(brief), parsed.GetValue(pictures));
            }

            return 0;
        });
        return command;
    }

    private static void Families(string[] names, bool reporting, int fields, bool quick, bool brief, string? pictures)
    {
        foreach (var recipe in SpecimenFamilies.All.Where(r => names.Length == 0 || names.Contains(r.Name, StringComparer.Ordinal)))
        {
            var check = FamilyRun.Of(recipe, reporting, fields, quick);
            Console.WriteLine(brief ? Diagnosis.Line(check) : Diagnosis.Of(check));
            var method = quick ? "quick" : "product";
            FigureStore.Save($"{(reporting ? "report" : "dev")}-{recipe.Name}-{method}", FamilyFigures.Of(check, method, reporting));
            if (!quick)
            {
                Defects(check, reporting, brief);
            }

            SavePictures(check, pictures);
        }
    }

    private static void Defects(FamilyCheck check, bool reporting, bool brief)
    {
        var defects = DefectCheck.Of(check);
        FigureStore.Save($"{(reporting ? "report" : "dev")}-{check.Family.Name}-defects", defects);
        foreach (var row in defects.Where(d => !brief && (d.TrueShare > 0 || d.ReadShare > 0)))
        {
            Console.WriteLine(FormattableString.Invariant($"  {row.Kind}: area share true {row.TrueShare:0.00 %} flagged {row.ReadShare:0.00 %}, {row.Found:0 %} of {row.TrueCount} found, {row.ReadingsOn} readings on it"));
        }
    }

    private static void Coverage(int swatches, bool reporting)
    {
        var found = CoverageRun.Run(swatches, 2, reporting);
        FigureStore.Save("coverage", found);
        Console.WriteLine(found);
    }

    private static void Invariance(int pictures)
    {
        InvarianceFigures[] found = [.. InvarianceRun.Virtual(pictures), .. InvarianceRun.Real(2 * pictures)];
        FigureStore.Save("invariance", found);
        foreach (var figures in found)
        {
            Console.WriteLine(figures);
        }
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
