namespace FiberScope.Assessment.Designing;

/// <summary>The names of targets in output, by the names that the search gives their probabilities.</summary>
public static class DesignTargetNames
{
    /// <summary>The key of a target: that of a design file.</summary>
    public static string Of(string target) => target switch
    {
        "penetration-at-most-penetrating-size" => "penetration_at_mpps",
        "aerosol-penetration" => "penetration",
        "pressure-drop" => "pressure_drop",
        _ => target.Replace('-', '_'),
    };
}
