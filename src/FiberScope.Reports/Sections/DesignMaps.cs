using FiberScope.Assessment.Designing;
using FiberScope.Assessment.Input;
using FiberScope.Filtration;
using FiberScope.Reports.Figures;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>Maps of two variables of a design.</summary>
internal static class DesignMaps
{
    /// <summary>The maps; a sentence where there is none.</summary>
    public static Markup Render(DesignFinding finding)
    {
        if (finding.Map is not { } map)
        {
            return Markup.Of($"<p>No map: it needs two variables.</p>");
        }

        var grid = Grid(finding, map);
        double[,] Of(Func<DesignCandidate, double> value) => Values(map, value);
        SvgFigure[] figures =
        [
            MapFigure.Draw(grid, Of(c => c.QualityFactorPerPascal * 1000), "quality factor (1/kPa)", "map-quality", "Quality factor over the two variables, pale where a target is missed."),
            MapFigure.Draw(grid, Of(c => c.PenetrationAtMostPenetratingSize * 100), "penetration at the MPPS (%)", "map-penetration", "Penetration at the most-penetrating size over the two variables, pale where a target is missed."),
            MapFigure.Draw(grid, Of(c => c.PressureDrop.Pascals), "pressure drop (Pa)", "map-pressure-drop", "Pressure drop over the two variables, pale where a target is missed."),
        ];
        return Markup.Of($"<p>Everything else as in the best structure. Full colours where every target is met, pale where one is missed.</p>{figures.Select(f => Markup.Of($"<figure>{Markup.OfSvg(f)}</figure>"))}");
    }

    private static MapGrid Grid(DesignFinding finding, DesignMap map)
    {
        double Best(DesignVariable v) => DesignScale.Of(v.Kind).In(finding.Candidates[0].Values[finding.Design.Variables.IndexOf(v)]);
        return new MapGrid(
            [.. map.Rows[0].Select(c => DesignScale.Of(map.Across.Kind).In(c.Values[0]))],
            Name(finding, map.Across) + Unit(map.Across),
            [.. map.Rows.Select(r => DesignScale.Of(map.Up.Kind).In(r[0].Values[1]))],
            Name(finding, map.Up) + Unit(map.Up),
            Values(map, c => c.MeetsTargets),
            [.. Limits(finding, map)],
            (Best(map.Across), Best(map.Up)));
    }

    private static IEnumerable<MapLimit> Limits(DesignFinding finding, DesignMap map)
    {
        var targets = finding.Design.Targets;
        if (targets.PenetrationAtMostPenetratingSize is { } worst)
        {
            yield return new MapLimit($"penetration at the MPPS {Wording.Percent(worst, 2)}", Values(map, c => c.PenetrationAtMostPenetratingSize), worst);
        }

        if (targets.AerosolPenetration is { } passes)
        {
            yield return new MapLimit($"{finding.Design.AerosolName} {Wording.Percent(passes, 2)}", Values(map, c => c.AerosolPenetration ?? 0), passes);
        }

        if (targets.PressureDrop is { } drop)
        {
            yield return new MapLimit($"pressure drop {Wording.Of(drop)}", Values(map, c => c.PressureDrop.Pascals), drop.Pascals);
        }

        if (targets.BasisWeight is { } weight)
        {
            yield return new MapLimit($"basis weight {Wording.Of(weight)}", Values(map, c => c.BasisWeight.GramsPerSquareMeter), weight.GramsPerSquareMeter);
        }

        if (targets.Thickness is { } thickness)
        {
            yield return new MapLimit($"thickness {Wording.Thickness(thickness)}", Values(map, c => c.Thickness.Meters), thickness.Meters);
        }
    }

    /// <summary>A figure of every candidate, [across, up].</summary>
    private static T[,] Values<T>(DesignMap map, Func<DesignCandidate, T> value)
    {
        var values = new T[map.Rows[0].Length, map.Rows.Length];
        for (var i = 0; i < values.GetLength(0); i++)
        {
            for (var j = 0; j < values.GetLength(1); j++)
            {
                values[i, j] = value(map.Rows[j][i]);
            }
        }

        return values;
    }

    /// <summary>A variable for people, with its layer where there are several.</summary>
    public static string Name(DesignFinding finding, DesignVariable v)
    {
        var words = v.Kind == DesignKind.MedianDiameter ? "median fibre diameter" : v.Kind == DesignKind.DiameterGsd ? "GSD" : Wording.Words(Words.Of(Words.DesignKinds, v.Kind));
        return finding.Design.Start.Layers.Length > 1 ? $"{words}, {finding.Design.Start.Layers[v.Layer].Name}" : words;
    }

    /// <summary>A variable's unit in brackets, after a space; empty for a pure number.</summary>
    public static string Unit(DesignVariable v) => DesignScale.Of(v.Kind).Unit is { Length: > 0 } unit ? $" ({unit})" : "";
}
