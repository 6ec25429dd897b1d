using FiberScope.Assessment;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>Everything needed to repeat the result.</summary>
internal sealed class RecordSection : IReportSection
{
    /// <inheritdoc/>
    public string Anchor => "record";

    /// <inheritdoc/>
    public string Heading => "Record";

    /// <inheritdoc/>
    public Markup Render(SwatchAssessment assessment)
    {
        var recipe = assessment.Recipe;
        var files = new Table("text", "file", "SHA-256");
        foreach (var (name, hash) in recipe.FileHashes)
        {
            files.Row("", [Markup.Of($"{name}"), Markup.Of($"<code>{hash}</code>")]);
        }

        var images = new Table("text", "image", "pixel size", "scale from", "measured by", "SHA-256");
        foreach (var image in recipe.Images)
        {
            images.Row(
                "",
                [
                    Markup.Of($"{image.Name}"),
                    Markup.Of($"{Wording.Told(image.PixelSize.Nanometers, 5)} nm"),
                    Markup.Of($"{image.PixelSizeOrigin}"),
                    Markup.Of($"{image.Algorithm}"),
                    Markup.Of($"<code>{image.Sha256}</code>"),
                ]);
        }

        return Markup.Of(
            $"""
            <p>With these inputs, settings, files and this version, the same numbers come out again. Made {Wording.Of(recipe.MadeAt)} by {recipe.Software} from {recipe.SwatchFile}.</p>
            <h3>Inputs</h3>{Entries(recipe.Inputs)}
            <h3>Settings</h3>{Entries(recipe.Settings)}
            <h3>Files</h3>{files.Finish()}
            <h3>Images</h3>{images.Finish()}
            """);
    }

    private static Markup Entries(IEnumerable<RecipeEntry> entries)
    {
        var table = new Table("text", "name", "value", "from");
        foreach (var entry in entries)
        {
            table.Row(entry.Name, entry.Value, entry.Origin);
        }

        return table.Finish();
    }
}
