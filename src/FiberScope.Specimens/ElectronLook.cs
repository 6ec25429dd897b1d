using FiberScope.Statistics;

namespace FiberScope.Specimens;

/// <summary>How fibres shine under the electron beam. All numbers are dimensionless.</summary>
/// <remarks>
/// Yield across a fibre: 1 + e (min(cap, sec^n φ) − 1) − dome u², φ the surface's tilt and u the distance from the axis over the radius:
/// the secant law of secondary emission (Seiler 1983, J. Appl. Phys. 54, R1; from memory), capped because the escape depth is finite.
/// Depth is counted in units of the mean depth at which a ray from above meets its first fibre.
/// </remarks>
public sealed record ElectronLook
{
    /// <summary>e, the mean height of the bright edges; 0 none, 1 strong.</summary>
    public double RimHeight { get; init => field = Require.Within(value, 0, 3, nameof(RimHeight)); } = 0.4;

    /// <summary>How much e differs from fibre to fibre, relative standard deviation.</summary>
    public double RimSpread { get; init => field = Require.Within(value, 0, 1, nameof(RimSpread)); } = 0.3;

    /// <summary>n, the exponent of the secant.</summary>
    public double RimExponent { get; init => field = Require.Within(value, 0.3, 2, nameof(RimExponent)); } = 0.9;

    /// <summary>The cap of the secant's power.</summary>
    public double RimCap { get; init => field = Require.Within(value, 1, 10, nameof(RimCap)); } = 3;

    /// <summary>How much darker a fibre's flanks are than its middle before the rims are added (heavy coating, high voltage).</summary>
    public double Dome { get; init => field = Require.Within(value, 0, 1, nameof(Dome)); } = 0.1;

    /// <summary>How much brighter the side towards the detector is.</summary>
    public double Asymmetry { get; init => field = Require.Within(value, 0, 1, nameof(Asymmetry)); } = 0.12;

    /// <summary>Fibre-to-fibre standard deviation of brightness.</summary>
    public double BrightnessSpread { get; init => field = Require.Within(value, 0, 0.6, nameof(BrightnessSpread)); } = 0.1;

    /// <summary>Depth over which brightness falls by e, in mean depths.</summary>
    public double ShadingDepth { get; init => field = Require.Within(value, 0.1, 100, nameof(ShadingDepth)); } = 1.3;

    /// <summary>Brightness that the deepest layers keep.</summary>
    public double DeepBrightness { get; init => field = Require.Within(value, 0, 1, nameof(DeepBrightness)); } = 0.12;

    /// <summary>How dark crevices beside higher fibres are.</summary>
    public double CreviceShadow { get; init => field = Require.Within(value, 0, 5, nameof(CreviceShadow)); } = 0.7;

    /// <summary>Share of the light of what lies below that shines through a fibre.</summary>
    public double Translucency { get; init => field = Require.Within(value, 0, 0.8, nameof(Translucency)); } = 0.04;

    /// <summary>Brightness of the ground where no fibre lies.</summary>
    public double Ground { get; init => field = Require.Within(value, 0, 1, nameof(Ground)); } = 0.03;

    /// <summary>Standard deviation of the surface's fine mottle.</summary>
    public double Mottle { get; init => field = Require.Within(value, 0, 0.3, nameof(Mottle)); } = 0.04;

    /// <summary>Share of the light that is spread out over some 30 fibre widths.</summary>
    public double Glow { get; init => field = Require.Within(value, 0, 0.5, nameof(Glow)); } = 0.05;

    /// <summary>Share of the fibres that are charged and shine much brighter.</summary>
    public double ChargedShare { get; init => field = Require.Within(value, 0, 0.5, nameof(ChargedShare)); } = 0.01;
}
