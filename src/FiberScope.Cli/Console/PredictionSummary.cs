using FiberScope.Assessment;
using FiberScope.Filtration;

namespace FiberScope.Cli.Console;

/// <summary>A prediction on one screen.</summary>
internal static class PredictionSummary
{
    public static void Print(TextWriter output, MediaPrediction prediction)
    {
        output.WriteLine(ForecastText.OneLine(prediction.Forecast));
        foreach (var line in Lines(prediction))
        {
            output.WriteLine("  " + line);
        }
    }

    /// <summary>What stands beside the forecast itself, in an assessment too.</summary>
    public static IEnumerable<string> Asked(MediaPrediction prediction)
    {
        foreach (var c in prediction.Challenges)
        {
            var inward = c.TotalInwardLeakage is { } total ? $", total inward leakage {ForecastText.Percent(total)}" : "";
            yield return FormattableString.Invariant($"{c.Name} at {c.FaceVelocity.CentimetersPerSecond:G4} cm/s{(c.Discharged ? ", discharged" : "")}: {ForecastText.Percent(c.Result.Penetration)} passes ({Bands(c.Result)}){inward}");
        }

        foreach (var b in prediction.Bands)
        {
            yield return FormattableString.Invariant($"{b.From.Micrometers:G3} to {b.To.Micrometers:G3} µm: {ForecastText.Percent(b.Result.Penetration)} passes ({Bands(b.Result)})");
        }

        yield return Leak(prediction);
        if (Classes(prediction.Classes) is { Length: > 0 } classes)
        {
            yield return $"points to {classes}";
            yield return ClassForecast.Caution;
        }
    }

    private static IEnumerable<string> Lines(MediaPrediction prediction)
    {
        var forecast = prediction.Forecast;
        yield return Models(forecast);
        if (forecast.Uncertainty is { } open)
        {
            yield return FormattableString.Invariant($"inputs, 95 %: pressure drop {open.PressureDropPascals.Low:G3} to {open.PressureDropPascals.High:G3} Pa, penetration {ForecastText.Percent(open.PenetrationAtMostPenetratingSize.Low)} to {ForecastText.Percent(open.PenetrationAtMostPenetratingSize.High)}");
            if (open.Ranking.MaxBy(r => r.PenetrationShare) is { } first)
            {
                var layer = first.Layer is { } number ? FormattableString.Invariant($" of layer {number}") : "";
                yield return FormattableString.Invariant($"measure better next: {first.Input.Replace('-', ' ')}{layer}, {first.PenetrationShare * 100:F0} % of the variance of ln P");
            }
        }

        yield return "air permeability " + string.Join(", ", prediction.Permeabilities.Select(p => FormattableString.Invariant($"{p.FaceVelocity.MillimetersPerSecond:G4} mm/s at {p.PressureDrop.Pascals:G4} Pa")));
        foreach (var line in Asked(prediction))
        {
            yield return line;
        }
    }

    private static string Models(MediaForecast f)
    {
        var drop = f.PressureDropModelBandPascals is { } p ? FormattableString.Invariant($"pressure drop {p.Low:G3} to {p.High:G3} Pa") : "";
        var worst = f.PenetrationAtMostPenetratingSizeModelBand is { } w ? $", penetration {ForecastText.Percent(w.Low)} to {ForecastText.Percent(w.High)}" : "";
        return $"models: {drop}{worst}";
    }

    private static string Bands(ChallengeResult r)
    {
        var models = $"models {ForecastText.Percent(r.ModelBand.Low)} to {ForecastText.Percent(r.ModelBand.High)}";
        return r.MeasurementBand is { } band ? $"inputs {ForecastText.Percent(band.Low)} to {ForecastText.Percent(band.High)}, {models}" : models;
    }

    private static string Leak(MediaPrediction prediction)
    {
        var forecast = prediction.Forecast;
        string[] parts =
        [
            forecast.LeakShareThatHalvesProtection < 1
                ? $"a leak of {ForecastText.Percent(forecast.LeakShareThatHalvesProtection)} of the air halves the protection"
                : "lets through so much that no leak can halve its protection",
            .. forecast.EdgeLeakShare > 0 ? [$"{ForecastText.Percent(forecast.EdgeLeakShare)} of the air goes past the edge"] : Array.Empty<string>(),
            .. prediction.TotalInwardLeakage is { } inward ? [$"total inward leakage at the MPPS {ForecastText.Percent(inward)}"] : Array.Empty<string>(),
        ];
        return string.Join("; ", parts);
    }

    private static string Classes(IEnumerable<ClassForecast> classes) =>
        string.Join(", ", classes.Where(c => c.Class is not null).Select(c => FormattableString.Invariant($"{c.Standard} {c.Class} ({ForecastText.Chance(c.Probability)})")));
}
