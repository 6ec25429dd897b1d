using FiberScope.Assessment;
using FiberScope.Conformity;
using FiberScope.Fibres;
using FiberScope.Filtration;
using Spectre.Console;
using UnitsNet;

namespace FiberScope.Cli.Console;

/// <summary>An assessment on one screen.</summary>
internal static class AssessmentSummary
{
    private const int MostNotes = 6;

    public static void Print(IAnsiConsole console, SwatchAssessment assessment)
    {
        console.MarkupLine($"[bold]{Markup.Escape(assessment.Identity.Title)}[/]");
        foreach (var layer in assessment.Layers)
        {
            console.Write(Layer(layer, assessment.Layers.Length > 1));
        }

        if (assessment.Forecast is { } forecast)
        {
            console.Write(Forecast(forecast, assessment));
            foreach (var line in PredictionSummary.Asked(assessment.Prediction!))
            {
                console.WriteLine("  " + line);
            }
        }

        if (assessment.Verdict is { } verdict)
        {
            Verdict(console, verdict);
        }

        Notes(console, assessment);
    }

    private static Table Layer(LayerFinding layer, bool named)
    {
        var survey = layer.Survey;
        var (l, n) = (survey.LengthWeighted, survey.NumberWeighted);
        var table = Plain();
        table.AddColumn(new TableColumn(named ? Markup.Escape(layer.Name) : "Fibre diameter, µm"));
        table.AddColumn(new TableColumn("length-weighted").RightAligned());
        table.AddColumn(new TableColumn("number-weighted").RightAligned());
        Row(table, "mean (95 % interval)", WithInterval(l.Mean, survey.MeanInterval95), WithInterval(n.Mean, survey.NumberMeanInterval95));
        Row(table, "SD, CV", Spread(l), Spread(n));
        Row(table, "geometric mean, GSD", Geometric(l), Geometric(n));
        Row(table, "D10 / D50 / D90", Percentiles(l), Percentiles(n));
        var used = layer.Fields.Count(f => f.IsIncluded);
        Row(table, "rests on", FormattableString.Invariant($"{survey.Readings.Length} readings, {survey.FibreCount} fibres"), FormattableString.Invariant($"{used} of {layer.Fields.Length} fields"));
        if (layer.Solidity is { } solidity)
        {
            var interval = solidity.Combined.Interval95;
            Row(table, "solidity (95 % interval)", FormattableString.Invariant($"{solidity.Combined.Value.Fraction:F4} ({interval.Low:F4} to {interval.High:F4})"), "by " + string.Join(", ", solidity.Routes.Select(Route)));
        }

        return table;
    }

    private static Table Forecast(MediaForecast forecast, SwatchAssessment assessment)
    {
        var table = Plain();
        table.AddColumn(FormattableString.Invariant($"Forecast at {forecast.OperatingPoint.FaceVelocity.CentimetersPerSecond:G4} cm/s"));
        table.AddColumn(new TableColumn("").RightAligned());
        table.AddColumn("");
        Row(table, "pressure drop", FormattableString.Invariant($"{forecast.PressureDrop.Pascals:G4} Pa"), forecast.PressureDropModelBandPascals is { } band ? FormattableString.Invariant($"models {band.Low:G4} to {band.High:G4} Pa") : "");
        Row(table, "penetration", ForecastText.Percent(forecast.PenetrationAtMostPenetratingSize), Worst(forecast));
        Row(table, "quality factor there", FormattableString.Invariant($"{forecast.QualityFactorPerPascal:G3} 1/Pa"), "");
        Row(table, "air permeability", string.Join(", ", assessment.AirPermeabilities.Select(p => FormattableString.Invariant($"{p.FaceVelocity.MillimetersPerSecond:G4} mm/s"))), "at " + string.Join(" and ", assessment.AirPermeabilities.Select(p => FormattableString.Invariant($"{p.PressureDrop.Pascals:G4} Pa"))));
        foreach (var rig in assessment.RigPoints.Where(r => r.ForecastPressureDrop is not null))
        {
            Row(table, "rig measured", FormattableString.Invariant($"{rig.PressureDrop!.Value.Pascals:G4} Pa"), FormattableString.Invariant($"forecast {rig.ForecastPressureDrop!.Value.Pascals:G4} Pa at {rig.FaceVelocity.CentimetersPerSecond:G4} cm/s{(rig.EffectiveDiameter is { } d ? FormattableString.Invariant($"; stands for fibres of {d.Micrometers:G3} µm") : "")}"));
        }

        foreach (var rig in assessment.RigPoints.Where(r => r.ForecastPenetration is not null))
        {
            Row(table, "rig measured", ForecastText.Percent(rig.Penetration!.Value), FormattableString.Invariant($"forecast {ForecastText.Percent(rig.ForecastPenetration!.Value)} at {rig.Particle!.Value.Micrometers:G3} µm"));
        }

        return table;
    }

