using System.Collections.Immutable;
using FiberScope.Fibres;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>What rolls with both pictures and rig results teach about a grade; applied to its next forecast.</summary>
public sealed record GradeCalibration
{
    /// <summary>The grade.</summary>
    public required string Grade { get; init; }

    /// <summary>The rolls it was fitted on.</summary>
    public required ImmutableArray<string> Rolls { get; init; }

    /// <summary>The correlation set that it was fitted with, and holds for.</summary>
    public required CorrelationSet Correlations { get; init; }

    /// <summary>The inhomogeneity factor ε; dimensionless.</summary>
    public required double InhomogeneityFactor { get; init; }

    /// <summary>Relative standard uncertainty of ε for the next roll: the rolls' spread, or of the fit where there is one roll only.</summary>
    public required double InhomogeneityRelativeUncertainty { get; init; }

    /// <summary>The coefficient of variation of basis weight that the penetrations ask for; dimensionless, 0 when none were measured.</summary>
    public required double BasisWeightVariation { get; init; }

    /// <summary>
    /// Share of the area in holes that pass all sizes, which the penetrations of large particles ask for; dimensionless. Taken as holes of
    /// 0.2 mm, an assumption: only what they let through is fitted.
    /// </summary>
    public required double OpenArea { get; init; }

    /// <summary>The fibre charge; zero where no penetration as received was measured.</summary>
    public required ElectricSurfaceChargeDensity Charge { get; init; }

    /// <summary>Relative standard uncertainty of the charge.</summary>
    public required double ChargeRelativeUncertainty { get; init; }

    /// <summary>
    /// Root-mean-square error of penetration when each roll is forecast from the others; absolute. Null with one roll, or without penetrations.
    /// </summary>
    public required double? LeaveOneOutPenetrationError { get; init; }

    /// <summary>Relative root-mean-square error of the pressure drop when each roll is forecast from the others; null with one roll.</summary>
    public required double? LeaveOneOutPressureDropError { get; init; }

    /// <summary>What a reader must know of the fit.</summary>
    public required ImmutableArray<Caveat> Caveats { get; init; }

    /// <summary>The layers of the grade's next roll with what was learnt put in.</summary>
    /// <param name="layers">The structure as measured.</param>
    /// <param name="discharged">Whether to leave the charge out.</param>
    public ImmutableArray<MediaLayer> Apply(IReadOnlyList<MediaLayer> layers, bool discharged = false) =>
        [.. layers.Select(layer => new GradeFactors(InhomogeneityFactor, BasisWeightVariation, OpenArea, discharged ? 0 : Charge.CoulombsPerSquareMeter).PutInto(layer) with
        {
            Uncertainty = (layer.Uncertainty ?? new LayerUncertainty()) with { Charge = discharged ? 0 : Math.Min(2, ChargeRelativeUncertainty), Inhomogeneity = Math.Min(1, InhomogeneityRelativeUncertainty) },
        })];

    /// <summary>The forecast of the grade's next roll; a caveat says that and how it was calibrated.</summary>
    /// <param name="layers">The structure as measured.</param>
    /// <param name="point">How the medium is used.</param>
    /// <param name="settings">How the forecast is made; its correlation set gives way to the calibration's.</param>
    public MediaForecast Forecast(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ForecastSettings? settings = null)
    {
        var forecast = MediaModel.Forecast(Apply(layers), point, (settings ?? new ForecastSettings()) with { Correlations = Correlations });
        return forecast with { Caveats = [Note, .. forecast.Caveats] };
    }

    /// <summary>Says that a forecast was calibrated and how; it belongs to every forecast that uses the calibration.</summary>
    public Caveat Note
    {
        get
        {
            var error = LeaveOneOutPenetrationError is { } e ? FormattableString.Invariant($"; left out one at a time they were forecast within {e:F3} of penetration (root mean square)") : "";
            return new Caveat("calibrated", FormattableString.Invariant($"Calibrated for grade {Grade} on {Rolls.Length} roll(s), inhomogeneity factor {InhomogeneityFactor:G3}, basis-weight variation {BasisWeightVariation * 100:F0} %, open area {OpenArea * 100:G2} %, charge {Charge.CoulombsPerSquareMeter * 1e6:G3} µC/m²{error}."));
        }
    }

    /// <summary>Fits a grade's factors to its rolls.</summary>
    /// <param name="grade">The grade's name.</param>
    /// <param name="rolls">At least one roll, with a pressure drop or a penetration among them.</param>
    /// <param name="settings">The correlation set to fit with; the defaults when null.</param>
    /// <exception cref="ArgumentException">There are no rolls, or nothing was measured on them.</exception>
    public static GradeCalibration Fit(string grade, IReadOnlyList<CalibrationRoll> rolls, ForecastSettings? settings = null) =>
        new CalibrationFit(grade, rolls, (settings ?? new ForecastSettings()) with { Draws = 0 }).Run();
}
