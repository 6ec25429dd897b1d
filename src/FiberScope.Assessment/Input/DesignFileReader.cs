using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>Turns the text of a design file into a <see cref="DesignFile"/>, gathering every problem on the way.</summary>
internal sealed class DesignFileReader(MapReader map, string folder)
{
    /// <summary>Densities that differ by less are the same fibre.</summary>
    private const double SameDensity = 1e-3;

    public static DesignFile Read(InputText file, string folder)
    {
        var map = new MapReader(file, file.Root);
        var design = new DesignFileReader(map, folder).Read();
        map.RejectUnknownKeys();
        file.ThrowIfProblems();
        return design!;
    }

    private DesignFile? Read()
    {
        var reader = new MediaFileReader(map, folder);
        var start = reader.Read();
        var density = FibreDensity(reader.Materials);
        var variables = new DesignVariableReader(map, start?.Layers ?? []).Read();
        var (targets, aerosol) = Targets();
        var layout = Layout(variables.Length);
        if (start is null || density is null)
        {
            return null;
        }

        if (aerosol?.Discharged == true)
        {
            start = start with { Layers = [.. start.Layers.Select(l => l with { Charge = null })] };
            if (variables.Any(v => v.Kind == DesignKind.Charge))
            {
                map.Complain("vary", $"'{aerosol.Name}' finds the medium discharged, so varying its charge is of no use");
            }
        }

        return new DesignFile
        {
            Name = map.File.Name,
            Start = start,
            FibreDensity = density.Value,
            Targets = targets,
            AerosolName = aerosol?.Name ?? "",
            Variables = variables,
            Map = layout,
        };
    }

    private Density? FibreDensity(IReadOnlyList<FibreMaterial> ofLayers)
    {
        if (map.Has("polymer"))
        {
            return LayerReader.Material(map)?.Density;
        }

        var densities = ofLayers.Select(m => m.Density).ToArray();
        if (densities.Length == 0)
        {
            map.File.Report(map.Line, "polymer is missing; name the fibres' polymer, such as 'polymer: pp', for the basis weight");
            return null;
        }

        if (densities.Any(d => Math.Abs((d / densities[0]) - 1) > SameDensity))
        {
            map.File.Report(map.Line, "polymer: the layers name fibres of unlike density; a design counts basis weight with one, so name it at the top");
        }

        return densities[0];
    }

    private (DesignTargets Targets, NamedAerosol? Aerosol) Targets()
    {
        if (map.Map("targets") is not { } inner)
        {
            if (!map.Has("targets"))
            {
                map.File.Report(map.Line, "targets is missing; add at least one, such as 'targets: {penetration_at_mpps: 5 %, pressure_drop: 60 Pa}'");
            }

            return (new DesignTargets(), null);
        }

        NamedAerosol? aerosol = null;
        double? passes = null;
        if (inner.Map("penetration") is { } asked)
        {
            passes = AtMost(asked);
            aerosol = asked.Has("particle") ? OneSize(asked) : RequestReader.Aerosol(asked, null);
            asked.RejectUnknownKeys();
        }

        var targets = new DesignTargets
        {
            PenetrationAtMostPenetratingSize = inner.Inside("penetration_at_mpps", 0, 1),
            Aerosol = passes is null ? null : aerosol?.Aerosol,
            AerosolPenetration = aerosol is null ? null : passes,
            PressureDrop = inner.Positive("pressure_drop", Kinds.Pressure)?.Value,
            BasisWeight = inner.Positive("basis_weight", Kinds.BasisWeight)?.Value,
            Thickness = inner.Positive("thickness", Kinds.Length)?.Value,
        };
        inner.RejectUnknownKeys();
        if (!inner.Has("penetration_at_mpps") && !inner.Has("penetration") && !inner.Has("pressure_drop"))
        {
            inner.File.Report(inner.Line, "targets: ask for a penetration or a pressure drop, such as 'penetration_at_mpps: 5 %'; weight and thickness alone design nothing");
        }

        return (targets, aerosol);
    }

    private static double? AtMost(MapReader map)
    {
        if (!map.Has("at_most"))
        {
            map.File.Report(map.Line, "penetration: needs at_most, such as {particle: 0.3 um, at_most: 5 %}");
        }

        return map.Inside("at_most", 0, 1);
    }

    private static NamedAerosol? OneSize(MapReader map) => map.Positive("particle", Kinds.Length)?.Value is { } size
        ? new NamedAerosol(FormattableString.Invariant($"particles of {size.Micrometers:G3} µm"), new ChallengeAerosol(size, 1, AerosolBasis.Count), null, false)
        : null;

    private (int Across, int Up)? Layout(int count)
    {
        var items = map.Items("map");
        if (items.Count == 0)
        {
            return count > 1 ? (0, 1) : null;
        }

        int[] numbers = [.. items.Select(i => int.TryParse(i.ToString(), System.Globalization.NumberStyles.None, System.Globalization.CultureInfo.InvariantCulture, out var n) ? n : 0)];
        if (numbers.Length == 2 && numbers[0] != numbers[1] && numbers.All(n => n >= 1 && n <= count))
        {
            return (numbers[0] - 1, numbers[1] - 1);
        }

        map.Complain("map", FormattableString.Invariant($"give the numbers of two entries of 'vary', across and up, from 1 to {count}, such as [1, 2]"));
        return null;
    }
}
