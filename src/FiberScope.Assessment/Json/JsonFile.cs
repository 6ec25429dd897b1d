using System.Text.Json;
using FiberScope.Assessment.Input;

namespace FiberScope.Assessment.Json;

/// <summary>Reads the program's own JSON files back.</summary>
internal static class JsonFile
{
    /// <summary>Opens a file and takes from it what is wanted.</summary>
    /// <param name="path">The file.</param>
    /// <param name="wanted">What it should be, for the complaint: <c>a measurement file of schema …</c>.</param>
    /// <param name="use">Takes the root.</param>
    /// <exception cref="InputException">The file is missing, or is not what is wanted.</exception>
    public static T Read<T>(string path, string wanted, Func<JsonElement, T> use)
    {
        try
        {
            using var stream = File.OpenRead(path);
            using var document = JsonDocument.Parse(stream);
            return use(document.RootElement);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new InputException($"{path}: {(File.Exists(path) ? "cannot be read" : "no such file")}", e);
        }
        catch (Exception e) when (e is JsonException or KeyNotFoundException or InvalidOperationException or FormatException or ArgumentException)
        {
            throw new InputException($"{path}: is not {wanted}", e);
        }
    }
}
