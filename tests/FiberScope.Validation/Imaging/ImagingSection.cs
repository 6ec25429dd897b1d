using System.Globalization;
using System.Text;
using FiberScope.Imaging;
using FiberScope.Specimens;

namespace FiberScope.Validation.Imaging;

/// <summary>Writes the imaging section of the validation document from what runs have found.</summary>
internal static class ImagingSection
{
    public static void Write()
    {
        var product = Load("product");
        var quick = Load("quick");
        FamilyFigure.Save(product, Repository.Locate("docs", "figures", "imaging-distributions.png"));
        SpecimenSheet.Save(Repository.Locate("docs", "figures", "imaging-specimens.png"));
        var text = new StringBuilder();
        Introduction(text, product);
        text.AppendLine("![One field of each family](figures/imaging-specimens.png)\n");
        Table(text, "### What the measurement reaches", product);
        text.AppendLine("![Distributions read and true](figures/imaging-distributions.png)\n");
        Orientation(text, product);
        FibreShare(text, product);
        Defects(text);
        Table(text, "### The quick way on the same pictures", quick);
        Coverage(text);
        Invariance(text);
        MarkedSection.Write(Repository.Locate("docs", "validation.md"), "imaging", text.ToString(), "Validation");
    }

    private static FamilyFigures[] Load(string method) =>
        [.. SpecimenFamilies.All.Select(f => FigureStore.Load<FamilyFigures>($"report-{f.Name}-{method}")).OfType<FamilyFigures>()];

    private static void Introduction(StringBuilder text, FamilyFigures[] product)
    {
        text.AppendLine("## Fibre diameters on virtual specimens\n");
        text.AppendLine("Written by `dotnet run -c Release --project tests/FiberScope.Validation -- imaging`; do not edit by hand.\n");
        text.AppendLine(CultureInfo.InvariantCulture, $"""
            Algorithm `{FieldMeter.Algorithm}`. Every family is a recipe of a mat and of a picture of it ({product.FirstOrDefault()?.Fields ?? 0} fields of 1280 × 960 pixels each, varied from
            field to field in rim height, shading, blur, noise, focus and contrast). Fields used while tuning and fields reported here have different
            seeds. The truth is the **visible length-weighted distribution**: all centre-line length whose uppermost surface is the fibre's own and that
            stands out of the noise, whether or not both edges show. Errors are relative, pooled over a family's fields; *gross* are readings off by more
            than 25 % from the fibre they lie on, or on none; *read* is the share of the length showing both edges that has a reading; *selection* is
            the part of the mean's error that comes from which places were read and how they were weighted, with edges taken as perfect.
            A figure in **bold** misses its bar (usual: mean 3 %, D50 5 %, D10 and D90 6 %, SD 12 %, KS 0.07, gross 2 %, read 70 %; families marked °:
            5, 8, 12, 25 %, 0.12, 5 %, 45 %).

            """);
    }

    private static void Table(StringBuilder text, string title, FamilyFigures[] rows)
    {
        text.AppendLine(title + "\n");
        if (rows.Length == 0)
        {
            text.AppendLine("Not run yet.\n");
            return;
        }

        text.AppendLine("| family | true mean px (CV) | mean | D10 | D50 | D90 | SD | KS | gross | read | selection | one field's mean, rms | readings | s a field |");
        text.AppendLine("| --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- |");
        foreach (var f in rows)
        {
            var bars = FamilyBars.For(f.Family);
            text.AppendLine(CultureInfo.InvariantCulture, $"| {f.Family}{(FamilyBars.IsHard(f.Family) ? "°" : "")} | {f.TrueMeanPixels:0.0} ({f.TrueCv:0 %}) | {Signed(f.Mean, bars.Mean)} | {Signed(f.D10, bars.Tail)} | {Signed(f.D50, bars.Median)} | {Signed(f.D90, bars.Tail)} | {Signed(f.Spread, bars.Spread)} | {Mark(f.Distance.ToString("0.000", CultureInfo.InvariantCulture), f.Distance <= bars.Distance)} | {Mark(Percent(f.Gross), f.Gross <= bars.Gross)} | {Mark(f.Read.ToString("0 %", CultureInfo.InvariantCulture), f.Read >= bars.Read)} | {f.Selection:+0.0 %;-0.0 %} | {f.FieldMeanScatter:0.0 %} | {f.Readings} | {f.SecondsPerField:0.0} |");
        }

        var misses = rows.Sum(f => FamilyBars.For(f.Family).Misses(f));
        text.AppendLine(CultureInfo.InvariantCulture, $"\n{(8 * rows.Length) - misses} of {8 * rows.Length} figures meet their bar; {misses} miss it. Times are from a shared two-core machine under load.\n");
        var unfit = rows.Where(f => f.UnfitFields > 0).ToArray();
        if (unfit.Length > 0)
        {
            text.AppendLine("Fields called unfit for measuring (they are pooled here all the same): " + string.Join(", ", unfit.Select(f => FormattableString.Invariant($"{f.Family} {f.UnfitFields} of {f.Fields}"))) + ".\n");
        }
    }

    private static void Orientation(StringBuilder text, FamilyFigures[] rows)
    {
        var some = rows.Where(f => double.IsFinite(f.OrderError)).ToArray();
        if (some.Length == 0)
        {
            return;
        }

        text.AppendLine("### Orientation\n");
        text.AppendLine("Order parameter ⟨cos 2θ⟩ (bar 0.03) and principal direction (bar 2°; only where the true order is above 0.15), from the readings, pooled over the fields.\n");
        text.AppendLine("| family | order, read less true | direction, read less true |\n| --- | --- | --- |");
        foreach (var f in some)
        {
            var direction = double.IsFinite(f.DirectionError) ? Mark(f.DirectionError.ToString("+0.0°;-0.0°", CultureInfo.InvariantCulture), Math.Abs(f.DirectionError) <= 2) : "";
            text.AppendLine(CultureInfo.InvariantCulture, $"| {f.Family} | {Mark(f.OrderError.ToString("+0.000;-0.000", CultureInfo.InvariantCulture), Math.Abs(f.OrderError) <= 0.03)} | {direction} |");
        }

        text.AppendLine();
    }

