using System.Collections.Immutable;
using System.Globalization;
using UnitsNet;
using UnitsNet.Units;

namespace FiberScope.Conformity;

/// <summary>A property of a swatch that a grade can limit, and the unit in which people read it.</summary>
/// <remarks>
/// Pure numbers are <see cref="Ratio"/>; a quality factor (1/Pa) is a <see cref="Compressibility"/> and a count per area a
/// <see cref="ReciprocalArea"/>, the quantity types of the same dimension.
/// </remarks>
public sealed record Characteristic
{
    private Characteristic(string key, string name, Enum unit, string unitText, bool isForecast = false)
    {
        Key = key;
        Name = name;
        Unit = unit;
        UnitText = unitText;
        IsForecast = isForecast;
    }

    /// <summary>The mean fibre diameter, length-weighted.</summary>
    public static Characteristic MeanDiameter { get; } = new("mean_diameter", "mean fibre diameter (length-weighted)", LengthUnit.Micrometer, "µm");

    /// <summary>The mean fibre diameter, number-weighted.</summary>
    public static Characteristic NumberMeanDiameter { get; } = new("number_mean_diameter", "mean fibre diameter (number-weighted)", LengthUnit.Micrometer, "µm");

    /// <summary>The diameter below which a tenth of the fibre length lies.</summary>
    public static Characteristic D10 { get; } = new("d10", "fibre diameter D10 (length-weighted)", LengthUnit.Micrometer, "µm");

    /// <summary>The median fibre diameter, length-weighted.</summary>
    public static Characteristic D50 { get; } = new("d50", "fibre diameter D50 (length-weighted)", LengthUnit.Micrometer, "µm");

    /// <summary>The diameter below which nine tenths of the fibre length lie.</summary>
    public static Characteristic D90 { get; } = new("d90", "fibre diameter D90 (length-weighted)", LengthUnit.Micrometer, "µm");

    /// <summary>The coefficient of variation of the fibre diameter, length-weighted.</summary>
    public static Characteristic DiameterVariation { get; } = new("diameter_cv", "CV of the fibre diameter (length-weighted)", RatioUnit.Percent, "%");

    /// <summary>The geometric standard deviation of the fibre diameter, length-weighted.</summary>
    public static Characteristic DiameterGsd { get; } = new("diameter_gsd", "GSD of the fibre diameter (length-weighted)", RatioUnit.DecimalFraction, "");

    /// <summary>Solidity.</summary>
    public static Characteristic Solidity { get; } = new("solidity", "solidity", RatioUnit.DecimalFraction, "");

    /// <summary>Mass per area.</summary>
    public static Characteristic BasisWeight { get; } = new("basis_weight", "basis weight", AreaDensityUnit.GramPerSquareMeter, "g/m²");

    /// <summary>Thickness.</summary>
    public static Characteristic Thickness { get; } = new("thickness", "thickness", LengthUnit.Millimeter, "mm");

    /// <summary>Defects of every kind, count per area.</summary>
    public static Characteristic DefectCount { get; } = new("defect_count", "defects per area", ReciprocalAreaUnit.InverseSquareMillimeter, "per mm²");

    /// <summary>Shot and beads, count per area.</summary>
    public static Characteristic ShotCount { get; } = new("shot_count", "shot per area", ReciprocalAreaUnit.InverseSquareMillimeter, "per mm²");

    /// <summary>The share of the area that defects cover.</summary>
    public static Characteristic DefectArea { get; } = new("defect_area", "area share of defects", RatioUnit.Percent, "%");

    /// <summary>The largest opening between fibres.</summary>
    public static Characteristic LargestOpening { get; } = new("largest_opening", "largest opening", LengthUnit.Micrometer, "µm");

    /// <summary>Penetration at the most-penetrating size, by the model.</summary>
    public static Characteristic PenetrationAtMpps { get; } = new("penetration_at_mpps", "penetration at the MPPS", RatioUnit.Percent, "%", isForecast: true);

