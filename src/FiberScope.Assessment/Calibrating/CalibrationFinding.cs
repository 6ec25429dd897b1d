using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Calibrating;

/// <summary>What the rolls of a grade taught, and how well it gives each roll back.</summary>
/// <param name="Calibration">What was learnt.</param>
/// <param name="Rolls">Every roll with what was measured and what the fit gives.</param>
public sealed record CalibrationFinding(GradeCalibration Calibration, ImmutableArray<CalibratedRoll> Rolls);

/// <summary>One roll, measured and as the fit gives it.</summary>
/// <param name="Name">The roll.</param>
/// <param name="PressureDrop">Measured; null when it was not.</param>
/// <param name="FittedPressureDrop">As the fit gives it.</param>
/// <param name="Penetrations">The penetrations, in the order of the file.</param>
public sealed record CalibratedRoll(string Name, Pressure? PressureDrop, Pressure FittedPressureDrop, ImmutableArray<CalibratedPenetration> Penetrations);

/// <summary>One penetration, measured and as the fit gives it.</summary>
/// <param name="Measured">What the rig showed.</param>
/// <param name="Fitted">As the fit gives it; dimensionless.</param>
public sealed record CalibratedPenetration(RigPenetration Measured, double Fitted);
