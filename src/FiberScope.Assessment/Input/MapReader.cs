using UnitsNet;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Reads the keys of one YAML mapping; what is asked for is known, everything else is an error.</summary>
internal sealed class MapReader(InputText file, YamlMappingNode node)
{
    private readonly HashSet<string> _known = new(StringComparer.Ordinal);

    public int Line => (int)node.Start.Line;

    public InputText File => file;

    public bool Has(string key) => Find(key) is not null;

    /// <summary>Whether a key is there, without making it one that is known here.</summary>
    public bool HasKey(string key) => node.Children.Keys.Any(k => k is YamlScalarNode scalar && scalar.Value == key);

    /// <summary>The value of a key, whatever it is; null when absent.</summary>
    public YamlNode? Find(string key)
    {
        _known.Add(key);
        return node.Children.FirstOrDefault(pair => pair.Key is YamlScalarNode scalar && scalar.Value == key).Value;
    }

    /// <summary>Reports a problem at the line of a key, or of the mapping where the key is absent.</summary>
    public void Complain(string key, string message)
    {
        _known.Add(key);
        file.Report(node.Children.Keys.FirstOrDefault(k => k is YamlScalarNode scalar && scalar.Value == key) ?? node, $"{key}: {message}");
    }

    /// <summary>A text; null when absent or when the value is no text.</summary>
    public string? Text(string key)
    {
        switch (Find(key))
        {
            case null:
                return null;
            case YamlScalarNode { Value.Length: > 0 } scalar:
                return scalar.Value;
            case YamlScalarNode:
                Complain(key, "is empty; give a value or delete the line");
                return null;
            default:
                Complain(key, "a single value is wanted here");
                return null;
        }
    }

    /// <summary>A quantity above zero; null when absent or wrong.</summary>
    public Stated<T>? Positive<T>(string key, QuantityKind<T> kind)
        where T : struct, IQuantity
    {
        var stated = Quantity(key, kind);
        if (stated is null || (double)stated.Value.Value > 0)
        {
            return stated;
        }

        Complain(key, $"'{Text(key)}' must be above zero, such as {kind.Example}");
        return null;
    }

    /// <summary>A quantity of any sign; null when absent or wrong.</summary>
    public Stated<T>? Quantity<T>(string key, QuantityKind<T> kind)
        where T : struct, IQuantity
    {
        if (Text(key) is not { } text)
        {
            return null;
        }

        if (QuantityText.Read(text, kind, out var stated) is { } complaint)
        {
            Complain(key, complaint);
        }

        return stated;
    }

    /// <summary>A pure number strictly between two limits, as <c>0.08</c> or <c>8 %</c>; null when absent or wrong.</summary>
    public double? Inside(string key, double low, double high) =>
        Pure(key, value => value > low && value < high, FormattableString.Invariant($"must lie between {low} and {high}, both excluded"));

    /// <summary>A pure number between two limits or on one of them; null when absent or wrong.</summary>
    public double? Within(string key, double low, double high) =>
        Pure(key, value => value >= low && value <= high, FormattableString.Invariant($"must lie from {low} to {high}"));

    /// <summary>A pure number strictly between two limits, with its uncertainty where given; null when absent or wrong.</summary>
    public Stated<double>? InsideStated(string key, double low, double high) =>
        PureStated(key, value => value > low && value < high, FormattableString.Invariant($"must lie between {low} and {high}, both excluded"));

    /// <summary>A pure number between two limits or on one of them, with its uncertainty where given; null when absent or wrong.</summary>
    public Stated<double>? WithinStated(string key, double low, double high) =>
        PureStated(key, value => value >= low && value <= high, FormattableString.Invariant($"must lie from {low} to {high}"));

    /// <summary>A range of quantities, <c>1 um to 4 um</c>, none below zero; null when absent or wrong.</summary>
    public (T Low, T High)? Range<T>(string key, QuantityKind<T> kind)
        where T : struct, IQuantity
    {
        if (Ends(key, kind.RangeExample) is not { } ends)
        {
            return null;
        }

        if ((QuantityText.Read(ends.Low, kind, out var low) ?? QuantityText.Read(ends.High, kind, out var high)) is { } complaint)
        {
            Complain(key, complaint);
            return null;
        }

        QuantityText.Read(ends.High, kind, out high);
        return RangeRuled(key, (double)low!.Value.Value, high!.Value.As(low.Value.Unit)) ? (low.Value, high.Value) : null;
    }

