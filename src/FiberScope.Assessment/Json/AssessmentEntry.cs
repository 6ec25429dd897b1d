using System.Collections.Immutable;
using System.Text.Json.Serialization;
using FiberScope.Assessment.Measuring;
using FiberScope.Conformity;
using FiberScope.Fibres;

namespace FiberScope.Assessment.Json;

/// <summary>An assessment file.</summary>
internal sealed record AssessmentEntry(
    string Schema,
    SwatchIdentity Identity,
    LayerEntry[] Layers,
    PredictionEntry? Prediction,
    VelocityEntry[] VelocitySweep,
    PermeabilityEntry[] AirPermeability,
    RigEntry[] Measured,
    VerdictEntry? Verdict,
    RecipeJson Recipe,
    ImmutableArray<Caveat> Caveats,
    ImmutableArray<string> Cautions)
{
    public static AssessmentEntry Of(SwatchAssessment a) => new(
        Schemas.Assessment,
        a.Identity,
        [.. a.Layers.Select(LayerEntry.Of)],
        a.Prediction is null ? null : PredictionEntry.Of(a.Prediction),
        [.. a.VelocitySweep.Select(v => new VelocityEntry(v.FaceVelocity.MetersPerSecond, v.PressureDrop.Pascals, v.MostPenetratingSize?.Micrometers, v.Penetration, v.QualityFactorPerPascal))],
        [.. a.AirPermeabilities.Select(PermeabilityEntry.Of)],
        [.. a.RigPoints.Select(p => new RigEntry(p.FaceVelocity.MetersPerSecond, p.PressureDrop?.Pascals, p.ForecastPressureDrop?.Pascals, p.Particle?.Micrometers, p.Penetration, p.ForecastPenetration, p.EffectiveDiameter?.Micrometers))],
        a.Verdict is null ? null : VerdictEntry.Of(a.Verdict),
        RecipeJson.Of(a.Recipe),
        a.Caveats,
        Assessment.Cautions.All);
}

/// <summary>One layer.</summary>
internal sealed record LayerEntry(
    string Name,
    string? Polymer,
    [property: JsonPropertyName("fibre_density_kg_per_m3")] double? Density,
    [property: JsonPropertyName("basis_weight_g_per_m2")] double? BasisWeight,
    double? ThicknessUm,
    MeasurementEntry Measurement)
{
    public static LayerEntry Of(LayerFinding layer) => new(
        layer.Name,
        layer.PolymerName,
        layer.FibreDensity?.KilogramsPerCubicMeter,
        layer.BasisWeight?.GramsPerSquareMeter,
        layer.Thickness?.Micrometers,
        MeasurementEntry.Of(layer.Fields, layer.Survey, layer.Solidity, layer.Structure ?? StructurePool.Of(layer.Fields), layer.Survey.Caveats));
}

/// <summary>The forecast at one face velocity.</summary>
internal sealed record VelocityEntry(double FaceVelocityMPerS, double PressureDropPa, double? MppsUm, double PenetrationAtMpps, double QualityFactorPerPa);

/// <summary>Air permeability at a pressure drop.</summary>
internal sealed record PermeabilityEntry(double PressureDropPa, double FaceVelocityMmPerS)
{
    public static PermeabilityEntry Of(AirPermeability p) => new(p.PressureDrop.Pascals, p.FaceVelocity.MillimetersPerSecond);
}

/// <summary>A rig result beside its forecast.</summary>
internal sealed record RigEntry(double FaceVelocityMPerS, double? PressureDropPa, double? ForecastPressureDropPa, double? ParticleUm, double? Penetration, double? ForecastPenetration, double? EffectiveDiameterUm);

/// <summary>The verdict on a grade.</summary>
internal sealed record VerdictEntry(string Grade, string Decision, bool RestsOnForecast, string Sentence, LimitEntry[] Limits)
{
    public static VerdictEntry Of(GradeVerdict v) => new(v.Grade.Name, Word(v.Decision), v.RestsOnForecast, v.Sentence, [.. v.Verdicts.Select(LimitEntry.Of)]);

    public static string Word(Decision decision) => decision.ToString().ToLowerInvariant();
}

/// <summary>The verdict on one limit; numbers are in <paramref name="Unit"/>.</summary>
internal sealed record LimitEntry(
    string Characteristic,
    string Unit,
    double? AtLeast,
    double? AtMost,
    double? ParticleUm,
    double? TestPressurePa,
    double MaximumRisk,
    double? Value,
    double? U,
    string Decision,
    double ConsumersRisk,
    double ProducersRisk,
    string Sentence)
{
    public static LimitEntry Of(Verdict v)
    {
        var c = v.Limit.Characteristic;
        return new LimitEntry(
            c.Key,
            c.UnitText,
            v.Limit.AtLeast is { } low ? c.In(low) : null,
            v.Limit.AtMost is { } high ? c.In(high) : null,
            v.Limit.Particle?.Micrometers,
            v.Limit.TestPressure?.Pascals,
            v.Limit.MaximumRisk,
            v.Observed is { } observed ? c.In(observed.Value) : null,
            v.Observed is { } known ? c.In(known.StandardUncertainty) : null,
            VerdictEntry.Word(v.Decision),
            v.ConsumersRisk,
            v.ProducersRisk,
            v.Sentence);
    }
}

/// <summary>The recipe.</summary>
internal sealed record RecipeJson(
    string Software,
    DateTimeOffset MadeAt,
    string SwatchFile,
    [property: JsonPropertyName("files_sha256")] IReadOnlyDictionary<string, string> FileHashes,
    ImmutableArray<RecipeEntry> Inputs,
    ImmutableArray<RecipeEntry> Settings,
    ImageEntry[] Images)
{
    public static RecipeJson Of(Recipe r) => new(
        r.Software,
        r.MadeAt,
        r.SwatchFile,
        r.FileHashes,
        r.Inputs,
        r.Settings,
        [.. r.Images.Select(i => new ImageEntry(i.Name, i.Sha256, i.PixelSize.Micrometers, i.PixelSizeOrigin, i.Algorithm))]);
}

/// <summary>The identity of an image.</summary>
internal sealed record ImageEntry(string Image, [property: JsonPropertyName("sha256")] string Hash, double PixelSizeUm, string PixelSizeOrigin, string Algorithm);
