namespace FiberScope.Assessment.Json;

/// <summary>The names and versions of the machine-readable outputs.</summary>
public static class Schemas
{
    /// <summary>What measuring alone gives.</summary>
    public const string Measurement = "fiberscope/measurement/1";

    /// <summary>What predicting alone gives.</summary>
    public const string Prediction = "fiberscope/prediction/1";

    /// <summary>A whole assessment.</summary>
    public const string Assessment = "fiberscope/assessment/1";

    /// <summary>The structures that a design search found.</summary>
    public const string Design = "fiberscope/design/1";

    /// <summary>What the rolls of a grade taught.</summary>
    public const string Calibration = "fiberscope/calibration/1";

    /// <summary>What an audit's crops show by the machine's reading.</summary>
    public const string AuditKey = "fiberscope/audit-key/1";

    /// <summary>How the machine agrees with a person's eye.</summary>
    public const string Audit = "fiberscope/audit/1";
}
