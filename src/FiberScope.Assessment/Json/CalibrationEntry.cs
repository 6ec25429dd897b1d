using System.Collections.Immutable;
using System.Text.Json.Serialization;
using FiberScope.Assessment.Calibrating;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;

namespace FiberScope.Assessment.Json;

/// <summary>A grade's calibration, for the forecasts of its next rolls.</summary>
internal sealed record CalibrationEntry(
    string Schema,
    string Software,
    string Grade,
    string Correlations,
    double InhomogeneityFactor,
    double InhomogeneityRelativeU,
    double BasisWeightVariation,
    double OpenArea,
    [property: JsonPropertyName("charge_uc_per_m2")] double Charge,
    double ChargeRelativeU,
    double? LeaveOneOutPenetrationError,
    double? LeaveOneOutPressureDropError,
    CalibratedRollEntry[] Rolls,
    ImmutableArray<Caveat> Warnings)
{
    public static CalibrationEntry Of(CalibrationFinding finding)
    {
        var c = finding.Calibration;
        return new(
            Schemas.Calibration,
            Assessment.Software.Version,
            c.Grade,
            Words.Of(Words.Correlations, c.Correlations),
            c.InhomogeneityFactor,
            c.InhomogeneityRelativeUncertainty,
            c.BasisWeightVariation,
            c.OpenArea,
            c.Charge.CoulombsPerSquareMeter * 1e6,
            c.ChargeRelativeUncertainty,
            c.LeaveOneOutPenetrationError,
            c.LeaveOneOutPressureDropError,
            [.. finding.Rolls.Select(CalibratedRollEntry.Of)],
            c.Caveats);
    }
}

/// <summary>One roll of a calibration, measured and as the fit gives it.</summary>
internal sealed record CalibratedRollEntry(string Roll, double? PressureDropPa, double FittedPressureDropPa, CalibratedPenetrationEntry[] Penetrations)
{
    public static CalibratedRollEntry Of(CalibratedRoll r) => new(
        r.Name,
        r.PressureDrop?.Pascals,
        r.FittedPressureDrop.Pascals,
        [.. r.Penetrations.Select(p => new CalibratedPenetrationEntry(p.Measured.Particle.Micrometers, p.Measured.Discharged, p.Measured.Penetration, p.Fitted))]);
}

/// <summary>One penetration of a calibration, measured and as the fit gives it.</summary>
internal sealed record CalibratedPenetrationEntry(double ParticleUm, bool Discharged, double Penetration, double FittedPenetration);
