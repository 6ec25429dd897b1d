namespace FiberScope.Imaging.Tests.Edges;

/// <summary>What a rendered cylinder looks like. Grey as a share of white, lengths in pixels.</summary>
internal sealed record CylinderLook
{
    public double Width { get; init; } = 10;

    public double Blur { get; init; } = 1;

    /// <summary>Yield above the flat inside at t, from −1 to 1 across.</summary>
    public Func<double, double> Law { get; init; } = Secant;

    public double Rim { get; init; } = 0.4;

    public double Tilt { get; init; }

    public double Brightness { get; init; } = 0.5;

    public double GroundLeft { get; init; } = 0.1;

    public double GroundRight { get; init; } = 0.1;

    public double Electrons { get; init; } = 25;

    public double Gamma { get; init; } = 1;

    /// <summary>Secant of the tilt, capped.</summary>
    public static double Secant(double t) => Math.Min(3.3, 1 / Math.Sqrt(1 - (t * t))) - 1;

    /// <summary>A steeper law with a higher cap.</summary>
    public static double SteepSecant(double t) => Math.Min(5, Math.Pow(1 - (t * t), -0.65)) - 1;

    /// <summary>A law that is soon capped.</summary>
    public static double LowCap(double t) => Math.Min(2.4, Math.Pow(1 - (t * t), -0.45)) - 1;

    /// <summary>A bright edge that fades inwards exponentially, as by electrons leaving through the flank.</summary>
    public static double Fading(double t) => 1.6 * Math.Exp(-(1 - Math.Abs(t)) / 0.15);

    /// <summary>Rounded off without a sharp cap.</summary>
    public static double Soft(double t) => (1 / Math.Sqrt(1 - (t * t) + 0.06)) - (1 / Math.Sqrt(1.06));

    /// <summary>No rim.</summary>
    public static double Flat(double t) => 0 * t;
}
