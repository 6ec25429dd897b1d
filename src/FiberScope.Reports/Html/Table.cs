namespace FiberScope.Reports.Html;

/// <summary>A table whose header row is repeated on every printed page.</summary>
internal sealed class Table
{
    private readonly List<Markup> _rows = [];
    private readonly Markup _head;
    private readonly string _kind;

    /// <summary>Begins a table.</summary>
    /// <param name="kind">Its style: <c>figures</c> for columns of numbers, <c>text</c> for words.</param>
    /// <param name="headings">The column headings.</param>
    public Table(string kind, params string[] headings)
    {
        _kind = kind;
        _head = Markup.Join(headings.Select(h => Markup.Of($"<th scope=\"col\">{h}</th>")));
    }

    /// <summary>Adds a row; its first cell heads it.</summary>
    public Table Row(params Markup[] cells) => Row("", cells);

    /// <summary>Adds a row of plain texts.</summary>
    public Table Row(params string[] cells) => Row([.. cells.Select(c => Markup.Of($"{c}"))]);

    /// <summary>Adds a row with a style of its own.</summary>
    public Table Row(string style, Markup[] cells)
    {
        var rest = Markup.Join(cells.Skip(1).Select(c => Markup.Of($"<td>{c}</td>")));
        _rows.Add(Markup.Of($"<tr class=\"{style}\"><th scope=\"row\">{cells[0]}</th>{rest}</tr>"));
        return this;
    }

    /// <summary>The finished table; nothing when it has no rows.</summary>
    public Markup Finish() => _rows.Count == 0
        ? Markup.Empty
        : Markup.Of($"<div class=\"wide\"><table class=\"{_kind}\"><thead><tr>{_head}</tr></thead><tbody>{_rows}</tbody></table></div>");
}
