using System.Globalization;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace FiberScope.Assessment.Json;

/// <summary>How every JSON file is written: snake case, seven significant digits, null for what is not finite.</summary>
internal static class JsonText
{
    private static readonly JsonSerializerOptions Options = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        WriteIndented = true,
        NewLine = "\n",
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        Converters = { new SevenDigits(), new OnOneLine<ReadingEntry>(), new OnOneLine<double[]>(), new OnOneLine<int[][]>(), new OnOneLine<bool[]>() },
    };

    private static readonly JsonSerializerOptions Compact = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        Converters = { new SevenDigits() },
    };

    public static void Write<T>(Stream destination, T document)
    {
        JsonSerializer.Serialize(destination, document, Options);
        destination.Write("\n"u8);
    }

    /// <summary>More digits than any measurement here deserves, and few enough that rounding does not differ between machines.</summary>
    private sealed class SevenDigits : JsonConverter<double>
    {
        public override double Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options) => reader.GetDouble();

        public override void Write(Utf8JsonWriter writer, double value, JsonSerializerOptions options)
        {
            if (double.IsFinite(value))
            {
                writer.WriteRawValue(value.ToString("G7", CultureInfo.InvariantCulture));
            }
            else
            {
                writer.WriteNullValue();
            }
        }
    }

    /// <summary>Keeps what belongs together on one line, so that a file of thousands of readings can be read and compared.</summary>
    private sealed class OnOneLine<T> : JsonConverter<T>
    {
        public override T? Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options) =>
            JsonSerializer.Deserialize<T>(ref reader, Compact);

        public override void Write(Utf8JsonWriter writer, T value, JsonSerializerOptions options) =>
            writer.WriteRawValue(JsonSerializer.SerializeToUtf8Bytes(value, Compact), skipInputValidation: true);
    }
}
