using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using FiberScope.Assessment;
using FiberScope.Fibres;
using FiberScope.Statistics;

namespace FiberScope.Reports.Tests;

public sealed partial class HtmlReportTests
{
    private static readonly Lazy<string> Page = new(() => Written(Invented.Assessment()));

    [Fact]
    public void Every_figure_stands_on_the_page()
    {
        Assert.Contains("id=\"summary\"", Page.Value, StringComparison.Ordinal);
        string[] figures = ["Histogram of fibre diameters", "Mean, median and D10 to D90", "Forecast penetration against", "Penetration that each mechanism", "Forecast pressure drop", "Share of the forecast&#39;s measurement", "Forecast quality factor", "Forecast most-penetrating particle size", "Forecast penetration at the most"];
        Assert.All(figures, figure => Assert.Contains($"aria-label=\"{figure}", Page.Value, StringComparison.Ordinal));
        Assert.Equal(5, Fields().Count(Page.Value));
    }

    [Theory]
    [InlineData("length-weighted")]
    [InlineData("number-weighted")]
    [InlineData("geometric mean")]
    [InlineData("D10")]
    [InlineData("spread of the published models")]
    [InlineData("95 % band of the measured inputs")]
    [InlineData("MPPS 0.")]
    [InlineData("air permeability at")]
    [InlineData("125 Pa")]
    [InlineData("200 Pa")]
    [InlineData("What to measure better next")]
    [InlineData("diameter scale")]
    [InlineData("What a leak does")]
    [InlineData("halves the protection")]
    [InlineData("the total inward leakage at the MPPS would be 6.53 %")]
    [InlineData("invented mist")]
    [InlineData("9.4 cm/s")]
    [InlineData("99.99986 %")]
    [InlineData("Classes it points to")]
    [InlineData("Invented standard")]
    [InlineData("How many more fields")]
    [InlineData("Uncertainty of the mean")]
    [InlineData("only the standard's own test decides")]
    [InlineData("bbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbbb")]
    [InlineData("aaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaa")]
    [InlineData("the picture is out of focus.")]
    [InlineData("bootstrap seed")]
    public void The_page_says(string text) =>
        Assert.Contains(text, System.Net.WebUtility.HtmlDecode(Page.Value), StringComparison.Ordinal);

    [Fact]
    public void The_cautions_are_on_the_first_page()
    {
        var first = Page.Value[..Page.Value.IndexOf("</section>", StringComparison.Ordinal)];
        Assert.All(Cautions.All, caution => Assert.Contains(caution, System.Net.WebUtility.HtmlDecode(first), StringComparison.Ordinal));
    }

