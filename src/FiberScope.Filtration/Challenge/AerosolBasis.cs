namespace FiberScope.Filtration;

/// <summary>What counts the same when particles of unlike size are summed.</summary>
public enum AerosolBasis
{
    /// <summary>Every particle, as by a particle counter.</summary>
    Count,

    /// <summary>Every gram, as by a flame photometer or a balance.</summary>
    Mass,

    /// <summary>Every bit of scattered light, as by a light photometer.</summary>
    ScatteredLight,
}
