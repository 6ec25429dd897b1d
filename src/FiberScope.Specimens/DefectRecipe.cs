using FiberScope.Statistics;

namespace FiberScope.Specimens;

/// <summary>What is in the picture that is not a single fibre. Sizes are in mean fibre diameters, counts per picture.</summary>
public sealed record DefectRecipe
{
    /// <summary>Solidified droplets.</summary>
    public int Shot { get; init => field = (int)Require.Within(value, 0, 2000, nameof(Shot)); }

    /// <summary>Median width of a droplet.</summary>
    public double ShotSize { get; init => field = Require.Within(value, 1, 100, nameof(ShotSize)); } = 6;

    /// <summary>Spindle-shaped beads on fibres.</summary>
    public int Beads { get; init => field = (int)Require.Within(value, 0, 2000, nameof(Beads)); }

    /// <summary>Ropes: several fibres side by side, touching.</summary>
    public int Ropes { get; init => field = (int)Require.Within(value, 0, 200, nameof(Ropes)); }

    /// <summary>Most fibres in a rope; at least three are in each.</summary>
    public int RopeFibres { get; init => field = (int)Require.Within(value, 3, 20, nameof(RopeFibres)); } = 5;

    /// <summary>Patches of film.</summary>
    public int Films { get; init => field = (int)Require.Within(value, 0, 50, nameof(Films)); }

    /// <summary>Median width of a film patch.</summary>
    public double FilmSize { get; init => field = Require.Within(value, 3, 300, nameof(FilmSize)); } = 25;

    /// <summary>Clumps of dust.</summary>
    public int Debris { get; init => field = (int)Require.Within(value, 0, 500, nameof(Debris)); }

    /// <summary>Median width of a clump.</summary>
    public double DebrisSize { get; init => field = Require.Within(value, 1, 100, nameof(DebrisSize)); } = 5;
}
