using System.Globalization;
using System.Text.RegularExpressions;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>Reads quantities and pure numbers as people write them; every complaint says how to mend it.</summary>
internal static partial class QuantityText
{
    private const NumberStyles Number = NumberStyles.Float;

    /// <summary>Reads <c>310 um</c>, <c>310 um ± 8 um</c> or <c>310 um +- 2.5 %</c>.</summary>
    /// <returns>Null when it was read; else what is wrong.</returns>
    public static string? Read<T>(string text, QuantityKind<T> kind, out Stated<T>? stated)
        where T : struct, IQuantity
    {
        stated = null;
        var parts = PlusMinus().Split(text.Trim());
        if (parts.Length > 2)
        {
            return $"'{text}' has more than one uncertainty";
        }

        var complaint = ReadPlain(parts[0], kind, out var value);
        if (complaint is not null || parts.Length == 1)
        {
            stated = complaint is null ? new Stated<T>(value) : null;
            return complaint;
        }

        complaint = ReadUncertainty(parts[1], value, kind, out var relative);
        stated = complaint is null ? new Stated<T>(value, relative) : null;
        return complaint;
    }

    /// <summary>Reads a pure number: <c>0.08</c> or <c>8 %</c>.</summary>
    public static string? ReadPure(string text, out double value)
    {
        value = 0;
        if (PlusMinus().IsMatch(text))
        {
            return $"'{text.Trim()}' has an uncertainty, and none is taken here; give the number alone";
        }

        var match = NumberAndUnit().Match(text.Trim());
        if (!match.Success || !double.TryParse(match.Groups["number"].Value, Number, CultureInfo.InvariantCulture, out value))
        {
            return NotANumber(text, "0.08 or 8 %");
        }

        var unit = match.Groups["unit"].Value;
        switch (unit)
        {
            case "":
                return null;
            case "%" or "percent":
                value /= 100;
                return null;
            default:
                return $"'{text}' has the unit '{unit}'; a pure number is wanted, such as 0.08 or 8 %";
        }
    }

    /// <summary>Reads a pure number that may have an uncertainty: <c>0.08 ± 0.004</c> or <c>0.08 ± 5 %</c>, per cent of the value.</summary>
    /// <returns>Null when it was read; else what is wrong.</returns>
    public static string? ReadPure(string text, out Stated<double>? stated)
    {
        stated = null;
        var parts = PlusMinus().Split(text.Trim());
        if (parts.Length > 2)
        {
            return $"'{text}' has more than one uncertainty";
        }

        if (ReadPure(parts[0], out double value) is { } complaint)
        {
            return complaint;
        }

        if (parts.Length == 1)
        {
            stated = new Stated<double>(value);
            return null;
        }

        if (ReadPure(parts[1], out double uncertainty) is { } wrong)
        {
            return wrong;
        }

        var percent = IsPercent(parts[1]);
        if (percent && IsPercent(parts[0]))
        {
            return $"'{text}' can be read in two ways; write the value without %, such as 0.08 ± 0.004, or 0.08 ± 5 % for 5 % of the value";
        }

        var relative = percent ? uncertainty : uncertainty / Math.Abs(value);
        stated = new Stated<double>(value, relative);
        return Sound(relative, parts[1]);
    }

    /// <summary>Reads a temperature, whose uncertainty is a difference: <c>23 C ± 1 K</c>.</summary>
    /// <returns>Null when it was read; else what is wrong.</returns>
    public static string? ReadTemperature(string text, out Temperature temperature, out TemperatureDelta uncertainty)
    {
        uncertainty = TemperatureDelta.Zero;
        var parts = PlusMinus().Split(text.Trim());
        var complaint = ReadPlain(parts[0], Kinds.Temperature, out temperature);
        if (complaint is not null || parts.Length == 1)
        {
            return complaint;
        }

        if (parts.Length > 2 || IsPercent(parts[1]))
        {
            return $"'{text}': the uncertainty of a temperature is one difference, such as 23 C ± 1 K";
        }

        return ReadPlain(parts[1], Kinds.TemperatureDifference, out uncertainty)
            ?? (uncertainty.Kelvins is >= 0 and <= 50 ? null : $"the uncertainty '{parts[1].Trim()}' must lie from 0 K to 50 K");
    }

    private static bool IsPercent(string text) => text.TrimEnd() is var t && (t.EndsWith('%') || t.EndsWith("percent", StringComparison.Ordinal));

    private static string? ReadUncertainty<T>(string text, T value, QuantityKind<T> kind, out double relative)
        where T : struct, IQuantity
    {
        relative = 0;
        if (IsPercent(text))
        {
            return ReadPure(text, out relative) ?? Sound(relative, text);
        }

        if (ReadPlain(text, kind, out var absolute) is { } complaint)
        {
            return complaint;
        }

        relative = Math.Abs(absolute.As(value.Unit) / (double)value.Value);
        return Sound(relative, text);
    }

    private static string? Sound(double relative, string text) =>
        relative is >= 0 and <= 1 ? null : $"the uncertainty '{text.Trim()}' must lie between zero and the value itself";

    private static string? ReadPlain<T>(string text, QuantityKind<T> kind, out T value)
        where T : struct, IQuantity
    {
        value = default;
        var match = NumberAndUnit().Match(text.Trim());
        if (!match.Success || !double.TryParse(match.Groups["number"].Value, Number, CultureInfo.InvariantCulture, out var number))
        {
            return NotANumber(text, kind.Example);
        }

        var unit = match.Groups["unit"].Value;
        if (unit.Length == 0)
        {
            return $"'{text.Trim()}' has no unit; write {kind.Name} with its unit, such as {kind.Example}";
        }

        if (!double.IsFinite(number))
        {
            return $"'{text.Trim()}' is not a finite number";
        }

        if (kind.TryMake(number, unit, out value))
        {
            return null;
        }

        return Kinds.Describe(unit) is { } other
            ? $"'{text.Trim()}' is {other}; {kind.Name} is wanted, such as {kind.Example}"
            : $"'{text.Trim()}' has the unknown unit '{unit}'; write {kind.Name} such as {kind.Example}";
    }

    private static string NotANumber(string text, string example) => DecimalComma().IsMatch(text)
        ? $"'{text.Trim()}' has a decimal comma; use a decimal point, such as {example}"
        : $"'{text.Trim()}' is not a number with a unit; write such as {example}";

    [GeneratedRegex(@"±|\+/-|\+-", RegexOptions.CultureInvariant, matchTimeoutMilliseconds: 60_000)]
    private static partial Regex PlusMinus();

    [GeneratedRegex(@"^(?<number>[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?)\s*(?<unit>(?:[^\d\s,.+-]|1/).*)?$", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 60_000)]
    private static partial Regex NumberAndUnit();

    [GeneratedRegex(@"\d,\d", RegexOptions.CultureInvariant, matchTimeoutMilliseconds: 60_000)]
    private static partial Regex DecimalComma();
}
