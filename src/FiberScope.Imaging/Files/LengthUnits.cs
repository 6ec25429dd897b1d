namespace FiberScope.Imaging.Files;

/// <summary>The unit names that files use for lengths.</summary>
internal static class LengthUnits
{
    /// <summary>Alternatives for a regular expression, longest first.</summary>
    public const string Pattern = "nanomet(?:er|re)s?|micromet(?:er|re)s?|millimet(?:er|re)s?|microns?|met(?:er|re)s?|inch(?:es)?|\\\\u00B5m|nm|um|µm|μm|mm|cm|pm|Å|m";

    /// <summary>Metres in one such unit; null when the name is not a unit of length.</summary>
    public static double? MetresPer(string unit) => unit.Trim().ToUpperInvariant() switch
    {
        "PM" => 1e-12,
        "Å" or "ANGSTROM" => 1e-10,
        "NM" or "NANOMETER" or "NANOMETRE" or "NANOMETERS" or "NANOMETRES" => 1e-9,
        // The Greek mu, the micro sign (its capital is the Greek capital mu) and the escaped micro sign.
        "UM" or "ΜM" or "µM" or "\\U00B5M" or "MICRON" or "MICRONS" or "MICROMETER" or "MICROMETRE" or "MICROMETERS" or "MICROMETRES" => 1e-6,
        "MM" or "MILLIMETER" or "MILLIMETRE" or "MILLIMETERS" or "MILLIMETRES" => 1e-3,
        "CM" => 1e-2,
        "IN" or "INCH" or "INCHES" => 0.0254,
        "M" or "METER" or "METRE" or "METERS" or "METRES" => 1,
        _ => null,
    };
}
