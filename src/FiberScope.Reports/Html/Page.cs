namespace FiberScope.Reports.Html;

/// <summary>What stands before and after the content of every page.</summary>
/// <remarks>No scripts, no fonts, nothing loaded from anywhere.</remarks>
internal static class Page
{
    /// <summary>The end of a page.</summary>
    public static Markup Foot { get; } = Markup.Of($"</main>\n</body>\n</html>\n");

    /// <summary>The beginning of a page, up to where its sections go.</summary>
    /// <param name="title">The page's title.</param>
    /// <param name="software">The program that made it.</param>
    public static Markup Head(string title, string software) => Markup.Of(
        $"""
        <!doctype html>
        <html lang="en">
        <head>
        <meta charset="utf-8">
        <meta name="viewport" content="width=device-width, initial-scale=1">
        <meta name="generator" content="{software}">
        <meta http-equiv="Content-Security-Policy" content="default-src 'none'; img-src data:; style-src 'unsafe-inline'">
        <title>{title}</title>
        <style>{Stylesheet.Report}</style>
        </head>
        <body>
        <main>

        """);

    /// <summary>A section with its heading; without one when the heading is empty.</summary>
    public static Markup Section(string anchor, string heading, Markup content) => heading.Length == 0
        ? Markup.Of($"<section id=\"{anchor}\">\n{content}\n</section>\n")
        : Markup.Of($"<section id=\"{anchor}\">\n<h2>{heading}</h2>\n{content}\n</section>\n");
}
