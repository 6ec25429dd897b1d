namespace FiberScope.Specimens;

/// <summary>How a virtual specimen is looked at.</summary>
public enum SpecimenKind
{
    /// <summary>Secondary electrons from above: bright fibres, brighter at their edges, on a dark ground.</summary>
    SecondaryElectron,

    /// <summary>Light through a thin layer: dark rims and bright cores on a bright ground.</summary>
    Transmitted,

    /// <summary>An embedded and polished section: bright discs and ellipses on a dark ground.</summary>
    CrossSection,
}