    /// <summary>Penetration at a stated particle size, by the model.</summary>
    public static Characteristic PenetrationAtSize { get; } = new("penetration", "penetration", RatioUnit.Percent, "%", isForecast: true);

    /// <summary>The most-penetrating particle size, by the model.</summary>
    public static Characteristic MostPenetratingSize { get; } = new("mpps", "most-penetrating particle size", LengthUnit.Micrometer, "µm", isForecast: true);

    /// <summary>Pressure drop at the swatch's face velocity, by the model.</summary>
    public static Characteristic PressureDrop { get; } = new("pressure_drop", "pressure drop", PressureUnit.Pascal, "Pa", isForecast: true);

    /// <summary>Air permeability at a stated pressure drop, by the model.</summary>
    public static Characteristic AirPermeability { get; } = new("air_permeability", "air permeability", SpeedUnit.MillimeterPerSecond, "mm/s", isForecast: true);

    /// <summary>The quality factor at the most-penetrating size, by the model.</summary>
    public static Characteristic QualityFactor { get; } = new("quality_factor", "quality factor at the MPPS", CompressibilityUnit.InversePascal, "1/Pa", isForecast: true);

    /// <summary>Every characteristic that a grade can limit.</summary>
    public static ImmutableArray<Characteristic> Known { get; } =
    [
        MeanDiameter, NumberMeanDiameter, D10, D50, D90, DiameterVariation, DiameterGsd, Solidity, BasisWeight, Thickness,
        DefectCount, ShotCount, DefectArea, LargestOpening,
        PenetrationAtMpps, PenetrationAtSize, MostPenetratingSize, PressureDrop, AirPermeability, QualityFactor,
    ];

    /// <summary>The short name that files use: <c>mean_diameter</c>.</summary>
    public string Key { get; }

    /// <summary>What people call it, with its weighting where it has one.</summary>
    public string Name { get; }

    /// <summary>The unit in which people read it; its type tells the kind of quantity.</summary>
    public Enum Unit { get; }

    /// <summary>The unit as printed after the number; empty for a pure number.</summary>
    public string UnitText { get; }

    /// <summary>Whether its value comes from the filtration model and not from a measurement of the swatch.</summary>
    public bool IsForecast { get; }

    /// <summary>The characteristic with a short name; null when there is none.</summary>
    public static Characteristic? Find(string key) => Known.FirstOrDefault(c => string.Equals(c.Key, key, StringComparison.Ordinal));

    /// <summary>The number of <see cref="Unit"/>s in a quantity.</summary>
    /// <exception cref="ArgumentException">The quantity is of another kind.</exception>
    public double In(IQuantity quantity) => Accepts(quantity)
        ? (double)quantity.As(Unit)
        : throw new ArgumentException(FormattableString.Invariant($"The {Name} is not a {quantity.QuantityInfo.Name}."), nameof(quantity));

    /// <summary>Whether a quantity is of this characteristic's kind.</summary>
    public bool Accepts(IQuantity quantity) => quantity.QuantityInfo.UnitType == Unit.GetType();

    /// <summary>A quantity from a number of <see cref="Unit"/>s.</summary>
    public IQuantity Of(double number) => Quantity.From(number, Unit);

    /// <summary>A value for people, four significant digits and the unit, the same in every culture: <c>1.834 µm</c>.</summary>
    public string Format(IQuantity quantity) => Format(quantity, "G4");

    /// <summary>An uncertainty for people, two significant digits and the unit.</summary>
    public string FormatUncertainty(IQuantity quantity) => Format(quantity, "G2");

    private string Format(IQuantity quantity, string digits)
    {
        var number = In(quantity);
        var text = number == 0 || (Math.Abs(number) >= 1e-3 && Math.Abs(number) < 1e5)
            ? ((decimal)number).ToString(digits, CultureInfo.InvariantCulture)
            : number.ToString("0.###E0", CultureInfo.InvariantCulture);
        return UnitText.Length == 0 ? text : $"{text} {UnitText}";
    }
}
