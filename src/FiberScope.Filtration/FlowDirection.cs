namespace FiberScope.Filtration;

/// <summary>Which way the air flows; matters for particles that settle.</summary>
public enum FlowDirection
{
    /// <summary>Across, as in ducts and masks; the default.</summary>
    Horizontal,

    /// <summary>Downwards, as in many flat-sheet rigs.</summary>
    Down,

    /// <summary>Upwards.</summary>
    Up,
}
