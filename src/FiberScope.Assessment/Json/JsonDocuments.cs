using System.Collections.Immutable;
using FiberScope.Assessment.Auditing;
using FiberScope.Assessment.Calibrating;
using FiberScope.Assessment.Designing;
using FiberScope.Assessment.Measuring;
using FiberScope.Fibres;

namespace FiberScope.Assessment.Json;

/// <summary>Writes the machine-readable outputs; their schemas stand in <c>docs/schemas</c>.</summary>
public static class JsonDocuments
{
    /// <summary>Writes a measurement file.</summary>
    /// <param name="fields">The fields, in order.</param>
    /// <param name="survey">The pooled diameters; null when no field counts.</param>
    /// <param name="solidity">The solidity; null when nothing told it.</param>
    /// <param name="caveats">What a reader must know.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Measurement(IReadOnlyList<FieldFinding> fields, DiameterSurvey? survey, SolidityFinding? solidity, ImmutableArray<Caveat> caveats, Stream destination) =>
        JsonText.Write(destination, MeasurementEntry.Of(fields, survey, solidity, StructurePool.Of(fields), caveats));

    /// <summary>Writes a prediction file.</summary>
    /// <param name="prediction">The forecast and what was asked besides.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Prediction(MediaPrediction prediction, Stream destination) => JsonText.Write(destination, PredictionEntry.Of(prediction));

    /// <summary>Writes an assessment file.</summary>
    /// <param name="assessment">The assessment.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Assessment(SwatchAssessment assessment, Stream destination) => JsonText.Write(destination, AssessmentEntry.Of(assessment));

    /// <summary>Writes a design.</summary>
    /// <param name="finding">The structures found.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Design(DesignFinding finding, Stream destination) => JsonText.Write(destination, DesignEntry.Of(finding));

    /// <summary>Writes a grade's calibration.</summary>
    /// <param name="finding">What was learnt.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Calibration(CalibrationFinding finding, Stream destination) => JsonText.Write(destination, CalibrationEntry.Of(finding));

    /// <summary>Writes the key of an audit.</summary>
    /// <param name="key">The key.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void AuditKey(AuditKey key, Stream destination) => JsonText.Write(destination, AuditKeyEntry.Of(key));

    /// <summary>Writes an audit.</summary>
    /// <param name="finding">The comparison.</param>
    /// <param name="destination">Where to; left open.</param>
    public static void Audit(AuditFinding finding, Stream destination) => JsonText.Write(destination, AuditEntry.Of(finding));
}
