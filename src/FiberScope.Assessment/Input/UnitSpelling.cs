using System.Text.RegularExpressions;

namespace FiberScope.Assessment.Input;

/// <summary>Brings the spellings that people type to the ones that the units library knows.</summary>
internal static partial class UnitSpelling
{
    /// <summary><c>um</c> to <c>µm</c>, both micro signs to one, <c>g/m2</c> and <c>g/m^2</c> to <c>g/m²</c>.</summary>
    public static string Normalise(string unit)
    {
        var text = unit.Trim().Replace('μ', 'µ').Replace("·", "", StringComparison.Ordinal);
        text = SquareOrCube().Replace(text, m => m.Groups["length"].Value + (m.Groups["power"].ValueSpan is "2" ? "²" : "³"));
        return MicroByLetter().Replace(text, "µ${base}");
    }

    [GeneratedRegex(@"(?<=^|[/ ])(?<length>[kcmdnuµ]?m|in|ft)\^?(?<power>[23])(?![\w])", RegexOptions.CultureInvariant, matchTimeoutMilliseconds: 60_000)]
    private static partial Regex SquareOrCube();

    [GeneratedRegex(@"(?<![\p{L}])u(?<base>m|g|l|s|C)(?![\p{L}])", RegexOptions.CultureInvariant, matchTimeoutMilliseconds: 60_000)]
    private static partial Regex MicroByLetter();
}
