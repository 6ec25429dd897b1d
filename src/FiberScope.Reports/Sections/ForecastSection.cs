using FiberScope.Assessment;
using FiberScope.Fibres;
using FiberScope.Filtration;
using FiberScope.Reports.Figures;
using FiberScope.Reports.Html;
using FiberScope.Statistics;

namespace FiberScope.Reports.Sections;

/// <summary>What to expect on a rig: the penetration curve and its parts, and how all moves with face velocity.</summary>
internal sealed class ForecastSection : IReportSection
{
    private const int MostRows = 12;

    /// <inheritdoc/>
    public string Anchor => "forecast";

    /// <inheritdoc/>
    public string Heading => "Filtration forecast";

    /// <inheritdoc/>
    public Markup Render(SwatchAssessment assessment)
    {
        if (assessment.Forecast is not { } forecast)
        {
            return Markup.Of($"<p>No forecast: it needs a face velocity, and a solidity and thickness for every layer.</p>");
        }

        return Markup.Of(
            $"""
            <p>By {Model(forecast.Correlations)}, for a face velocity of {Wording.Of(forecast.OperatingPoint.FaceVelocity)} in air at {Air(forecast)}, particles of {Wording.Of(forecast.OperatingPoint.ParticleDensity)}. A forecast, not a test: only the standard's own test decides.</p>
            {Key(forecast)}
            <figure>{Markup.OfSvg(PenetrationFigure.Draw(forecast, assessment.RigPoints))}<figcaption>The two bands are kept apart: what the measured inputs leave open, and how far the published models differ. Neither contains the other.</figcaption></figure>
            <figure>{Markup.OfSvg(MechanismFigure.Draw(forecast))}<figcaption>What each mechanism alone would let through; together they multiply to the thick line.</figcaption></figure>
            {Velocity(assessment, forecast)}
            {SensitivityPart.Render(forecast)}
            {Permeability(assessment)}
            {Rig(assessment)}
            {ChallengePart.Render(assessment)}
            {ClassPart.Render(assessment.Classes)}
            {LeakPart.Render(forecast, assessment.TotalInwardLeakage)}
            {Curve(forecast)}
            """);
    }

    /// <summary>The point of the curve where penetration is largest, for its bands.</summary>
    internal static CurvePoint AtMpps(MediaForecast forecast)
    {
        var size = forecast.MostPenetratingSize?.Meters ?? forecast.Curve.MaxBy(p => p.Penetration)!.Particle.Meters;
        return forecast.Curve.MinBy(p => Math.Abs(Math.Log(p.Particle.Meters / size)))!;
    }

    private static string Model(CorrelationSet set) => set switch
    {
        CorrelationSet.KirschStechkina1978 => "the fan model (Kirsch and Stechkina 1978)",
        CorrelationSet.LeeLiu1982 => "the formulas of Lee and Liu (1982)",
        CorrelationSet.Hinds1999 => "the formulas of Hinds (1999)",
        CorrelationSet.CellMat => "the numerical solution of the Kuwabara cell, made as uneven as real pads",
        _ => "the numerical solution of the Kuwabara cell",
    };

    private static string Air(MediaForecast forecast)
    {
        var air = forecast.OperatingPoint.Air;
        return $"{Wording.Told(air.Temperature.DegreesCelsius)} °C, {Wording.Told(air.Pressure.Kilopascals)} kPa, {Wording.Fixed(air.RelativeHumidity * 100, 0)} % relative humidity";
    }

    private static Markup Key(MediaForecast forecast)
    {
        var worst = AtMpps(forecast);
        var open = forecast.Uncertainty;
        return new Table("figures", "forecast", "value", "measured inputs, 95 %", "spread of the models")
            .Row("pressure drop", Wording.Of(forecast.PressureDrop), Range(open?.PressureDropPascals, 1, "Pa"), Range(forecast.PressureDropModelBandPascals, 1, "Pa"))
            .Row("most-penetrating particle size (MPPS)", forecast.MostPenetratingSize is { } size ? Wording.Particle(size) : "none between 10 nm and 2 µm", Sizes(open?.MostPenetratingSize), Sizes(forecast.MostPenetratingSizeModelBand))
            .Row("penetration at the MPPS", Wording.Percent(forecast.PenetrationAtMostPenetratingSize), Range(open?.PenetrationAtMostPenetratingSize ?? worst.MeasurementBand, 100, "%"), Range(forecast.PenetrationAtMostPenetratingSizeModelBand ?? worst.ModelBand, 100, "%"))
            .Row("efficiency at the MPPS", Wording.Efficiency(forecast.PenetrationAtMostPenetratingSize), "", "")
            .Row("quality factor at the MPPS", $"{Wording.Number(forecast.QualityFactorPerPascal * 1000)} /kPa", Range(open?.QualityFactorPerPascal, 1000, "/kPa"), "")
            .Finish();
    }

