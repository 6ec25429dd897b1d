using System.Collections.Immutable;
using FiberScope.Conformity;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment;

/// <summary>All that is known of one swatch: what its micrographs show, what to expect of it on a rig, and whether it meets its grade.</summary>
public sealed record SwatchAssessment
{
    /// <summary>Which piece of which material.</summary>
    public required SwatchIdentity Identity { get; init; }

    /// <summary>The layers, upstream first; at least one.</summary>
    public required ImmutableArray<LayerFinding> Layers { get; init; }

    /// <summary>The filtration forecast; null when the swatch file gives no face velocity, or a layer no solidity or thickness.</summary>
    public required MediaForecast? Forecast { get; init; }

    /// <summary>The forecast against face velocity, slowest first; empty without a forecast.</summary>
    public required ImmutableArray<VelocityPoint> VelocitySweep { get; init; }

    /// <summary>Air permeability at 125 Pa and 200 Pa; empty without a forecast.</summary>
    public required ImmutableArray<AirPermeability> AirPermeabilities { get; init; }

    /// <summary>The classes of published standards that the forecast points to; empty without a forecast.</summary>
    public ImmutableArray<ClassForecast> Classes { get; init; } = [];

    /// <summary>Pressure drop of even layers by every law of resistance, by its stable name; empty without a forecast.</summary>
    public ImmutableSortedDictionary<string, UnitsNet.Pressure> PressureDropLaws { get; init; } = ImmutableSortedDictionary<string, UnitsNet.Pressure>.Empty;

    /// <summary>What passes of the aerosols that the swatch file asks for; may be empty.</summary>
    public ImmutableArray<ChallengeFinding> Challenges { get; init; } = [];

    /// <summary>What passes in the bands of size that the swatch file asks for; may be empty.</summary>
    public ImmutableArray<BandFinding> Bands { get; init; } = [];

    /// <summary>Total inward leakage at the most-penetrating size; null unless the swatch file tells a mask's leaks or an edge leak.</summary>
    public double? TotalInwardLeakage { get; init; }

    /// <summary>What a rig measured on this material, beside the forecast for the same conditions.</summary>
    public required ImmutableArray<RigPoint> RigPoints { get; init; }

    /// <summary>The verdict against the grade; null when the swatch file names none.</summary>
    public required GradeVerdict? Verdict { get; init; }

    /// <summary>How to repeat the result.</summary>
    public required Recipe Recipe { get; init; }

    /// <summary>What a reader must know before relying on the numbers, from every part.</summary>
    public required ImmutableArray<Caveat> Caveats { get; init; }

    /// <summary>The forecast and what was asked besides; null without a forecast.</summary>
    public MediaPrediction? Prediction => Forecast is null ? null : new MediaPrediction
    {
        Forecast = Forecast,
        Permeabilities = AirPermeabilities,
        PressureDropLaws = PressureDropLaws,
        Classes = Classes,
        Challenges = Challenges,
        Bands = Bands,
        TotalInwardLeakage = TotalInwardLeakage,
    };

    /// <summary>Every field of every layer, in order.</summary>
    public IEnumerable<FieldFinding> Fields => Layers.SelectMany(layer => layer.Fields);
}
