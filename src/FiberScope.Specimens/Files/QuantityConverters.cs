using System.Globalization;
using System.Text.Json;
using System.Text.Json.Serialization;
using UnitsNet;

namespace FiberScope.Specimens.Files;

/// <summary>Quantities as text with their unit: the number that was given, in the unit that it was given in.</summary>
internal static class QuantityConverters
{
    public static JsonConverter Length { get; } = new Converter<Length>(
        q => Text(q.Value, UnitsNet.Length.GetAbbreviation(q.Unit, CultureInfo.InvariantCulture)), s => UnitsNet.Length.Parse(s, CultureInfo.InvariantCulture));

    public static JsonConverter Angle { get; } = new Converter<Angle>(
        q => Text(q.Value, UnitsNet.Angle.GetAbbreviation(q.Unit, CultureInfo.InvariantCulture)), s => UnitsNet.Angle.Parse(s, CultureInfo.InvariantCulture));

    public static JsonConverter Density { get; } = new Converter<Density>(
        q => Text(q.Value, UnitsNet.Density.GetAbbreviation(q.Unit, CultureInfo.InvariantCulture)), s => UnitsNet.Density.Parse(s, CultureInfo.InvariantCulture));

    private static string Text(double value, string unit) => string.Create(CultureInfo.InvariantCulture, $"{value:R} {unit}");

    private sealed class Converter<T>(Func<T, string> write, Func<string, T> parse) : JsonConverter<T>
    {
        public override T Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options)
        {
            var text = reader.TokenType == JsonTokenType.String ? reader.GetString()! : throw new JsonException("a quantity is text with its unit, such as \"24.8 nm\".");
            try
            {
                return parse(Spelled(text));
            }
            catch (Exception problem) when (problem is FormatException or UnitsNetException)
            {
                throw new JsonException($"'{text}' is no {typeof(T).Name.ToLowerInvariant()} with its unit.", problem);
            }
        }

        public override void Write(Utf8JsonWriter writer, T value, JsonSerializerOptions options) => writer.WriteStringValue(write(value));

        // The spellings that people type.
        private static string Spelled(string text) => text.Replace("um", "µm", StringComparison.Ordinal)
            .Replace("μ", "µ", StringComparison.Ordinal).Replace("g/cm3", "g/cm³", StringComparison.Ordinal).Replace("deg", "°", StringComparison.Ordinal);
    }
}
