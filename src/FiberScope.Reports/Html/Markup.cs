using System.Runtime.CompilerServices;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Unicode;

namespace FiberScope.Reports.Html;

/// <summary>A piece of HTML that is safe to put on a page: made from literals, with every value escaped.</summary>
/// <remarks>
/// The only way from a string to a <see cref="Markup"/> is an interpolated literal, whose holes are escaped. A number is no valid
/// hole: it must go through <see cref="Wording"/>, which writes it the same in every culture.
/// </remarks>
internal readonly record struct Markup
{
    private readonly string? _html;

    private Markup(string html) => _html = html;

    /// <summary>Nothing at all.</summary>
    public static Markup Empty => default;

    /// <summary>Whether there is nothing in it.</summary>
    public bool IsEmpty => string.IsNullOrEmpty(_html);

    /// <summary>Makes a piece from an interpolated literal.</summary>
    public static Markup Of(Builder html) => new(html.Text);

    /// <summary>A figure, which writes its own HTML.</summary>
    public static Markup OfSvg(Figures.SvgFigure figure) => new(figure.Svg);

    /// <summary>A style sheet of the project's own.</summary>
    public static Markup OfStyle(string css) => new(css);

    /// <summary>A field's picture, which writes its own SVG.</summary>
    public static Markup OfPicture(Imaging.FieldMeasurement field, Pictures.PictureBudget budget) => new(Pictures.FieldPicture.Svg(field, budget));

    /// <summary>A PNG picture that travels inside the page.</summary>
    public static Markup OfPng(byte[] png, string description) => Of($"<img alt=\"{description}\" src=\"data:image/png;base64,{Convert.ToBase64String(png)}\">");

    /// <summary>Pieces one after the other.</summary>
    public static Markup Join(IEnumerable<Markup> pieces) => new(string.Concat(pieces.Select(p => p._html)));

    /// <inheritdoc/>
    public override string ToString() => _html ?? "";

    /// <summary>Puts an interpolated literal together, escaping what comes from elsewhere.</summary>
    [InterpolatedStringHandler]
    public readonly ref struct Builder(int literalLength, int formattedCount)
    {
        private static readonly HtmlEncoder Encoder = HtmlEncoder.Create(UnicodeRanges.All);

        private readonly StringBuilder _text = new(literalLength + (16 * formattedCount));

        public string Text => _text.ToString();

        public void AppendLiteral(string literal) => _text.Append(literal);

        public void AppendFormatted(string? value) => _text.Append(Encoder.Encode(value ?? ""));

        public void AppendFormatted(Markup value) => _text.Append(value.ToString());

        public void AppendFormatted(IEnumerable<Markup> values)
        {
            foreach (var value in values)
            {
                _text.Append(value.ToString());
            }
        }
    }
}
