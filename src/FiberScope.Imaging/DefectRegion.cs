using System.Collections.Immutable;

namespace FiberScope.Imaging;

/// <summary>The kinds of region that are not single fibres; their numbers are the codes in the mask files.</summary>
public enum DefectKind
{
    /// <summary>A solidified droplet, or a bead on a fibre.</summary>
    Shot = 1,

    /// <summary>Fibres stuck side by side.</summary>
    Rope = 2,

    /// <summary>A patch where fibres have run together into a film.</summary>
    Film = 3,

    /// <summary>Something that is no fibre at all: dust, particles, clumps.</summary>
    Debris = 4,
}

/// <summary>One defect: a region that gives no diameter reading.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="AreaPixels">Its area; pixels.</param>
/// <param name="Outline">Its outer boundary as (x, y) corners in pixels, closed.</param>
public sealed record DefectRegion(DefectKind Kind, double AreaPixels, ImmutableArray<(int X, int Y)> Outline);