    /// <summary>A range of pure numbers, <c>0.05 to 0.2</c> or <c>5 % to 20 %</c>, between two limits; null when absent or wrong.</summary>
    public (double Low, double High)? Range(string key, double least, double most)
    {
        if (Ends(key, "0.05 to 0.2") is not { } ends)
        {
            return null;
        }

        if ((QuantityText.ReadPure(ends.Low, out double low) ?? QuantityText.ReadPure(ends.High, out double high)) is { } complaint)
        {
            Complain(key, complaint);
            return null;
        }

        QuantityText.ReadPure(ends.High, out high);
        if (low < least || high > most)
        {
            Complain(key, FormattableString.Invariant($"'{Text(key)}' must stay from {least} to {most}"));
            return null;
        }

        return RangeRuled(key, low, high) ? (low, high) : null;
    }

    /// <summary>One of several words; null when absent or wrong.</summary>
    public T? Choice<T>(string key, IReadOnlyDictionary<string, T> words)
        where T : struct
    {
        if (Text(key) is not { } text)
        {
            return null;
        }

        if (words.TryGetValue(text, out var found))
        {
            return found;
        }

        Complain(key, $"'{text}' is not one of {string.Join(", ", words.Keys)}");
        return null;
    }

    /// <summary>Reports keys that something else tells already, here and in every layer.</summary>
    public void RejectTold(IEnumerable<string> keys, string by)
    {
        MapReader[] maps = [this, .. Items("layers").OfType<YamlMappingNode>().Select(layer => new MapReader(file, layer))];
        foreach (var (map, key) in maps.SelectMany(m => keys.Where(m.HasKey).Select(key => (m, key))))
        {
            map.Complain(key, $"is told by '{by}' already; delete one of the two");
        }
    }

    /// <summary>A mapping; null when absent or when the value is none.</summary>
    public MapReader? Map(string key) => Find(key) is { } value ? AsMap(value, key) : null;

    /// <summary>The items of a list; empty when absent; a single value counts as a list of one.</summary>
    public IReadOnlyList<YamlNode> Items(string key) => Find(key) switch
    {
        null => [],
        YamlSequenceNode sequence => [.. sequence.Children],
        var single => [single],
    };

    /// <summary>An item of a list as a mapping; null, with a complaint, when it is none.</summary>
    public MapReader? AsMap(YamlNode value, string key)
    {
        if (value is YamlMappingNode map)
        {
            return new MapReader(file, map);
        }

        file.Report(value, $"{key}: keys with values are wanted here");
        return null;
    }

    /// <summary>Reports every key that nobody asked for, with the nearest known one.</summary>
    public void RejectUnknownKeys()
    {
        foreach (var key in node.Children.Keys)
        {
            var name = (key as YamlScalarNode)?.Value ?? key.ToString();
            if (!_known.Contains(name))
            {
                var nearest = Spelling.Nearest(name, _known);
                var hint = nearest is null ? "known here: " + string.Join(", ", _known.Order(StringComparer.Ordinal)) : $"did you mean '{nearest}'?";
                file.Report(key, $"unknown key '{name}'; {hint}");
            }
        }
    }

    private (string Low, string High)? Ends(string key, string example)
    {
        if (Text(key) is not { } text)
        {
            return null;
        }

        var parts = text.Split(" to ", StringSplitOptions.TrimEntries);
        if (parts.Length == 2)
        {
            return (parts[0], parts[1]);
        }

        Complain(key, $"'{text}' is no range; write both ends, such as {example}");
        return null;
    }

    private bool RangeRuled(string key, double low, double high)
    {
        if (low >= 0 && low < high)
        {
            return true;
        }

        Complain(key, $"'{Text(key)}' must run upwards from zero or above");
        return false;
    }

    private double? Pure(string key, Func<double, bool> sound, string rule)
    {
        if (Text(key) is not { } text)
        {
            return null;
        }

        if (QuantityText.ReadPure(text, out double value) is { } complaint)
        {
            Complain(key, complaint);
            return null;
        }

        return Ruled(key, text, sound(value), rule) ? value : null;
    }

    private Stated<double>? PureStated(string key, Func<double, bool> sound, string rule)
    {
        if (Text(key) is not { } text)
        {
            return null;
        }

        if (QuantityText.ReadPure(text, out Stated<double>? stated) is { } complaint)
        {
            Complain(key, complaint);
            return null;
        }

        return Ruled(key, text, sound(stated!.Value), rule) ? stated : null;
    }

    private bool Ruled(string key, string text, bool sound, string rule)
    {
        if (!sound)
        {
            Complain(key, $"'{text}' {rule}");
        }

        return sound;
    }
}
