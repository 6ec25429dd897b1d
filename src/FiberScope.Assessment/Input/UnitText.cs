using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>Reads single quantities that people type outside files.</summary>
public static class UnitText
{
    /// <summary>Reads a length above zero, such as <c>24.8 nm</c>, with its uncertainty where given.</summary>
    /// <param name="text">What was typed.</param>
    /// <param name="length">The length; null when it could not be read.</param>
    /// <returns>Null when it was read; else what is wrong and how to mend it.</returns>
    public static string? TryLength(string text, out Stated<Length>? length)
    {
        var complaint = QuantityText.Read(text, Kinds.Length, out length);
        if (complaint is null && length!.Value.Meters <= 0)
        {
            complaint = $"'{text}' must be above zero, such as {Kinds.Length.Example}";
            length = null;
        }

        return complaint;
    }
}