    [Fact]
    public void Nothing_is_loaded_from_anywhere_and_nothing_runs()
    {
        Assert.DoesNotContain("<script", Page.Value, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("@import", Page.Value, StringComparison.OrdinalIgnoreCase);
        Assert.All(References().Matches(Page.Value), match => Assert.StartsWith("data:image/jpeg;base64,", match.Groups["to"].Value, StringComparison.Ordinal));
        Assert.DoesNotContain("url(http", Page.Value, StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public void What_a_user_wrote_is_shown_and_never_run()
    {
        var page = Written(Invented.Assessment("<script>alert(1)</script>\" onload=\"x"));
        Assert.DoesNotContain("<script", page, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("\" onload=\"", page, StringComparison.Ordinal);
        Assert.Contains("&lt;script&gt;alert(1)&lt;/script&gt;", page, StringComparison.Ordinal);
    }

    [Fact]
    public void A_German_machine_writes_the_same_bytes()
    {
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo("de-DE");
            Assert.Equal(Page.Value, Written(Invented.Assessment()));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Every_element_is_closed_and_every_name_is_used_once()
    {
        var body = Page.Value[Page.Value.IndexOf("<main>", StringComparison.Ordinal)..(Page.Value.IndexOf("</main>", StringComparison.Ordinal) + 7)];
        var tree = XElement.Parse(body.Replace("<br>", "<br/>", StringComparison.Ordinal));
        string[] names = [.. tree.Descendants().Select(e => (string?)e.Attribute("id")).OfType<string>()];
        Assert.Equal(names.Length, names.Distinct(StringComparer.Ordinal).Count());
    }

    [Fact]
    public void Text_of_the_figures_is_text_in_a_face_that_every_machine_has()
    {
        Assert.Matches(FigureText(), Page.Value);
        Assert.DoesNotContain("font-family=", Page.Value, StringComparison.Ordinal);
    }

    [Fact]
    public void Many_fields_keep_the_page_small_enough_to_mail()
    {
        var page = Written(Invented.Assessment(fields: 20));
        Assert.InRange(Encoding.UTF8.GetByteCount(page), 1, 6_000_000);
    }

    [Fact]
    public void A_swatch_without_forecast_grade_or_solidity_still_reports()
    {
        var full = Invented.Assessment();
        var bare = full with
        {
            Forecast = null,
            Verdict = null,
            VelocitySweep = [],
            AirPermeabilities = [],
            RigPoints = [],
            Layers = [full.Layers[0] with { Solidity = null }],
        };
        var page = Written(bare);
        Assert.Contains("No grade was given", page, StringComparison.Ordinal);
        Assert.Contains("No forecast: it needs", page, StringComparison.Ordinal);
    }

    [Fact]
    public void One_reading_in_one_field_still_reports()
    {
        var full = Invented.Assessment(fields: 1);
        var survey = DiameterSurvey.From([full.Layers[0].Survey.Readings[0]], new SurveySettings { BootstrapReplicates = 100 });
        var page = Written(full with { Layers = [full.Layers[0] with { Survey = survey }] });
        Assert.Contains("there is no shape to fit", page, StringComparison.Ordinal);
        Assert.DoesNotContain("NaN", Pictures().Replace(page, ""), StringComparison.Ordinal);
    }

    [Fact]
    public void A_medium_that_lets_nothing_through_at_one_size_still_reports()
    {
        var full = Invented.Assessment();
        var point = full.Forecast!.Curve[0] with { Penetration = 0, ModelBand = new Interval(0, 0), MeasurementBand = null };
        var page = Written(full with { Forecast = full.Forecast with { Curve = [point], MostPenetratingSize = null, PenetrationAtMostPenetratingSize = 0 } });
        Assert.Contains("none between 10 nm and 2 µm", page, StringComparison.Ordinal);
        Assert.DoesNotContain("NaN", Pictures().Replace(page, ""), StringComparison.Ordinal);
    }

    [Fact]
    public void A_stopped_run_writes_no_further()
    {
        using var stop = new CancellationTokenSource();
        stop.Cancel();
        Assert.Throws<OperationCanceledException>(() => new HtmlReport().Write(Invented.Assessment(fields: 1), Stream.Null, stop.Token));
    }

    private static string Written(SwatchAssessment assessment)
    {
        using var stream = new MemoryStream();
        new HtmlReport().Write(assessment, stream, TestContext.Current.CancellationToken);
        var keep = Environment.GetEnvironmentVariable("FIBERSCOPE_KEEP_REPORT");
        if (keep is not null)
        {
            File.WriteAllBytes(keep, stream.ToArray());
        }

        return Encoding.UTF8.GetString(stream.ToArray());
    }

    [GeneratedRegex("data:image/jpeg;base64,[^\"]*", RegexOptions.ExplicitCapture, 5000)]
    private static partial Regex Pictures();

    [GeneratedRegex("<svg class=\"field\"", RegexOptions.ExplicitCapture, 5000)]
    private static partial Regex Fields();

    [GeneratedRegex("(src|href)=\"(?<to>[^\"]{0,40})", RegexOptions.ExplicitCapture, 5000)]
    private static partial Regex References();

    [GeneratedRegex("<text[^>]*>penetration \\(%\\)</text>", RegexOptions.ExplicitCapture, 5000)]
    private static partial Regex FigureText();
}
