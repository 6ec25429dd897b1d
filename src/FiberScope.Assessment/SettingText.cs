using System.Text.Json;
using System.Text.Json.Nodes;
using System.Text.Json.Serialization;

namespace FiberScope.Assessment;

/// <summary>Takes a settings record apart into names and values, the same in every culture.</summary>
internal static class SettingText
{
    private static readonly JsonSerializerOptions Options = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        Converters = { new JsonStringEnumConverter(JsonNamingPolicy.KebabCaseLower) },
    };

    /// <summary>Every setting by its path, and whether it stands at its default.</summary>
    public static IEnumerable<(string Name, string Value, bool IsDefault)> Of<T>(T settings, T standard)
    {
        var usual = Leaves(JsonSerializer.SerializeToNode(standard, Options), "").ToDictionary(l => l.Name, l => l.Value, StringComparer.Ordinal);
        return Leaves(JsonSerializer.SerializeToNode(settings, Options), "").Select(l => (l.Name, l.Value, usual.GetValueOrDefault(l.Name) == l.Value));
    }

    private static IEnumerable<(string Name, string Value)> Leaves(JsonNode? node, string path) => node switch
    {
        JsonObject map => map.SelectMany(pair => Leaves(pair.Value, path.Length == 0 ? pair.Key : $"{path}.{pair.Key}")),
        JsonArray list => list.SelectMany((item, i) => Leaves(item, FormattableString.Invariant($"{path}[{i + 1}]"))),
        JsonValue value => [(path, value.ToString())],
        _ => [(path, "none")],
    };
}
