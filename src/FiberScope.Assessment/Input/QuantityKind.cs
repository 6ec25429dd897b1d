using System.Collections.Frozen;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using UnitsNet;
using UnitsNet.Units;

namespace FiberScope.Assessment.Input;

/// <summary>A kind of quantity that files may hold: what it is called, an example, and the spellings of its units.</summary>
internal sealed class QuantityKind<T>
    where T : struct, IQuantity
{
    private readonly FrozenDictionary<string, Enum> _spellings;

    public QuantityKind(string name, string example, Type unitType, params (string Spelling, Enum Unit)[] spellings)
    {
        Name = name;
        Example = example;
        UnitType = unitType;
        _spellings = spellings.ToFrozenDictionary(s => s.Spelling, s => s.Unit, StringComparer.Ordinal);
    }

    /// <summary>With its article: <c>a length</c>.</summary>
    public string Name { get; }

    public string Example { get; }

    /// <summary>A range in the unit of the example.</summary>
    public string RangeExample => "1" + Unit + " to 40" + Unit;

    private string Unit => Example[Example.IndexOf(' ', StringComparison.Ordinal)..];

    /// <summary>Multiples of units that the units library does not know, by their normalised spelling.</summary>
    public FrozenDictionary<string, (double Factor, Enum Unit)> Multiples { get; init; } = FrozenDictionary<string, (double, Enum)>.Empty;

    private Type UnitType { get; }

    /// <summary>The quantity of a number and a unit; false when the unit is not one of this kind.</summary>
    public bool TryMake(double number, string unit, out T quantity)
    {
        if (Multiples.TryGetValue(UnitSpelling.Normalise(unit), out var multiple))
        {
            quantity = (T)Quantity.From(number * multiple.Factor, multiple.Unit);
            return true;
        }

        if (!TryUnit(unit, out var found))
        {
            quantity = default;
            return false;
        }

        quantity = (T)Quantity.From(number, found);
        return true;
    }

    private bool TryUnit(string unit, [NotNullWhen(true)] out Enum? found) =>
        _spellings.TryGetValue(unit, out found)
        || UnitParser.Default.TryParse(UnitSpelling.Normalise(unit), UnitType, CultureInfo.InvariantCulture, out found);
}

/// <summary>The kinds that files use, with the trade's spellings where the units library has none.</summary>
internal static class Kinds
{
    public static readonly QuantityKind<Length> Length = new(
        "a length", "24.8 nm", typeof(LengthUnit),
        ("micron", LengthUnit.Micrometer), ("microns", LengthUnit.Micrometer), ("A", LengthUnit.Angstrom));

    public static readonly QuantityKind<AreaDensity> BasisWeight = new(
        "a mass per area", "25 g/m2", typeof(AreaDensityUnit),
        ("gsm", AreaDensityUnit.GramPerSquareMeter), ("GSM", AreaDensityUnit.GramPerSquareMeter));

    public static readonly QuantityKind<Density> Density = new("a density", "0.905 g/cm3", typeof(DensityUnit), ("g/cc", DensityUnit.GramPerCubicCentimeter));

    public static readonly QuantityKind<Speed> Speed = new(
        "a velocity", "5.3 cm/s", typeof(SpeedUnit),
        ("fpm", SpeedUnit.FootPerMinute), ("ft/min", SpeedUnit.FootPerMinute));

    public static readonly QuantityKind<Pressure> Pressure = new(
        "a pressure", "41 Pa", typeof(PressureUnit),
        ("mmH2O", PressureUnit.MillimeterOfWaterColumn), ("mm H2O", PressureUnit.MillimeterOfWaterColumn), ("mmWC", PressureUnit.MillimeterOfWaterColumn),
        ("mmH₂O", PressureUnit.MillimeterOfWaterColumn), ("inH2O", PressureUnit.InchOfWaterColumn), ("in H2O", PressureUnit.InchOfWaterColumn),
        ("inWC", PressureUnit.InchOfWaterColumn));

    public static readonly QuantityKind<Temperature> Temperature = new(
        "a temperature", "23 C", typeof(TemperatureUnit),
        ("C", TemperatureUnit.DegreeCelsius), ("degC", TemperatureUnit.DegreeCelsius),
        ("F", TemperatureUnit.DegreeFahrenheit), ("degF", TemperatureUnit.DegreeFahrenheit));

    public static readonly QuantityKind<TemperatureDelta> TemperatureDifference = new(
        "a temperature difference", "1 K", typeof(TemperatureDeltaUnit),
        ("C", TemperatureDeltaUnit.DegreeCelsius), ("°C", TemperatureDeltaUnit.DegreeCelsius), ("degC", TemperatureDeltaUnit.DegreeCelsius), ("K", TemperatureDeltaUnit.Kelvin),
        ("F", TemperatureDeltaUnit.DegreeFahrenheit), ("°F", TemperatureDeltaUnit.DegreeFahrenheit), ("degF", TemperatureDeltaUnit.DegreeFahrenheit));

