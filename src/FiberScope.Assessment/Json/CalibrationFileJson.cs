using System.Text.Json;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Assessment.Json;

/// <summary>Reads a grade's calibration back.</summary>
internal static class CalibrationFileJson
{
    /// <summary>The calibration in a file.</summary>
    /// <exception cref="InputException">The file is missing or holds no calibration.</exception>
    public static GradeCalibration Read(string path) => JsonFile.Read(path, $"a calibration of schema {Schemas.Calibration}, as 'fiberscope calibrate' writes it", root =>
        root.GetProperty("schema").GetString() == Schemas.Calibration ? Of(root) : throw new FormatException("Another schema."));

    private static GradeCalibration Of(JsonElement root)
    {
        double Number(string key) => root.GetProperty(key).GetDouble();
        double? Maybe(string key) => root.GetProperty(key) is { ValueKind: JsonValueKind.Number } number ? number.GetDouble() : null;
        return new GradeCalibration
        {
            Grade = root.GetProperty("grade").GetString() ?? "",
            Rolls = [.. root.GetProperty("rolls").EnumerateArray().Select(r => r.GetProperty("roll").GetString() ?? "")],
            Correlations = Words.Correlations[root.GetProperty("correlations").GetString() ?? ""],
            InhomogeneityFactor = Require.Positive(Number("inhomogeneity_factor")),
            InhomogeneityRelativeUncertainty = Require.NotNegative(Number("inhomogeneity_relative_u")),
            BasisWeightVariation = Require.Within(Number("basis_weight_variation"), 0, 0.9),
            OpenArea = Require.Within(Number("open_area"), 0, 0.99),
            Charge = ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(Require.NotNegative(Number("charge_uc_per_m2")) * 1e-6),
            ChargeRelativeUncertainty = Require.NotNegative(Number("charge_relative_u")),
            LeaveOneOutPenetrationError = Maybe("leave_one_out_penetration_error"),
            LeaveOneOutPressureDropError = Maybe("leave_one_out_pressure_drop_error"),
            Caveats = [.. root.GetProperty("warnings").EnumerateArray().Select(w => new Caveat(w.GetProperty("code").GetString()!, w.GetProperty("message").GetString()!))],
        };
    }
}
