using FiberScope.Statistics;

namespace FiberScope.Specimens;

/// <summary>How fibres look in transmitted light: small cylinder lenses. All numbers are dimensionless.</summary>
public sealed record LightLook
{
    /// <summary>Brightness of the empty field.</summary>
    public double Field { get; init => field = Require.Within(value, 0.2, 1, nameof(Field)); } = 0.78;

    /// <summary>Light that a fibre's rim lets through.</summary>
    public double Rim { get; init => field = Require.Within(value, 0, 1, nameof(Rim)); } = 0.25;

    /// <summary>Light in a fibre's core over that of the empty field.</summary>
    public double Core { get; init => field = Require.Within(value, 0.2, 1.4, nameof(Core)); } = 0.96;

    /// <summary>Half-width of the bright core over the fibre's radius.</summary>
    public double CoreWidth { get; init => field = Require.Within(value, 0.1, 0.95, nameof(CoreWidth)); } = 0.55;

    /// <summary>Height of the bright line outside an edge.</summary>
    public double Halo { get; init => field = Require.Within(value, 0, 0.5, nameof(Halo)); } = 0.08;

    /// <summary>Blur (sigma) of a fibre at the top or bottom of the layer; pixels.</summary>
    public double DefocusPixels { get; init => field = Require.Within(value, 0, 50, nameof(DefocusPixels)); } = 6;

    /// <summary>Share of the layer's depth about the focal plane that stays sharp; from 0 to 1.</summary>
    public double SharpShare { get; init => field = Require.Within(value, 0, 1, nameof(SharpShare)); } = 0.4;

    /// <summary>How uneven the lighting is from centre to corner.</summary>
    public double Vignette { get; init => field = Require.Within(value, 0, 0.8, nameof(Vignette)); } = 0.15;
}
