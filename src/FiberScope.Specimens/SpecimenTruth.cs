using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Specimens;

/// <summary>What is truly in a virtual specimen.</summary>
/// <remarks>
/// <para>A point of a fibre's axis counts as <b>visible</b> when it lies in the field, the uppermost surface there is that fibre's, and
/// the fibre's noise-free signal there is at least <see cref="VisibleSignal"/> of white and at least three times the noise that is left
/// after averaging over one square diameter. Deeper and darker layers count as out of sight.</para>
/// <para>A visible point shows <b>both edges</b> when the fibre is uppermost on both flanks, what lies just outside either edge is lower,
/// and the noise-free grey falls outwards on either side by at least 12 % of the signal and twice the noise left after averaging along
/// two diameters.</para>
/// <para>In transmitted light visible means in focus: blurred by less than a quarter of the diameter or twice the sharpest blur,
/// whichever is more. In a section every cut fibre counts, weighted by major over minor axis, which undoes the lower chance of
/// cutting a fibre that runs along the plane.</para>
/// </remarks>
public sealed record SpecimenTruth
{
    /// <summary>Share of white that a fibre's signal must reach to count as visible.</summary>
    public const double VisibleSignal = 0.05;

    /// <summary>The recipe that the specimen was made from.</summary>
    public required SpecimenRecipe Recipe { get; init; }

    /// <summary>The seed it was made with.</summary>
    public required ulong Seed { get; init; }

    /// <summary>Mean diameter of each fibre laid, by fibre number from the top down; pixels.</summary>
    public required ImmutableArray<double> FibreDiameters { get; init; }

    /// <summary>The visible points of all fibres, fibre by fibre along each; empty for sections.</summary>
    public required ImmutableArray<TrueStation> Stations { get; init; }

    /// <summary>The cut fibres of a section; empty for other specimens.</summary>
    public required ImmutableArray<TrueSection> Sections { get; init; }

    /// <summary>Diameters over all visible length: what a measurement should find.</summary>
    public required TrueDiameters Visible { get; init; }

    /// <summary>Diameters over the visible length that shows both edges.</summary>
    public required TrueDiameters BothEdges { get; init; }

    /// <summary>Diameters over all fibre length laid in the field, seen or not.</summary>
    public required TrueDiameters Mat { get; init; }

    /// <summary>Orientation over the visible length.</summary>
    public required TrueOrientation Orientation { get; init; }

    /// <summary>Orientation over all fibre length laid in the field.</summary>
    public required TrueOrientation MatOrientation { get; init; }

    /// <summary>Fibre volume over mat volume; for a section the area share of cut fibres in the picture.</summary>
    public required double Solidity { get; init; }

    /// <summary>
    /// Volume of the fibres that were laid in this field over its area and the depth laid: what chance and wandering made of the
    /// recipe's solidity. For a section the same as <see cref="Solidity"/>.
    /// </summary>
    public required double LaidSolidity { get; init; }

    /// <summary>The share of the field that fibres cover, seen from above; dimensionless.</summary>
    public required double Cover { get; init; }

    /// <summary>What is no single fibre.</summary>
    public required ImmutableArray<TrueDefect> Defects { get; init; }

    /// <summary>The deepest visible point below the mat's top; zero for sections.</summary>
    public required Length VisibleDepth { get; init; }

    /// <summary>Mass of mat per area.</summary>
    public AreaDensity BasisWeight => Recipe.Mat.BasisWeight;

    /// <summary>The mat's thickness.</summary>
    public Length Thickness => Recipe.Mat.Thickness;
}
