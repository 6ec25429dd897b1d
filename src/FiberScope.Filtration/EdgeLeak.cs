using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>A gap past the whole medium: between a filter and its frame, or a mask and a face.</summary>
public sealed record EdgeLeak
{
    /// <summary>Makes the gap, a slit.</summary>
    /// <param name="width">The slit's opening; above zero.</param>
    /// <param name="length">How long the slit is along the edge; zero or above.</param>
    /// <param name="depth">How far the air travels through it; above zero.</param>
    /// <param name="mediaArea">The area of the medium that the slit goes past; above zero.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public EdgeLeak(Length width, Length length, Length depth, Area mediaArea)
    {
        WidthMetres = Require.Positive(width.Meters, nameof(width));
        LengthMetres = Require.NotNegative(length.Meters, nameof(length));
        DepthMetres = Require.Positive(depth.Meters, nameof(depth));
        SquareMetres = Require.Positive(mediaArea.SquareMeters, nameof(mediaArea));
    }

    /// <summary>The slit's opening.</summary>
    public Length Width => Length.FromMeters(WidthMetres);

    /// <summary>How long the slit is along the edge.</summary>
    public Length SlitLength => Length.FromMeters(LengthMetres);

    /// <summary>How far the air travels through it.</summary>
    public Length Depth => Length.FromMeters(DepthMetres);

    /// <summary>The area of the medium.</summary>
    public Area MediaArea => Area.FromSquareMeters(SquareMetres);

    internal double WidthMetres { get; }

    internal double LengthMetres { get; }

    internal double DepthMetres { get; }

    internal double SquareMetres { get; }

    /// <summary>The air through the gap per media area, m/s.</summary>
    /// <remarks>
    /// Plane Poiseuille flow, 12 μ L / h² per mean speed, and 1.5 velocity heads for entry and exit (handbook values, common practice),
    /// combined as for a hole.
    /// </remarks>
    internal double MetresPerSecond(double pascals, AirProperties air)
    {
        var viscous = 12 * air.PascalSeconds * DepthMetres / (WidthMetres * WidthMetres);
        var inertial = Pinholes.ShortTubeLoss * air.KilogramsPerCubicMetre / 2;
        var speed = 2 * pascals / (viscous + Math.Sqrt((viscous * viscous) + (4 * inertial * pascals)));
        return speed * WidthMetres * LengthMetres / SquareMetres;
    }
}