    /// <summary>The units library knows no multiples of C/m² that people use; 1 nC/cm² is 10 µC/m².</summary>
    public static readonly QuantityKind<ElectricSurfaceChargeDensity> SurfaceCharge = new(
        "a charge per fibre surface", "40 uC/m2", typeof(ElectricSurfaceChargeDensityUnit))
    {
        Multiples = new Dictionary<string, (double, Enum)>(StringComparer.Ordinal)
        {
            ["µC/m²"] = (1e-6, ElectricSurfaceChargeDensityUnit.CoulombPerSquareMeter),
            ["nC/m²"] = (1e-9, ElectricSurfaceChargeDensityUnit.CoulombPerSquareMeter),
            ["mC/m²"] = (1e-3, ElectricSurfaceChargeDensityUnit.CoulombPerSquareMeter),
            ["nC/cm²"] = (1e-5, ElectricSurfaceChargeDensityUnit.CoulombPerSquareMeter),
        }.ToFrozenDictionary(StringComparer.Ordinal),
    };

    public static readonly QuantityKind<VolumeFlow> Flow = new(
        "a flow", "95 l/min", typeof(VolumeFlowUnit),
        ("lpm", VolumeFlowUnit.LiterPerMinute), ("LPM", VolumeFlowUnit.LiterPerMinute), ("l/min", VolumeFlowUnit.LiterPerMinute),
        ("L/min", VolumeFlowUnit.LiterPerMinute), ("cfm", VolumeFlowUnit.CubicFootPerMinute), ("m3/h", VolumeFlowUnit.CubicMeterPerHour));

    public static readonly QuantityKind<Area> Area = new("an area", "100 cm2", typeof(AreaUnit));

    public static readonly QuantityKind<Speed> AirPermeability = new(
        "an air permeability", "120 mm/s", typeof(SpeedUnit),
        ("l/m2/s", SpeedUnit.MillimeterPerSecond), ("l/(m2 s)", SpeedUnit.MillimeterPerSecond), ("L/m2/s", SpeedUnit.MillimeterPerSecond),
        ("cfm", SpeedUnit.FootPerMinute), ("cfm/ft2", SpeedUnit.FootPerMinute), ("ft3/min/ft2", SpeedUnit.FootPerMinute));

    public static readonly QuantityKind<Compressibility> QualityFactor = new(
        "a quality factor", "0.02 1/Pa", typeof(CompressibilityUnit),
        ("1/Pa", CompressibilityUnit.InversePascal), ("/Pa", CompressibilityUnit.InversePascal), ("1/kPa", CompressibilityUnit.InverseKilopascal));

    public static readonly QuantityKind<ReciprocalArea> CountPerArea = new(
        "a count per area", "5 per mm2", typeof(ReciprocalAreaUnit),
        ("per mm2", ReciprocalAreaUnit.InverseSquareMillimeter), ("per mm²", ReciprocalAreaUnit.InverseSquareMillimeter), ("1/mm2", ReciprocalAreaUnit.InverseSquareMillimeter),
        ("/mm2", ReciprocalAreaUnit.InverseSquareMillimeter), ("per cm2", ReciprocalAreaUnit.InverseSquareCentimeter), ("per m2", ReciprocalAreaUnit.InverseSquareMeter));

    /// <summary>What a unit measures when it is not the one wanted: <c>a mass</c>; null when no library knows it.</summary>
    public static string? Describe(string unit)
    {
        var spelling = UnitSpelling.Normalise(unit);
        var preferred = new[] { nameof(UnitsNet.Length), nameof(Mass), nameof(Duration), nameof(UnitsNet.Pressure), nameof(UnitsNet.Speed), nameof(UnitsNet.Density), nameof(AreaDensity), nameof(UnitsNet.Temperature), nameof(UnitsNet.Area), nameof(Volume) };
        var info = Quantity.Infos
            .OrderBy(i => Array.IndexOf(preferred, i.Name) is var rank && rank < 0 ? int.MaxValue : rank)
            .FirstOrDefault(i => UnitParser.Default.TryParse(spelling, i.UnitType, CultureInfo.InvariantCulture, out _));
        return info is null ? null : "a " + Words(info.Name);
    }

    private static string Words(string name) =>
        string.Concat(name.Select((c, i) => char.IsUpper(c) ? (i > 0 ? " " : "") + char.ToLowerInvariant(c) : c.ToString()));
}
