using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace FiberScope.Specimens.Files;

/// <summary>Reads and writes recipes as JSON: keys in snake_case, quantities with their units written out (<c>"24.8 nm"</c>).</summary>
public static class RecipeFile
{
    private static readonly JsonSerializerOptions Options = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        UnmappedMemberHandling = JsonUnmappedMemberHandling.Disallow,
        WriteIndented = true,
        IgnoreReadOnlyProperties = true,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        ReadCommentHandling = JsonCommentHandling.Skip,
        AllowTrailingCommas = true,
        Converters =
        {
            new JsonStringEnumConverter(JsonNamingPolicy.KebabCaseLower, allowIntegerValues: false),
            QuantityConverters.Length, QuantityConverters.Angle, QuantityConverters.Density,
        },
    };

    /// <summary>The recipe as JSON text; reading it back gives an equal recipe.</summary>
    public static string Write(SpecimenRecipe recipe) => JsonSerializer.Serialize(recipe, Options).ReplaceLineEndings("\n") + "\n";

    /// <summary>Reads a recipe.</summary>
    /// <param name="json">The text; comments and trailing commas are allowed, unknown keys are not.</param>
    /// <exception cref="FormatException">The text is no recipe; the message says in one line what is wrong and where.</exception>
    public static SpecimenRecipe Read(string json)
    {
        try
        {
            return JsonSerializer.Deserialize<SpecimenRecipe>(json, Options) ?? throw new FormatException("The recipe is empty.");
        }
        catch (JsonException problem)
        {
            var line = problem.LineNumber is { } number ? FormattableString.Invariant($"line {number + 1}: ") : string.Empty;
            throw new FormatException($"{line}{problem.Message.ReplaceLineEndings(" ")}", problem);
        }
        catch (ArgumentException problem)
        {
            throw new FormatException(problem.Message.ReplaceLineEndings(" "), problem);
        }
    }

    internal static void WriteInto(Utf8JsonWriter writer, SpecimenRecipe recipe) => JsonSerializer.Serialize(writer, recipe, Options);
}
