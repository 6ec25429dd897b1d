using FiberScope.Filtration;

namespace FiberScope.Cli.Console;

/// <summary>Says forecasts in words.</summary>
internal static class ForecastText
{
    /// <summary>The forecast in one line.</summary>
    public static string OneLine(MediaForecast f) => FormattableString.Invariant(
        $"At {f.OperatingPoint.FaceVelocity.CentimetersPerSecond:G4} cm/s: pressure drop {f.PressureDrop.Pascals:G4} Pa, {WorstSize(f)}, quality factor {f.QualityFactorPerPascal:G4} 1/Pa.");

    /// <summary>Penetration at the most-penetrating size.</summary>
    public static string WorstSize(MediaForecast f) => f.MostPenetratingSize is { } size
        ? FormattableString.Invariant($"penetration {Percent(f.PenetrationAtMostPenetratingSize)} at the MPPS of {size.Micrometers:G3} µm")
        : FormattableString.Invariant($"no MPPS inside 10 nm to 2 µm, largest penetration {Percent(f.PenetrationAtMostPenetratingSize)}");

    /// <summary>A share in per cent, with digits that fit its size.</summary>
    public static string Percent(double share) => share is > 0 and < 1e-4
        ? FormattableString.Invariant($"{share * 100:0.0E0} %")
        : FormattableString.Invariant($"{share * 100:G3} %");

    /// <summary>A probability in per cent; never written as certain.</summary>
    public static string Chance(double probability) => probability switch
    {
        < 0.01 => "below 1 %",
        > 0.99 => "above 99 %",
        _ => FormattableString.Invariant($"{probability * 100:F0} %"),
    };
}