    private static string Worst(MediaForecast forecast)
    {
        var point = forecast.MostPenetratingSize is { } size
            ? forecast.Curve.MinBy(p => Math.Abs((p.Particle - size).Meters))!
            : forecast.Curve.MaxBy(p => p.Penetration)!;
        var band = $"models {ForecastText.Percent(point.ModelBand.Low)} to {ForecastText.Percent(point.ModelBand.High)}";
        return forecast.MostPenetratingSize is { } mpps
            ? FormattableString.Invariant($"at the MPPS, {mpps.Micrometers:G3} µm; {band}")
            : FormattableString.Invariant($"largest, at {point.Particle.Micrometers:G3} µm (no MPPS inside 10 nm to 2 µm); {band}");
    }

    private static void Verdict(IAnsiConsole console, GradeVerdict verdict)
    {
        var style = verdict.Decision switch { Decision.Pass => "green", Decision.Fail => "red", _ => "yellow" };
        console.MarkupLine($"[{style}]{Markup.Escape(verdict.Sentence)}[/]");
        foreach (var limit in verdict.Verdicts)
        {
            console.WriteLine("  " + limit.Sentence);
        }
    }

    private static void Notes(IAnsiConsole console, SwatchAssessment assessment)
    {
        foreach (var caveat in assessment.Caveats.Take(MostNotes))
        {
            console.WriteLine("Note: " + caveat.Message);
        }

        if (assessment.Caveats.Length > MostNotes)
        {
            console.WriteLine(FormattableString.Invariant($"Note: {assessment.Caveats.Length - MostNotes} more in assessment.json."));
        }

        if (assessment.Forecast is not null)
        {
            console.MarkupLine($"[italic]{Markup.Escape(Cautions.All[0])}[/]");
        }
    }

    private static Table Plain() => new Table().Border(TableBorder.None).ShowHeaders();

    private static void Row(Table table, params string[] cells) => table.AddRow([.. cells.Select(c => new Text(c))]);

    private static string WithInterval(Length value, LengthInterval interval) =>
        FormattableString.Invariant($"{value.Micrometers:G4} ({interval.Low.Micrometers:G4} to {interval.High.Micrometers:G4})");

    private static string Spread(DiameterStatistics s) => FormattableString.Invariant($"{s.StandardDeviation.Micrometers:G4}, {s.CoefficientOfVariation * 100:F0} %");

    private static string Geometric(DiameterStatistics s) => FormattableString.Invariant($"{s.GeometricMean.Micrometers:G4}, {s.GeometricStandardDeviation:F2}");

    private static string Percentiles(DiameterStatistics s) => FormattableString.Invariant($"{s.D10.Micrometers:G4} / {s.D50.Micrometers:G4} / {s.D90.Micrometers:G4}");

    private static string Route(SolidityEstimate route) => route.Route switch
    {
        SolidityRoute.Weighing => "weighing",
        SolidityRoute.CrossSection => "cross-section",
        SolidityRoute.Coverage => "coverage",
        SolidityRoute.PressureDrop => "pressure drop",
        SolidityRoute.TopView => "top view",
        _ => "statement",
    };
}
