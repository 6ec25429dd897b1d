using System.Text;
using System.Text.Json.Nodes;
using FiberScope.TestKit;
using Json.Schema;

namespace FiberScope.Acceptance.Tests;

/// <summary>The published schemas, and whether a document keeps them.</summary>
internal static class Schema
{
    private static readonly EvaluationOptions Options = new() { OutputFormat = OutputFormat.List };

    private static readonly Dictionary<string, JsonSchema> Published = Load();

    /// <summary>Asserts that a document keeps the schema that it names itself, such as <c>fiberscope/measurement/1</c>.</summary>
    public static JsonNode Kept(ReadOnlySpan<byte> bytes)
    {
        var document = JsonNode.Parse(Encoding.UTF8.GetString(bytes))!;
        var name = document["schema"]!.GetValue<string>();
        Assert.True(Keeps(document, name["fiberscope/".Length..].Replace('/', '-'), out var wrong), wrong);
        return document;
    }

    /// <summary>Whether a document keeps a published schema, and if not, the first few places where it does not.</summary>
    public static bool Keeps(JsonNode document, string name, out string wrong)
    {
        using var element = System.Text.Json.JsonDocument.Parse(document.ToJsonString());
        var result = Published[name].Evaluate(element.RootElement, Options);
        wrong = string.Join('\n', (result.Details ?? []).Where(d => d.Errors is { Count: > 0 }).Select(d => $"{d.InstanceLocation}: {string.Join("; ", d.Errors!.Values)}").Take(5));
        return result.IsValid;
    }

    private static Dictionary<string, JsonSchema> Load()
    {
        var found = new Dictionary<string, JsonSchema>(StringComparer.Ordinal);
        foreach (var name in new[] { "measurement-1", "prediction-1", "assessment-1", "design-1", "calibration-1", "audit-key-1", "audit-1" })
        {
            var schema = JsonSchema.FromText(File.ReadAllText(Repository.PathTo("docs", "schemas", name + ".schema.json")));
            found[name] = schema;
        }

        return found;
    }
}
