using FiberScope.Assessment.Input;
using UnitsNet;

namespace FiberScope.Cli.Commands;

/// <summary>Reads option values that carry a unit.</summary>
internal static class OptionValue
{
    /// <summary>A length above zero.</summary>
    /// <exception cref="InputException">It is none.</exception>
    public static Stated<Length> Length(string option, string text) =>
        UnitText.TryLength(text, out var stated) is { } complaint ? throw new InputException($"{option}: {complaint}") : stated!;
}
