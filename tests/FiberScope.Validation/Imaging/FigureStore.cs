using System.Text.Json;
using System.Text.Json.Serialization;

namespace FiberScope.Validation.Imaging;

/// <summary>Keeps what runs found between runs, so that the report can be put together from them.</summary>
internal static class FigureStore
{
    private static readonly JsonSerializerOptions Options = new() { WriteIndented = true, NumberHandling = JsonNumberHandling.AllowNamedFloatingPointLiterals };

    private static string Folder => Repository.Locate(".artifacts", "validation-imaging");

    public static void Save<T>(string name, T figures)
    {
        Directory.CreateDirectory(Folder);
        File.WriteAllText(Path.Combine(Folder, name + ".json"), JsonSerializer.Serialize(figures, Options));
    }

    public static T? Load<T>(string name)
        where T : class
    {
        var path = Path.Combine(Folder, name + ".json");
        return File.Exists(path) ? JsonSerializer.Deserialize<T>(File.ReadAllText(path), Options) : null;
    }
}
