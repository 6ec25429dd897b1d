using FiberScope.Filtration;

namespace FiberScope.Assessment.Designing;

/// <summary>How the values of a design variable are shown.</summary>
/// <param name="Unit">The unit for people; empty for a pure number.</param>
/// <param name="Ascii">The unit as the end of a key in machine output; empty for a pure number.</param>
/// <param name="Factor">What turns an SI value into that unit.</param>
public sealed record DesignScale(string Unit, string Ascii, double Factor)
{
    /// <summary>The scale of a kind of variable.</summary>
    public static DesignScale Of(DesignKind kind) => kind switch
    {
        DesignKind.MedianDiameter => new DesignScale("µm", "um", 1e6),
        DesignKind.BasisWeight => new DesignScale("g/m²", "g_per_m2", 1e3),
        DesignKind.Charge => new DesignScale("µC/m²", "uc_per_m2", 1e6),
        _ => new DesignScale("", "", 1),
    };

    /// <summary>An SI value in this unit.</summary>
    public double In(double value) => value * Factor;
}
