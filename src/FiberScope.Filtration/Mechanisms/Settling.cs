namespace FiberScope.Filtration.Mechanisms;

/// <summary>Collection of particles that settle onto the fibre; Hinds (1999), eqs. 9.30–9.32 (from memory).</summary>
public static class Settling
{
    /// <summary>
    /// G = settling velocity / face velocity gives (1 + R) G with the air flowing down, −(1 + R) G flowing up, and about G² across.
    /// </summary>
    /// <returns>E_G; dimensionless, negative when the air flows up. No more than 1 + R.</returns>
    public static double Efficiency(FlowDirection direction, double settlingRatio, double ratio) => direction switch
    {
        FlowDirection.Down => Math.Min(settlingRatio, 1) * (1 + ratio),
        FlowDirection.Up => -Math.Min(settlingRatio, 1) * (1 + ratio),
        _ => Math.Min(settlingRatio * settlingRatio, 1 + ratio),
    };
}
