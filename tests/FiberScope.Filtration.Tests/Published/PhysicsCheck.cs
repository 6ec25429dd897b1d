using System.Text.Json;

namespace FiberScope.Filtration.Tests.Published;

/// <summary>One row of physics-checks.json: what goes in, what must come out, how closely, and who says so.</summary>
public sealed record PhysicsCheck(string Name, JsonElement Inputs, JsonElement Output, double Tolerance, string Source, string Provenance)
{
    private static readonly JsonSerializerOptions Options = new() { PropertyNameCaseInsensitive = true };

    public static IReadOnlyList<PhysicsCheck> All { get; } = Read();

    public double Expected => Output.GetDouble();

    public double this[string input] => Inputs.GetProperty(input).GetDouble();

    public double Or(string input, double otherwise) => Inputs.TryGetProperty(input, out var value) ? value.GetDouble() : otherwise;

    public string Text(string input) => Inputs.GetProperty(input).GetString()!;

    private static PhysicsCheck[] Read()
    {
        using var stream = typeof(PhysicsCheck).Assembly.GetManifestResourceStream("physics-checks.json")!;
        return JsonSerializer.Deserialize<PhysicsCheck[]>(stream, Options)!;
    }
}
