using System.Text;

namespace FiberScope.Reports.Html;

/// <summary>The style sheet that travels inside the page.</summary>
internal static class Stylesheet
{
    /// <summary>The report's style sheet.</summary>
    public static Markup Report { get; } = Markup.OfStyle(Read("report.css"));

    private static string Read(string name)
    {
        using var stream = typeof(Stylesheet).Assembly.GetManifestResourceStream(name)
            ?? throw new InvalidOperationException($"The style sheet {name} is not built in.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return reader.ReadToEnd().ReplaceLineEndings("\n");
    }
}