    private static void FibreShare(StringBuilder text, FamilyFigures[] rows)
    {
        var some = rows.Where(f => double.IsFinite(f.FibreShareError)).ToArray();
        if (some.Length == 0)
        {
            return;
        }

        text.AppendLine("### Solidity by image\n");
        text.AppendLine("The share of the field that fibre takes: in a section it is the solidity itself (Delesse's principle; bar 3 % or 0.005), in transmitted light the cover that the solidity is derived from (bar 10 %).\n");
        text.AppendLine("| family | true share | error |\n| --- | --- | --- |");
        foreach (var f in some)
        {
            var isMet = f.Family == "cross-sections" ? Math.Abs(f.FibreShareError) <= Math.Max(0.03, 0.005 / f.TrueFibreShare) : Math.Abs(f.FibreShareError) <= 0.1;
            text.AppendLine(CultureInfo.InvariantCulture, $"| {f.Family} | {f.TrueFibreShare:0.0000} | {Mark(f.FibreShareError.ToString("+0.0 %;-0.0 %", CultureInfo.InvariantCulture), isMet)} |");
        }

        text.AppendLine();
    }

    private static void Defects(StringBuilder text)
    {
        var families = SpecimenFamilies.All.Select(f => FigureStore.Load<DefectFigures[]>($"report-{f.Name}-defects")).OfType<DefectFigures[]>().ToArray();
        if (families.Length == 0)
        {
            return;
        }

        text.AppendLine("### Defects\n");
        text.AppendLine("Area share of what is no single fibre, where it is uppermost (bar: 20 % of the true share); found are true defects of 300 pixels or more that a flagged region covers by a quarter at least. In a clean family everything flagged is false (bar: 2 % of the field).\n");
        text.AppendLine("| family | kind | true share | flagged share | found | readings on it |\n| --- | --- | --- | --- | --- | --- |");
        foreach (var row in families.SelectMany(f => f).Where(d => d.Kind == "all" || d.TrueShare > 0))
        {
            var isClean = row.TrueShare == 0;
            var isMet = isClean ? row.ReadShare <= 0.02 : Math.Abs(row.ReadShare - row.TrueShare) <= 0.2 * row.TrueShare;
            var found = row.TrueCount > 0 ? FormattableString.Invariant($"{row.Found * row.TrueCount:0} of {row.TrueCount}") : "";
            text.AppendLine(CultureInfo.InvariantCulture, $"| {row.Family} | {row.Kind} | {row.TrueShare:0.00 %} | {Mark(row.ReadShare.ToString("0.00 %", CultureInfo.InvariantCulture), isMet)} | {found} | {(isClean ? "" : row.ReadingsOn.ToString(CultureInfo.InvariantCulture))} |");
        }

        text.AppendLine();
    }

    private static void Coverage(StringBuilder text)
    {
        if (FigureStore.Load<CoverageFigures>("coverage") is not { } c)
        {
            return;
        }

        text.AppendLine("### Does the 95 % interval hold the mean?\n");
        text.AppendLine(CultureInfo.InvariantCulture, $"{c.Swatches} small swatches of `{CoverageRun.Recipe.Name}`, {c.FieldsEach} fields of {CoverageRun.Recipe.WidthPixels} × {CoverageRun.Recipe.HeightPixels} pixels each: {Mark(Percent(c.Covered), c.Covered is >= 0.9 and <= 0.99)} of the intervals hold the mean of all of them (bar 90–99 %). Mean half-width {Percent(c.HalfWidth)} of the mean, scatter of the swatches' means {Percent(c.Scatter)}, error of the mean of them all {c.MeanError:+0.0 %;-0.0 %}: an interval made from scatter cannot cover a shift that all swatches share.\n");
    }

    private static void Invariance(StringBuilder text)
    {
        var figures = FigureStore.Load<InvarianceFigures[]>("invariance");
        if (figures is null)
        {
            return;
        }

        text.AppendLine("### Does the mean move when only the picture changes?\n");
        text.AppendLine("The middle disc of each picture, measured again after a change that leaves the fibres as they are (bar: 1 %). Virtual: `fine-melt-blown` and `electrospun`; real: electrospun mats from two published research sets (Carrera, Manganini, Boracchi, Lanzarone 2017; Yardimci, Ersoy 2025), which are not part of the project.\n");
        text.AppendLine("| pictures | change | pooled | mean of the pictures | largest of one picture |\n| --- | --- | --- | --- | --- |");
        foreach (var f in figures)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"| {f.Picture} | {f.Change} | {Signed(f.PooledShift, 0.01)} | {f.MeanShift:+0.0 %;-0.0 %} | {f.LargestShift:+0.0 %;-0.0 %} |");
        }

        text.AppendLine();
    }

    private static string Percent(double value) => value.ToString("0.0 %", CultureInfo.InvariantCulture);

    private static string Signed(double value, double bar) => Mark(value.ToString("+0.0 %;-0.0 %", CultureInfo.InvariantCulture), Math.Abs(value) <= bar);

    private static string Mark(string value, bool isMet) => isMet ? value : $"**{value}**";
}
