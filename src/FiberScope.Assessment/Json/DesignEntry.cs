using System.Collections.Immutable;
using System.Text.Json.Serialization;
using FiberScope.Assessment.Designing;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Json;

/// <summary>A design file's answer.</summary>
internal sealed record DesignEntry(
    string Schema,
    string Correlations,
    double FaceVelocityMPerS,
    bool TargetsMet,
    TargetsEntry Targets,
    VariableEntry[] Variables,
    CandidateEntry[] Candidates,
    CandidateEntry? Surer,
    DesignMapEntry? Map,
    ImmutableArray<Caveat> Warnings,
    ImmutableArray<string> Cautions)
{
    public static DesignEntry Of(DesignFinding finding) => new(
        Schemas.Design,
        Words.Of(Words.Correlations, finding.Correlations),
        finding.Design.Start.Operation.FaceVelocity.MetersPerSecond,
        finding.IsMet,
        TargetsEntry.Of(finding.Design),
        [.. finding.Design.Variables.Select(v => VariableEntry.Of(v, finding.Design.Start.Layers))],
        [.. finding.Candidates.Select(c => CandidateEntry.Of(c, finding.Design))],
        finding.Surer is { } surer ? CandidateEntry.Of(surer, finding.Design) : null,
        finding.Map is { } map ? DesignMapEntry.Of(map, finding.Design.Variables) : null,
        finding.Caveats,
        Assessment.Cautions.All);
}

/// <summary>The highest values asked for; null where nothing was.</summary>
internal sealed record TargetsEntry(
    double? PenetrationAtMpps,
    string? Aerosol,
    double? AerosolPenetration,
    double? PressureDropPa,
    [property: JsonPropertyName("basis_weight_g_per_m2")] double? BasisWeight,
    double? ThicknessUm)
{
    public static TargetsEntry Of(DesignFile design) => new(
        design.Targets.PenetrationAtMostPenetratingSize,
        design.Targets.Aerosol is null ? null : design.AerosolName,
        design.Targets.AerosolPenetration,
        design.Targets.PressureDrop?.Pascals,
        design.Targets.BasisWeight?.GramsPerSquareMeter,
        design.Targets.Thickness?.Micrometers);
}

/// <summary>What may change, in the unit given; a pure number has an empty unit.</summary>
internal sealed record VariableEntry(string Layer, string What, string Unit, double From, double To)
{
    public static VariableEntry Of(DesignVariable v, ImmutableArray<MediaLayer> layers)
    {
        var scale = DesignScale.Of(v.Kind);
        return new(layers[v.Layer].Name, Words.Of(Words.DesignKinds, v.Kind), scale.Ascii, scale.In(v.Range.Low), scale.In(v.Range.High));
    }
}

/// <summary>One structure; its values stand in the order and unit of the variables.</summary>
internal sealed record CandidateEntry(
    double[] Values,
    bool MeetsTargets,
    IReadOnlyDictionary<string, double> Probabilities,
    double PressureDropPa,
    double? MppsUm,
    double PenetrationAtMpps,
    double? AerosolPenetration,
    double QualityFactorPerPa,
    [property: JsonPropertyName("basis_weight_g_per_m2")] double BasisWeight,
    double ThicknessUm,
    DesignLayerEntry[] Layers)
{
    public static CandidateEntry Of(DesignCandidate c, DesignFile design) => new(
        [.. c.Values.Zip(design.Variables, (value, v) => DesignScale.Of(v.Kind).In(value))],
        c.MeetsTargets,
        c.Probabilities.ToImmutableSortedDictionary(p => DesignTargetNames.Of(p.Key), p => p.Value, StringComparer.Ordinal),
        c.PressureDrop.Pascals,
        c.MostPenetratingSize?.Micrometers,
        c.PenetrationAtMostPenetratingSize,
        c.AerosolPenetration,
        c.QualityFactorPerPascal,
        c.BasisWeight.GramsPerSquareMeter,
        c.Thickness.Micrometers,
        [.. c.Layers.Select(l => DesignLayerEntry.Of(l, design.FibreDensity))]);
}

/// <summary>One layer of a structure.</summary>
internal sealed record DesignLayerEntry(
    string Name,
    double MeanDiameterUm,
    double Solidity,
    double ThicknessUm,
    [property: JsonPropertyName("basis_weight_g_per_m2")] double BasisWeight,
    [property: JsonPropertyName("charge_uc_per_m2")] double Charge)
{
    public static DesignLayerEntry Of(MediaLayer l, UnitsNet.Density fibreDensity) => new(
        l.Name,
        l.Diameters.Mean.Micrometers,
        l.Solidity.Fraction,
        l.Thickness.Micrometers,
        l.Solidity.Fraction * l.Thickness.Meters * fibreDensity.KilogramsPerCubicMeter * 1e3,
        (l.Charge?.SurfaceDensity.CoulombsPerSquareMeter ?? 0) * 1e6);
}

/// <summary>Figures over two variables: rows run up, columns across, both from the low end.</summary>
internal sealed record DesignMapEntry(
    int Across,
    int Up,
    double[] AcrossValues,
    double[] UpValues,
    double[][] QualityFactorPerPa,
    double[][] PenetrationAtMpps,
    double[][] PressureDropPa,
    bool[][] MeetsTargets)
{
    public static DesignMapEntry Of(DesignMap map, ImmutableArray<DesignVariable> variables)
    {
        T[][] Grid<T>(Func<DesignCandidate, T> value) => [.. map.Rows.Select(row => row.Select(value).ToArray())];
        return new(
            variables.IndexOf(map.Across) + 1,
            variables.IndexOf(map.Up) + 1,
            [.. map.Rows[0].Select(c => DesignScale.Of(map.Across.Kind).In(c.Values[0]))],
            [.. map.Rows.Select(r => DesignScale.Of(map.Up.Kind).In(r[0].Values[1]))],
            Grid(c => c.QualityFactorPerPascal),
            Grid(c => c.PenetrationAtMostPenetratingSize),
            Grid(c => c.PressureDrop.Pascals),
            Grid(c => c.MeetsTargets));
    }
}
