namespace FiberScope.Fibres;

/// <summary>What counts the same in a distribution of fibre diameters.</summary>
public enum Weighting
{
    /// <summary>Every micrometre of fibre counts the same: what filtration sees.</summary>
    Length,

    /// <summary>Every fibre counts once, however long.</summary>
    Number,
}
