using System.Security.Cryptography;
using System.Text.Json;
using FiberScope.Specimens.Files;

namespace FiberScope.Specimens.Tests;

public sealed class SampleImagesTests
{
    public static TheoryData<string> Rolls => ["fine-melt-blown", "coarse-melt-blown", "two-layer"];

    [Theory]
    [MemberData(nameof(Rolls))]
    public void Every_sample_picture_is_the_one_that_the_manifest_lists(string roll)
    {
        foreach (var image in Images(roll))
        {
            var bytes = File.ReadAllBytes(Path.Combine(Folder(roll), image.GetProperty("file").GetString()!));
            Assert.Equal(image.GetProperty("sha256").GetString(), Hash(bytes));
        }
    }

    [Theory]
    [MemberData(nameof(Rolls))]
    public void Every_sample_recipe_reads_and_has_the_pixel_size_that_the_swatch_file_gives(string roll)
    {
        var swatch = File.ReadAllText(Path.Combine(Folder(roll), "swatch.yaml"));
        foreach (var image in Images(roll))
        {
            var recipe = RecipeFile.Read(File.ReadAllText(Path.Combine(Folder(roll), image.GetProperty("recipe").GetString()!)));
            Assert.Equal(recipe.PixelSize.Micrometers, image.GetProperty("pixel_size_um").GetDouble(), 1e-9);
            Assert.Contains(FormattableString.Invariant($"pixel_size: {recipe.PixelSize.Nanometers:0.###} nm"), swatch, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void A_sample_picture_comes_out_of_its_recipe_and_seed_again()
    {
        // One picture here; the validation program's 'samples' compares them all.
        var image = Images("two-layer").Last();
        var recipe = RecipeFile.Read(File.ReadAllText(Path.Combine(Folder("two-layer"), image.GetProperty("recipe").GetString()!)));
        var specimen = VirtualSpecimen.Make(recipe, image.GetProperty("seed").GetUInt64(), TestContext.Current.CancellationToken);
        Assert.Equal(image.GetProperty("pixels_sha256").GetString(), Hash(specimen.Pixels));
    }

    private static IEnumerable<JsonElement> Images(string roll)
    {
        using var manifest = JsonDocument.Parse(File.ReadAllText(Path.Combine(Folder(roll), "manifest.json")));
        return [.. manifest.RootElement.GetProperty("images").EnumerateArray().Select(i => i.Clone())];
    }

    private static string Folder(string roll)
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (!File.Exists(Path.Combine(folder!.FullName, "FiberScope.sln")))
        {
            folder = folder.Parent;
        }

        return Path.Combine(folder.FullName, "sample-images", roll);
    }

    private static string Hash(ReadOnlySpan<byte> bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));
}
