using System.Globalization;
using System.Text;

namespace FiberScope.Validation;

/// <summary>A document in the making: headings, paragraphs, tables and pictures, numbers in the invariant culture.</summary>
internal sealed class MarkdownText
{
    private readonly StringBuilder _text = new();

    /// <summary>A number for a table.</summary>
    public static string Number(double value, string format = "G4") => value.ToString(format, CultureInfo.InvariantCulture);

    /// <summary>A share in per cent.</summary>
    public static string Percent(double value, string format = "0.0") => (100 * value).ToString(format, CultureInfo.InvariantCulture).Replace("-+", "-", StringComparison.Ordinal) + " %";

    /// <summary>A relative error with its sign, in per cent.</summary>
    public static string Signed(double value, string format = "+0;-0;0") => (100 * value).ToString(format, CultureInfo.InvariantCulture);

    public MarkdownText Heading(int level, string text) => Block($"{new string('#', level)} {text}");

    public MarkdownText Paragraph(FormattableString text) => Block(FormattableString.Invariant(text));

    public MarkdownText Picture(string path, string caption) => Block($"![{caption}]({path})");

    public MarkdownText Table(IReadOnlyList<string> head, IEnumerable<IReadOnlyList<string>> rows)
    {
        _text.Append("| ").AppendJoin(" | ", head).Append(" |\n").Append('|').Insert(_text.Length, "-|", head.Count).Append('\n');
        foreach (var row in rows)
        {
            _text.Append("| ").AppendJoin(" | ", row).Append(" |\n");
        }

        _text.Append('\n');
        return this;
    }

    public override string ToString() => _text.ToString();

    private MarkdownText Block(string text)
    {
        _text.Append(text).Append("\n\n");
        return this;
    }
}
