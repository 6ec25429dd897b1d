using System.CommandLine;

namespace FiberScope.Validation.Samples;

/// <summary>The subcommand <c>samples</c>: makes the sample rolls' pictures again and compares them with what is kept.</summary>
internal static class SamplesCommand
{
    public static Command Create()
    {
        var write = new Option<bool>("--write") { Description = "Write the pictures, truth files and hashes anew instead of comparing." };
        var command = new Command("samples", "Make the pictures of sample-images again from their recipes and compare every byte.") { write };
        command.SetAction(parsed =>
        {
            var wrong = 0;
            foreach (var manifest in Directory.GetFiles(Repository.Locate("sample-images"), "manifest.json", SearchOption.AllDirectories).Order(StringComparer.Ordinal))
            {
                wrong += parsed.GetValue(write) ? SampleRoll.Write(manifest) : SampleRoll.Compare(manifest, Console.Out);
            }

            Console.WriteLine(wrong == 0 ? "Every sample picture is as its recipe makes it." : FormattableString.Invariant($"{wrong} sample pictures differ from their recipes."));
            return wrong == 0 ? 0 : 1;
        });
        return command;
    }
}