    private static string Range(Interval? interval, double factor, string unit) => interval is { } range
        ? $"{Wording.Number(range.Low * factor)} to {Wording.Number(range.High * factor)} {unit}"
        : "–";

    private static string Sizes(LengthInterval? interval) => interval is { } range
        ? $"{Wording.Number(range.Low.Micrometers, 2)} to {Wording.Number(range.High.Micrometers, 2)} µm"
        : "–";

    private static Markup Velocity(SwatchAssessment assessment, MediaForecast forecast)
    {
        var sweep = assessment.VelocitySweep;
        if (sweep.Length < 2)
        {
            return Markup.Empty;
        }

        var inUse = forecast.OperatingPoint.FaceVelocity;
        SvgFigure?[] figures =
        [
            VelocityFigures.PressureDrop(sweep, inUse, assessment.RigPoints),
            VelocityFigures.Penetration(sweep, inUse),
            VelocityFigures.QualityFactor(sweep, inUse),
            VelocityFigures.MostPenetratingSize(sweep, inUse),
        ];
        return Markup.Of($"<h3>With face velocity</h3><div class=\"pair\">{figures.OfType<SvgFigure>().Select(f => Markup.Of($"<figure>{Markup.OfSvg(f)}</figure>"))}</div>");
    }

    private static Markup Permeability(SwatchAssessment assessment)
    {
        var table = new Table("figures", "air permeability at", "mm/s (= L/m²/s)", "cm/s", "ft/min (= cfm/ft²)");
        foreach (var point in assessment.AirPermeabilities)
        {
            table.Row(
                Wording.Of(point.PressureDrop),
                Wording.Number(point.FaceVelocity.MillimetersPerSecond),
                Wording.Number(point.FaceVelocity.CentimetersPerSecond),
                Wording.Number(point.FaceVelocity.FeetPerMinute));
        }

        return table.Finish();
    }

    private static Markup Rig(SwatchAssessment assessment)
    {
        var table = new Table("figures", "rig test at", "pressure drop measured", "forecast", "stands for fibres of", "particle", "penetration measured", "forecast");
        foreach (var point in assessment.RigPoints)
        {
            table.Row(
                Wording.Of(point.FaceVelocity),
                point.PressureDrop is { } measured ? Wording.Of(measured) : "–",
                point.ForecastPressureDrop is { } forecast ? Wording.Of(forecast) : "–",
                point.EffectiveDiameter is { } byFlow ? Wording.Of(byFlow) : "–",
                point.Particle is { } particle ? Wording.Particle(particle) : "–",
                point.Penetration is { } penetration ? Wording.Percent(penetration) : "–",
                point.ForecastPenetration is { } expected ? Wording.Percent(expected) : "–");
        }

        var rows = table.Finish();
        return rows.IsEmpty ? rows : Markup.Of($"<h3>Beside what the rig measured</h3>{rows}<p class=\"fine\">Stands for fibres of: the effective fibre diameter of the measured pressure drop by Davies' law (1952). It lies above the diameter in the pictures where fibres lie in ropes or unevenly.</p>");
    }

    private static Markup Curve(MediaForecast forecast)
    {
        var curve = forecast.Curve;
        var step = Math.Max(1, (int)Math.Ceiling(curve.Length / (double)MostRows));
        var table = new Table("figures", "particle", "penetration", "models", "measured inputs, 95 %", "leading mechanism");
        for (var i = 0; i < curve.Length; i += step)
        {
            var point = curve[i];
            var lead = point.ByMechanism.IsEmpty ? "" : point.ByMechanism.MaxBy(m => m.Value).Key;
            table.Row(
                Wording.Particle(point.Particle),
                Wording.Percent(point.Penetration),
                Wording.Percent(point.ModelBand),
                point.MeasurementBand is { } band ? Wording.Percent(band) : "–",
                Wording.Words(lead));
        }

        return Markup.Of($"<h3>Penetration by size</h3>{table.Finish()}");
    }
}
