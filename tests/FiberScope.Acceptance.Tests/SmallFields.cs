using System.Text.Json.Nodes;

namespace FiberScope.Acceptance.Tests;

/// <summary>A few small pictures of a virtual mat, made once with the program's own <c>specimen</c> command.</summary>
public sealed class SmallFields : IAsyncLifetime
{
    private readonly Workspace _workspace = new();

    public string Folder => _workspace.PathTo("fields");

    /// <summary>The recipe that the pictures are made from.</summary>
    public string Recipe => _workspace.PathTo("small.json");

    public string Field(int number) => _workspace.PathTo("fields", FormattableString.Invariant($"field-{number:00}.png"));

    public async ValueTask InitializeAsync()
    {
        var family = await CommandRun.OfAsync("specimen", "md-oriented", "--out", _workspace.PathTo("family"), "--figures-only");
        Assert.Equal(0, family.Code);
        var recipe = JsonNode.Parse(await File.ReadAllTextAsync(_workspace.PathTo("family", "recipe.json")))!;
        recipe["name"] = "small";
        recipe["width_pixels"] = 512;
        recipe["height_pixels"] = 400;
        var small = await CommandRun.OfAsync("specimen", _workspace.Write("small.json", recipe.ToJsonString()), "--seed", "11", "--fields", "3", "--out", Folder, "--figures-only");
        Assert.Equal(0, small.Code);
    }

    public ValueTask DisposeAsync()
    {
        _workspace.Dispose();
        return ValueTask.CompletedTask;
    }
}
