using System.Globalization;
using FiberScope.Fibres;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Reports.Html;

/// <summary>Numbers as people read them, the same in every culture.</summary>
internal static class Wording
{
    /// <summary>A whole number.</summary>
    public static string Count(int value) => value.ToString(CultureInfo.InvariantCulture);

    /// <summary>A number and its noun: <c>1 field</c>, <c>5 fields</c>.</summary>
    public static string Count(int value, string noun) => $"{Count(value)} {noun}{(value == 1 ? "" : "s")}";

    /// <summary>A number to three significant digits unless told otherwise, with a power of ten where it is very small or large.</summary>
    public static string Number(double value, int digits = 3)
    {
        if (value == 0 || !double.IsFinite(value))
        {
            return value == 0 ? "0" : double.IsNaN(value) ? "–" : value > 0 ? "∞" : "−∞";
        }

        var exponent = (int)Math.Floor(Math.Log10(Math.Abs(value)));
        if (exponent is < -3 or > 5)
        {
            var mantissa = value / Math.Pow(10, exponent);
            return $"{Fixed(mantissa, digits - 1)}×10{Superscript(exponent)}";
        }

        return Fixed(value, Math.Max(0, digits - 1 - exponent));
    }

    /// <summary>A number as someone told it: up to four significant digits, no zeros to fill up.</summary>
    public static string Told(double value, int digits = 4)
    {
        var text = Number(value, digits);
        return text.Contains('×', StringComparison.Ordinal) || !text.Contains('.', StringComparison.Ordinal) ? text : text.TrimEnd('0').TrimEnd('.');
    }

    /// <summary>A number with a fixed number of decimals and a true minus sign.</summary>
    public static string Fixed(double value, int decimals) =>
        value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture).Replace('-', '−');

    /// <summary>A share as a percentage: <c>2.35 %</c>.</summary>
    public static string Percent(double share, int digits = 3) => $"{PerHundred(share, digits)} %";

    /// <summary>The efficiency beside a penetration, with as many nines as it takes: <c>99.9986 %</c>.</summary>
    public static string Efficiency(double penetration) => penetration < 1e-8
        ? "above 99.999999 %"
        : $"{Fixed(100 * (1 - penetration), Math.Clamp((int)Math.Ceiling(-Math.Log10(100 * penetration)) + 1, 1, 8))} %";

    /// <summary>A range of shares as percentages.</summary>
    public static string Percent(Interval shares, int digits = 3) => $"{PerHundred(shares.Low, digits)} to {PerHundred(shares.High, digits)} %";

    /// <summary>A probability, blunt at both ends: <c>below 0.1 %</c>.</summary>
    public static string Probability(double share) => share switch
    {
        < 0.001 => "below 0.1 %",
        > 0.999 => "above 99.9 %",
        < 0.1 => $"{Fixed(share * 100, 1)} %",
        _ => $"{Fixed(share * 100, 0)} %",
    };

    /// <summary>A pressure: <c>41.2 Pa</c>.</summary>
    public static string Of(Pressure pressure) => $"{Number(pressure.Pascals)} Pa";

    /// <summary>A velocity: <c>5.3 cm/s</c>.</summary>
    public static string Of(Speed speed) => $"{Told(speed.CentimetersPerSecond)} cm/s";

    /// <summary>A basis weight: <c>25 g/m²</c>.</summary>
    public static string Of(AreaDensity weight) => $"{Told(weight.GramsPerSquareMeter)} g/m²";

    /// <summary>A density: <c>905 kg/m³</c>.</summary>
    public static string Of(Density density) => $"{Told(density.KilogramsPerCubicMeter)} kg/m³";

    /// <summary>A length in the unit that suits its size: nm below 1 µm, µm, mm from 1 mm.</summary>
    public static string Of(Length length) => length.Meters switch
    {
        < 1e-6 => $"{Number(length.Nanometers)} nm",
        < 1e-3 => $"{Number(length.Micrometers)} µm",
        _ => $"{Number(length.Millimeters)} mm",
    };

    /// <summary>A particle diameter, always in micrometres: <c>0.3 µm</c>.</summary>
    public static string Particle(Length length) => $"{Number(length.Micrometers, 2)} µm";

    /// <summary>A thickness, in millimetres from a tenth of one: <c>0.35 mm</c>.</summary>
    public static string Thickness(Length length) => length.Millimeters >= 0.1 ? $"{Told(length.Millimeters)} mm" : $"{Told(length.Micrometers)} µm";

    /// <summary>A moment, to the minute, in UTC.</summary>
    public static string Of(DateTimeOffset moment) => moment.UtcDateTime.ToString("yyyy-MM-dd HH:mm 'UTC'", CultureInfo.InvariantCulture);

    /// <summary>A program's name and version with its source revision cut to eight digits.</summary>
    public static string Software(string software)
    {
        const int Digits = 8;
        var plus = software.IndexOf('+', StringComparison.Ordinal);
        return plus >= 0 && software.Length > plus + 1 + Digits ? software[..(plus + 1 + Digits)] : software;
    }

    /// <summary>How a solidity was found, in words.</summary>
    public static string Of(SolidityRoute route) => route switch
    {
        SolidityRoute.Weighing => "by weighing",
        SolidityRoute.CrossSection => "from cross-sections",
        SolidityRoute.Coverage => "from the coverage of a thin layer",
        SolidityRoute.PressureDrop => "from a measured pressure drop",
        SolidityRoute.TopView => "usual for fibre media",
        _ => "as stated",
    };

    /// <summary>A name with hyphens or underscores as words: <c>one-edge-hidden</c> becomes <c>one edge hidden</c>.</summary>
    public static string Words(string name) => name.Replace('-', ' ').Replace('_', ' ');

    /// <summary>Penetrations that no rig can count are cut off: one particle in a hundred million.</summary>
    private static string PerHundred(double share, int digits) => share is > 0 and < 1e-8 ? "<10⁻⁶" : Number(share * 100, digits);

    private static string Superscript(int exponent) => string.Concat(
        exponent.ToString(CultureInfo.InvariantCulture).Select(c => c == '-' ? '⁻' : "⁰¹²³⁴⁵⁶⁷⁸⁹"[c - '0']));
}
