using FiberScope.Assessment.Calibrating;
using FiberScope.Filtration;

namespace FiberScope.Cli.Console;

/// <summary>A calibration on one screen.</summary>
internal static class CalibrationSummary
{
    private const int MostRolls = 12;

    public static void Print(TextWriter output, CalibrationFinding finding)
    {
        var c = finding.Calibration;
        output.WriteLine(FormattableString.Invariant($"Grade {c.Grade}, from {c.Rolls.Length} roll(s):"));
        foreach (var line in Factors(c))
        {
            output.WriteLine("  " + line);
        }

        foreach (var roll in finding.Rolls.Take(MostRolls))
        {
            output.WriteLine("  " + Roll(roll));
        }

        if (finding.Rolls.Length > MostRolls)
        {
            output.WriteLine(FormattableString.Invariant($"  {finding.Rolls.Length - MostRolls} more in the calibration file"));
        }

        foreach (var caveat in c.Caveats)
        {
            output.WriteLine("Note: " + caveat.Message);
        }
    }

    private static IEnumerable<string> Factors(GradeCalibration c)
    {
        yield return FormattableString.Invariant($"inhomogeneity factor {c.InhomogeneityFactor:G3} ± {100 * c.InhomogeneityRelativeUncertainty:F0} % for the next roll");
        yield return FormattableString.Invariant($"basis-weight variation {c.BasisWeightVariation * 100:F0} %, open area {c.OpenArea * 100:G2} %");
        yield return c.Charge.CoulombsPerSquareMeter > 0
            ? FormattableString.Invariant($"charge {c.Charge.CoulombsPerSquareMeter * 1e6:G3} µC/m² ± {100 * c.ChargeRelativeUncertainty:F0} %")
            : "no charge";
        yield return (c.LeaveOneOutPressureDropError, c.LeaveOneOutPenetrationError) switch
        {
            (null, null) => "each roll from the others: not to be told from one roll",
            ({ } drop, null) => FormattableString.Invariant($"each roll forecast from the others: pressure drop within {drop * 100:F0} % (root mean square)"),
            (null, { } passes) => FormattableString.Invariant($"each roll forecast from the others: penetration within {passes * 100:G2} percentage points (root mean square)"),
            ({ } drop, { } passes) => FormattableString.Invariant($"each roll forecast from the others: pressure drop within {drop * 100:F0} %, penetration within {passes * 100:G2} percentage points (root mean square)"),
        };
    }

    private static string Roll(CalibratedRoll roll)
    {
        var drop = roll.PressureDrop is { } measured ? FormattableString.Invariant($"{measured.Pascals:G3} Pa measured, {roll.FittedPressureDrop.Pascals:G3} fitted; ") : "";
        var passes = roll.Penetrations.Select(p => FormattableString.Invariant($"{p.Measured.Particle.Micrometers:G3} µm{(p.Measured.Discharged ? " discharged" : "")} {p.Measured.Penetration * 100:G3} % measured, {p.Fitted * 100:G3} fitted"));
        return $"{roll.Name}: {drop}{string.Join("; ", passes)}".TrimEnd(' ', ';');
    }
}
