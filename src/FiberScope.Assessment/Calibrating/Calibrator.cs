using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Calibrating;

/// <summary>Learns from rolls that have both a structure and rig results.</summary>
public static class Calibrator
{
    /// <summary>Root-mean-square error of penetration beyond which a fit is called poor. Common practice, no source.</summary>
    private const double LargestMisfit = 0.1;

    /// <summary>Fits the grade's factors, and sets each roll beside what the fit gives for it.</summary>
    /// <param name="file">The rolls.</param>
    /// <param name="settings">The correlations to fit with.</param>
    /// <param name="cancellation">Stops the work between its parts.</param>
    public static CalibrationFinding Run(CalibrationFile file, ForecastSettings settings, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        var calibration = GradeCalibration.Fit(file.Grade, file.Rolls, settings);
        cancellation.ThrowIfCancellationRequested();
        var central = settings with { Draws = 0, Correlations = calibration.Correlations };
        CalibratedRoll[] rolls = [.. file.Rolls.Select(roll => Fitted(roll, calibration, central))];
        return new CalibrationFinding(calibration with { Caveats = [.. calibration.Caveats, .. Misfit(rolls)] }, [.. rolls]);
    }

    /// <summary>A fit that misses its own rolls will miss the next one too.</summary>
    private static IEnumerable<Caveat> Misfit(IEnumerable<CalibratedRoll> rolls)
    {
        double[] errors = [.. rolls.SelectMany(r => r.Penetrations).Select(p => p.Fitted - p.Measured.Penetration)];
        var error = errors.Length == 0 ? 0 : Math.Sqrt(errors.Average(e => e * e));
        if (error > LargestMisfit)
        {
            yield return new Caveat("poor-fit", FormattableString.Invariant($"The fit misses the rolls' own penetrations by {error * 100:F0} percentage points (root mean square): structure and rig results do not belong together. Check diameter, thickness, solidity, face velocity and which tests were discharged."));
        }
    }

    private static CalibratedRoll Fitted(CalibrationRoll roll, GradeCalibration calibration, ForecastSettings settings)
    {
        MediaForecast At(bool discharged, RigPenetration? measured) => MediaModel.Forecast(
            calibration.Apply(roll.Layers, discharged),
            roll.Point with { Particles = measured is null ? [] : [measured.Particle] },
            settings);
        return new CalibratedRoll(
            roll.Name,
            roll.PressureDrop,
            At(false, null).PressureDrop,
            [.. roll.Penetrations.Select(p => new CalibratedPenetration(p, At(p.Discharged, p).Curve[0].Penetration))]);
    }
}
