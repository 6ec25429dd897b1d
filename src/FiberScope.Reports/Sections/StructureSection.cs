using FiberScope.Assessment;
using FiberScope.Fibres;
using FiberScope.Reports.Figures;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>Orientation, openings, evenness and defects of each layer.</summary>
internal sealed class StructureSection : IReportSection
{
    /// <inheritdoc/>
    public string Anchor => "structure";

    /// <inheritdoc/>
    public string Heading => "Structure of the mat";

    /// <inheritdoc/>
    public Markup Render(SwatchAssessment assessment)
    {
        var parts = assessment.Layers.Where(l => l.Structure is not null).Select((layer, i) => Layer(layer, i, assessment.Layers.Length > 1)).ToArray();
        return parts.Length == 0 ? Markup.Empty : Markup.Join(parts);
    }

    private static Markup Layer(LayerFinding layer, int number, bool named)
    {
        var structure = layer.Structure!;
        var table = new Table("text", "what", "found", "how to read it");
        foreach (var (what, found, meaning) in Rows(structure))
        {
            table.Row(what, found, meaning);
        }

        var figures = Figures(structure, number);
        return Markup.Of($"{(named ? Markup.Of($"<h3>{layer.Name}</h3>") : Markup.Empty)}{table.Finish()}{(figures.Length == 0 ? Markup.Empty : Markup.Of($"<div class=\"pair\">{Markup.Join(figures)}</div>"))}");
    }

    private static IEnumerable<(string What, string Found, string Meaning)> Rows(MatStructure structure)
    {
        if (structure.Orientation is { } o)
        {
            yield return ("principal direction", $"{Wording.Number(o.PrincipalDirection.Degrees)}°", "0° is the picture's horizontal, 90° its vertical; it means little below an order parameter of 0.1");
            yield return ("order parameter", Wording.Number(o.Order), "0 random, 1 all parallel");
            yield return ("MD/CD ratio of fibre length", Wording.Number(o.MachineToCross), "the picture's vertical is taken for the machine direction");
        }

        if (structure.Openings is { } p)
        {
            yield return ("openings, median by area", $"{Wording.Number(p.AreaMedian.Micrometers)} µm", $"largest circles between the foremost fibres, {Wording.Count(p.Count)} of them; not the pore size of a bubble-point test");
            yield return ("largest opening", $"{Wording.Number(p.Largest.Micrometers)} µm", "circles cut by the border are left out");
            yield return ("pinholes", Wording.Count(p.Pinholes), "openings larger than the others make likely");
        }

        if (structure.Uniformity is { } u)
        {
            yield return ("unevenness of cover", Wording.Number(u.Unevenness), "1 as straight fibres laid at random, above 1 cloudy");
        }

        foreach (var kind in structure.Defects.Kinds)
        {
            yield return (kind.Kind, $"{Wording.Count(kind.Count)} ({Wording.Number(kind.PerSquareMillimetre)} per mm²)", $"{Wording.Number(kind.AreaShare * 100)} % of the area; gives no diameter reading; heaps of clean fibres are flagged too, over 1 to 3 % of the area");
        }
    }

    private static Markup[] Figures(MatStructure structure, int number)
    {
        var id = FormattableString.Invariant($"structure-{number}");
        SvgFigure?[] figures =
        [
            structure.Orientation is { } orientation ? StructureFigures.Orientation(orientation, id + "-direction") : null,
            structure.Openings is { } openings ? StructureFigures.Openings(openings, id + "-openings") : null,
            structure.Uniformity is { } uniformity ? StructureFigures.Uniformity(uniformity, id + "-evenness") : null,
        ];
        return [.. figures.OfType<SvgFigure>().Select(f => Markup.Of($"<figure>{Markup.OfSvg(f)}</figure>"))];
    }
}
