using System.Collections.Immutable;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>How the visible fibre length is oriented in the plane of the mat.</summary>
public sealed record OrientationSummary
{
    /// <summary>The direction that most length follows, from the picture's x axis towards its y axis (downwards); in [0°, 180°).</summary>
    /// <remarks>Means nothing when <see cref="Order"/> is near 0.</remarks>
    public required Angle PrincipalDirection { get; init; }

    /// <summary>The order parameter ⟨cos 2θ⟩ about the principal direction, length-weighted; 0 random to 1 all parallel.</summary>
    public required double Order { get; init => field = Require.Within(value, 0, 1, nameof(Order)); }

    /// <summary>
    /// Share of length per class of direction; the classes are equally wide, begin at 0° and end at 180°; they add up to 1.
    /// </summary>
    public required ImmutableArray<double> Shares { get; init; }

    /// <summary>
    /// Length within 45° of the picture's vertical (machine direction) over length within 45° of its horizontal (cross direction); 1 for a random mat;
    /// positive infinity is never given: the ratio is capped at 1000.
    /// </summary>
    public required double MachineToCross { get; init; }

    /// <summary>The order parameter by another way, the picture's grey gradients; null when not looked at. Agrees within 0.1 when both are sound.</summary>
    public double? OrderFromGradients { get; init; }

    /// <summary>The principal direction by the picture's grey gradients; null when not looked at.</summary>
    public Angle? DirectionFromGradients { get; init; }
}
