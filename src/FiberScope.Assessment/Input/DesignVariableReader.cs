using System.Collections.Immutable;
using FiberScope.Filtration;
using FiberScope.Statistics;

namespace FiberScope.Assessment.Input;

/// <summary>Reads <c>vary:</c>, what may change in the layers and how far.</summary>
internal sealed class DesignVariableReader(MapReader map, ImmutableArray<MediaLayer> layers)
{
    private const int MostVariables = 6;

    public ImmutableArray<DesignVariable> Read()
    {
        var items = map.Items("vary");
        if (items.Count is 0 or > MostVariables)
        {
            map.File.Report(map.Line, FormattableString.Invariant($"vary: list one to {MostVariables} things that may change, such as '- {{fibre_diameter: 1 um to 4 um}}'"));
        }

        var variables = ImmutableArray.CreateBuilder<DesignVariable>();
        foreach (var item in items)
        {
            if (map.AsMap(item, "vary") is { } inner && Variable(inner) is { } variable)
            {
                if (variables.Any(v => v.Kind == variable.Kind && (v.Layer == variable.Layer || v.Kind == DesignKind.WeightShare)))
                {
                    inner.File.Report(inner.Line, "vary: is listed twice; once is enough");
                }

                variables.Add(variable);
            }
        }

        return variables.ToImmutable();
    }

    private DesignVariable? Variable(MapReader item)
    {
        var layer = Layer(item);
        string[] named = [.. Words.DesignKinds.Keys.Where(item.Has)];
        var range = named.Length == 1 ? Range(item, Words.DesignKinds[named[0]]) : null;
        item.RejectUnknownKeys();
        if (named.Length != 1)
        {
            item.File.Report(item.Line, $"vary: name one of {string.Join(", ", Words.DesignKinds.Keys)} in each entry, with its range, such as {{fibre_diameter: 1 um to 4 um}}");
            return null;
        }

        return layer is { } index && range is { } known ? new DesignVariable(Words.DesignKinds[named[0]], index, known) : null;
    }

    private int? Layer(MapReader item)
    {
        var name = item.Text("layer");
        if (layers.IsEmpty)
        {
            return null;
        }

        if (name is null)
        {
            if (layers.Length == 1)
            {
                return 0;
            }

            item.File.Report(item.Line, $"vary: say in which layer, one of: {Names()}");
            return null;
        }

        var index = layers.Select(l => l.Name).ToList().IndexOf(name);
        if (index < 0)
        {
            item.Complain("layer", $"there is no layer '{name}'; there is: {Names()}");
        }

        return index < 0 ? null : index;
    }

    private string Names() => string.Join(", ", layers.Select(l => l.Name));

    private Interval? Range(MapReader item, DesignKind kind)
    {
        switch (kind)
        {
            case DesignKind.MedianDiameter:
                return AboveZero(item, "fibre_diameter", item.Range("fibre_diameter", Kinds.Length) is var (thin, thick) ? new Interval(thin.Meters, thick.Meters) : null);
            case DesignKind.BasisWeight:
                return AboveZero(item, "basis_weight", item.Range("basis_weight", Kinds.BasisWeight) is var (light, heavy) ? new Interval(light.KilogramsPerSquareMeter, heavy.KilogramsPerSquareMeter) : null);
            case DesignKind.Charge:
                return item.Range("charge", Kinds.SurfaceCharge) is var (weak, strong) ? new Interval(weak.CoulombsPerSquareMeter, strong.CoulombsPerSquareMeter) : null;
            case DesignKind.DiameterGsd:
                return item.Range("gsd", 1, 20) is var (narrow, wide) ? new Interval(narrow, wide) : null;
            case DesignKind.WeightShare when layers.Length == 1:
                item.Complain("weight_share", "needs a second layer to share the weight with");
                return null;
            case DesignKind.WeightShare:
                return item.Range("weight_share", 0.001, 0.999) is var (little, much) ? new Interval(little, much) : null;
            default:
                return item.Range("solidity", 0.001, 0.9) is var (open, dense) ? new Interval(open, dense) : null;
        }
    }

    private static Interval? AboveZero(MapReader item, string key, Interval? range)
    {
        if (range is { Low: <= 0 })
        {
            item.Complain(key, "must begin above zero");
            return null;
        }

        return range;
    }
}
