using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>Holes of one size through a layer: pinholes, needle marks, or the open pores of woven cloth.</summary>
public sealed record Pinholes
{
    /// <summary>Makes the holes.</summary>
    /// <param name="diameter">The diameter of each; above zero.</param>
    /// <param name="openArea">Their share of the area; dimensionless, 0 to below 1.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public Pinholes(Length diameter, double openArea)
    {
        Require.Positive(diameter.Meters, nameof(diameter));
        Diameter = diameter;
        OpenArea = Require.Within(openArea, 0, 0.99);
    }

    /// <summary>The diameter of each.</summary>
    public Length Diameter { get; }

    /// <summary>Their share of the area; dimensionless.</summary>
    public double OpenArea { get; }

    /// <summary>Holes counted on an area.</summary>
    /// <param name="count">How many; zero or above.</param>
    /// <param name="diameter">The diameter of each; above zero.</param>
    /// <param name="area">The area they were counted on; above zero.</param>
    public static Pinholes Counted(double count, Length diameter, Area area) =>
        new(diameter, Require.NotNegative(count) * Math.PI / 4 * diameter.Meters * diameter.Meters / Require.Positive(area.SquareMeters, nameof(area)));

    /// <summary>
    /// The air through one hole, viscous to inertial: Δp = Q μ (3 + 8 L / (π R)) / R³ + K ½ ρ (Q / (π R²))².
    /// </summary>
    /// <param name="diameter">The hole's diameter, 2 R.</param>
    /// <param name="length">L, the hole's length; zero or above.</param>
    /// <param name="pressureDrop">Δp; zero or above.</param>
    /// <param name="air">The air.</param>
    /// <param name="lossFactor">K, dimensionless: 1.5 for a short tube, 2.7 for a sharp edge.</param>
    /// <remarks>Entry loss and tube in series after Dagan, Weinbaum and Pfeffer (1982), from memory; the inertial term is common practice.</remarks>
    public static VolumeFlow Flow(Length diameter, Length length, Pressure pressureDrop, AirProperties air, double lossFactor = ShortTubeLoss) =>
        VolumeFlow.FromCubicMetersPerSecond(FlowThroughOne(diameter.Meters / 2, length.Meters, pressureDrop.Pascals, air.PascalSeconds, air.KilogramsPerCubicMetre, lossFactor));

    internal const double ShortTubeLoss = 1.5;

    internal static double FlowThroughOne(double radiusMetres, double lengthMetres, double pascals, double pascalSeconds, double kilogramsPerCubicMetre, double lossFactor)
    {
        var viscous = pascalSeconds * (3 + (8 * lengthMetres / (Math.PI * radiusMetres))) / (radiusMetres * radiusMetres * radiusMetres);
        var area = Math.PI * radiusMetres * radiusMetres;
        var inertial = lossFactor * kilogramsPerCubicMetre / (2 * area * area);

        // The root of inertial Q² + viscous Q = Δp in the form that keeps its digits when one term is small.
        return 2 * pascals / (viscous + Math.Sqrt((viscous * viscous) + (4 * inertial * pascals)));
    }

    /// <summary>The air through all holes per area of the layer, m/s.</summary>
    internal double MetresPerSecond(double lengthMetres, double pascals, AirProperties air)
    {
        var radius = Diameter.Meters / 2;
        return OpenArea / (Math.PI * radius * radius) * FlowThroughOne(radius, lengthMetres, pascals, air.PascalSeconds, air.KilogramsPerCubicMetre, ShortTubeLoss);
    }
}
