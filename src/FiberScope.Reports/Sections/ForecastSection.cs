using FiberScope.Assessment;
using FiberScope.Filtration;
using FiberScope.Reports.Figures;
using FiberScope.Reports.Html;

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
            <p>By the model, for a face velocity of {Wording.Of(forecast.OperatingPoint.FaceVelocity)} in air at {Air(forecast)}, particles of {Wording.Of(forecast.OperatingPoint.ParticleDensity)}. A forecast, not a test: only the standard's own test decides.</p>
            {Key(forecast)}
            <figure>{Markup.OfSvg(PenetrationFigure.Draw(forecast, assessment.RigPoints))}<figcaption>The two bands are kept apart: what the measured inputs leave open, and how far the published models differ. Neither contains the other.</figcaption></figure>
            <figure>{Markup.OfSvg(MechanismFigure.Draw(forecast))}<figcaption>What each mechanism alone would let through; together they multiply to the thick line.</figcaption></figure>
            {Velocity(assessment, forecast)}
            {Permeability(assessment)}
            {Rig(assessment)}
            {Curve(forecast)}
            """);
    }

    /// <summary>The point of the curve where penetration is largest, for its bands.</summary>
    internal static CurvePoint AtMpps(MediaForecast forecast)
    {
        var size = forecast.MostPenetratingSize?.Meters ?? forecast.Curve.MaxBy(p => p.Penetration)!.Particle.Meters;
        return forecast.Curve.MinBy(p => Math.Abs(Math.Log(p.Particle.Meters / size)))!;
    }

    private static string Air(MediaForecast forecast)
    {
        var air = forecast.OperatingPoint.Air;
        return $"{Wording.Told(air.Temperature.DegreesCelsius)} °C, {Wording.Told(air.Pressure.Kilopascals)} kPa, {Wording.Fixed(air.RelativeHumidity * 100, 0)} % relative humidity";
    }

    private static Markup Key(MediaForecast forecast)
    {
        var worst = AtMpps(forecast);
        return new Table("figures", "forecast", "value", "measured inputs, 95 %", "spread of the models")
            .Row("pressure drop", Wording.Of(forecast.PressureDrop), "", forecast.PressureDropModelBandPascals is { } drops ? $"{Wording.Number(drops.Low)} to {Wording.Number(drops.High)} Pa" : "–")
            .Row("most-penetrating particle size (MPPS)", forecast.MostPenetratingSize is { } size ? Wording.Particle(size) : "none between 10 nm and 2 µm", "", "")
            .Row("penetration at the MPPS", Wording.Percent(forecast.PenetrationAtMostPenetratingSize), worst.MeasurementBand is { } band ? Wording.Percent(band) : "–", Wording.Percent(worst.ModelBand))
            .Row("efficiency at the MPPS", Wording.Percent(1 - forecast.PenetrationAtMostPenetratingSize, 4), "", "")
            .Row("quality factor at the MPPS", $"{Wording.Number(forecast.QualityFactorPerPascal * 1000)} per kPa", "", "")
            .Finish();
    }

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
        var table = new Table("figures", "rig test at", "pressure drop measured", "forecast", "particle", "penetration measured", "forecast");
        foreach (var point in assessment.RigPoints)
        {
            table.Row(
                Wording.Of(point.FaceVelocity),
                point.PressureDrop is { } measured ? Wording.Of(measured) : "–",
                point.ForecastPressureDrop is { } forecast ? Wording.Of(forecast) : "–",
                point.Particle is { } particle ? Wording.Particle(particle) : "–",
                point.Penetration is { } penetration ? Wording.Percent(penetration) : "–",
                point.ForecastPenetration is { } expected ? Wording.Percent(expected) : "–");
        }

        var rows = table.Finish();
        return rows.IsEmpty ? rows : Markup.Of($"<h3>Beside what the rig measured</h3>{rows}");
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
