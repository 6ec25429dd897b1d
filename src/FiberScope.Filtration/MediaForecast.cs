using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>What a rig would show for a medium, by the model.</summary>
public sealed record MediaForecast
{
    /// <summary>The correlation set that the central values come from.</summary>
    public required CorrelationSet Correlations { get; init; }

    /// <summary>The operating point of the forecast.</summary>
    public required OperatingPoint OperatingPoint { get; init; }

    /// <summary>Pressure drop across all layers.</summary>
    public required Pressure PressureDrop { get; init; }

    /// <summary>Lowest and highest pressure drop by the published sets, Pa.</summary>
    public Interval? PressureDropModelBandPascals { get; init; }

    /// <summary>Penetration against particle size, smallest particle first.</summary>
    public required ImmutableArray<CurvePoint> Curve { get; init; }

    /// <summary>The most-penetrating particle size; null when penetration has no maximum inside 10 nm to 2 µm.</summary>
    public required Length? MostPenetratingSize { get; init; }

    /// <summary>Penetration at the most-penetrating size; the curve's largest where there is none. Dimensionless, 0 to 1.</summary>
    public required double PenetrationAtMostPenetratingSize { get; init; }

    /// <summary>Quality factor −ln P / Δp at the most-penetrating size; 1/Pa.</summary>
    public required double QualityFactorPerPascal { get; init; }

    /// <summary>Lowest and highest most-penetrating size by the published sets; null where a set has none.</summary>
    public LengthInterval? MostPenetratingSizeModelBand { get; init; }

    /// <summary>Lowest and highest penetration at each set's own most-penetrating size, by the published sets; dimensionless.</summary>
    public Interval? PenetrationAtMostPenetratingSizeModelBand { get; init; }

    /// <summary>What the uncertain inputs leave open; null when no uncertainties were given.</summary>
    public MeasurementUncertainty? Uncertainty { get; init; }

    /// <summary>
    /// The share of the air past the medium that would double the penetration at the most-penetrating size, and so halve protection;
    /// dimensionless, at most 1.
    /// </summary>
    public double LeakShareThatHalvesProtection => Leakage.HalvingShare(PenetrationAtMostPenetratingSize);

    /// <summary>Share of the air that goes past the medium at its edge; dimensionless, zero without a gap.</summary>
    public double EdgeLeakShare { get; init; }

    /// <summary>Share of each layer's air that goes through its holes; dimensionless, in the order of the layers.</summary>
    public ImmutableArray<double> HoleShares { get; init; } = [];

    /// <summary>What a reader must know: ranges left, models that do not apply.</summary>
    public required ImmutableArray<Caveat> Caveats { get; init; }
}
