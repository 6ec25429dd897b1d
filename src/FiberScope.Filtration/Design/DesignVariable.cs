using FiberScope.Fibres;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>What may change in a layer while a structure is sought, and how far.</summary>
public sealed record DesignVariable
{
    /// <summary>Makes a variable.</summary>
    /// <param name="kind">What changes.</param>
    /// <param name="layer">Index of the layer, from 0.</param>
    /// <param name="range">How far, in the SI unit of the kind: m, kg/m², C/m², or dimensionless.</param>
    /// <exception cref="ArgumentOutOfRangeException">The range is empty, or leaves what the kind allows.</exception>
    public DesignVariable(DesignKind kind, int layer, Interval range)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(layer);
        Require.Positive(range.Width, nameof(range));
        Require.NotNegative(range.Low, nameof(range));
        Kind = kind;
        Layer = layer;
        Range = range;
    }

    /// <summary>What changes.</summary>
    public DesignKind Kind { get; }

    /// <summary>Index of the layer, from 0.</summary>
    public int Layer { get; }

    /// <summary>How far, in the SI unit of the kind.</summary>
    public Interval Range { get; }

    /// <summary>A value between the ends: evenly spaced, in the logarithm where the range spans it.</summary>
    /// <param name="share">0 at the low end, 1 at the high end.</param>
    public double At(double share) => Range.Low > 0
        ? Range.Low * Math.Pow(Range.High / Range.Low, share)
        : Range.Low + (share * Range.Width);

    /// <summary>The layers with this variable at a value; what the change keeps is named at each kind.</summary>
    internal MediaLayer[] PutInto(MediaLayer[] layers, double value, Density fibreDensity)
    {
        if (Kind != DesignKind.WeightShare)
        {
            return [.. layers.Select((l, i) => i == Layer ? Put(l, value, fibreDensity) : l)];
        }

        var fibre = layers.Select(l => l.Solidity.Fraction * l.Thickness.Meters).ToArray();
        var (total, own) = (fibre.Sum(), fibre[Layer]);
        var others = total - own;
        return others <= 0
            ? layers
            : [.. layers.Select((l, i) => l with { Thickness = l.Thickness * (i == Layer ? value * total / own : (1 - value) * total / others) })];
    }

    private MediaLayer Put(MediaLayer layer, double value, Density fibreDensity) => Kind switch
    {
        DesignKind.MedianDiameter => layer with { Diameters = Scaled(layer.Diameters, value / Median(layer.Diameters)) },
        DesignKind.DiameterGsd => layer with { Diameters = DiameterDistribution.LogNormal(Length.FromMeters(Median(layer.Diameters)), Math.Max(1.0001, value)) },
        DesignKind.BasisWeight => layer with { Thickness = Length.FromMeters(value / (fibreDensity.KilogramsPerCubicMeter * layer.Solidity.Fraction)) },
        DesignKind.Solidity => layer with { Solidity = new Solidity(value), Thickness = layer.Thickness * (layer.Solidity.Fraction / value) },
        DesignKind.Charge => layer with { Charge = value > 0 ? new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(value), layer.Charge?.FibrePermittivity ?? 2.3) : null },
        _ => throw new ArgumentOutOfRangeException(nameof(value), Kind, "Unknown kind of design variable."),
    };

    private static DiameterDistribution Scaled(DiameterDistribution diameters, double factor) =>
        new(diameters.Classes.Select(c => c with { Diameter = c.Diameter * factor }));

    private static double Median(DiameterDistribution diameters)
    {
        var sum = 0.0;
        return diameters.Classes.First(c => (sum += c.LengthFraction) >= 0.5 - 1e-12).Diameter.Meters;
    }
}

/// <summary>What may change in a layer.</summary>
public enum DesignKind
{
    /// <summary>The median fibre diameter, m; the distribution keeps its shape, the layer its weight and solidity.</summary>
    MedianDiameter,

    /// <summary>The geometric standard deviation, dimensionless; the distribution becomes log-normal about its median.</summary>
    DiameterGsd,

    /// <summary>The basis weight, kg/m²; solidity is kept, thickness follows.</summary>
    BasisWeight,

    /// <summary>The solidity, dimensionless; basis weight is kept, thickness follows.</summary>
    Solidity,

    /// <summary>The fibre charge, C/m².</summary>
    Charge,

    /// <summary>The layer's share of the basis weight of all layers, dimensionless; their sum and every solidity are kept.</summary>
    WeightShare,
}
