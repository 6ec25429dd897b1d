using System.Collections.Immutable;
using System.Security.Cryptography;
using FiberScope.Assessment.Json;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Input;

/// <summary>Reads <c>calibration:</c>, the file in which earlier rolls of the grade left what they taught.</summary>
/// <param name="Calibration">The calibration.</param>
/// <param name="Name">The file as the user named it.</param>
/// <param name="Sha256">SHA-256 of its bytes; 64 lower-case hexadecimal digits.</param>
internal sealed record CalibrationKey(GradeCalibration Calibration, string Name, string Sha256)
{
    /// <summary>What a calibration tells of every layer, and a layer therefore may not.</summary>
    private static readonly ImmutableArray<string> Told = ["inhomogeneity_factor", "charge", "charge_from", "basis_weight_variation", "pinholes"];

    /// <summary>The calibration; null when none is named, or when it is wrong and the file has been told.</summary>
    /// <param name="map">The mapping that may name it.</param>
    /// <param name="folder">The folder that its path starts from.</param>
    /// <param name="correlations">The correlations that the file asks for.</param>
    public static CalibrationKey? Read(MapReader map, string folder, CorrelationSet? correlations)
    {
        if (map.Text("calibration") is not { } name)
        {
            return null;
        }

        try
        {
            var path = Path.Combine(folder, name);
            var calibration = CalibrationFileJson.Read(path);
            if (correlations is { } asked && asked != calibration.Correlations)
            {
                map.Complain("correlations", $"the calibration holds for {Words.Of(Words.Correlations, calibration.Correlations)}; delete this line, or calibrate again");
            }

            map.RejectTold(Told, "calibration");
            return new CalibrationKey(calibration, name, Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(path))));
        }
        catch (InputException e)
        {
            map.Complain("calibration", e.Message);
            return null;
        }
    }
}
