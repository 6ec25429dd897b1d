namespace FiberScope.Imaging;

/// <summary>How a micrograph was made.</summary>
public enum ImagingMode
{
    /// <summary>Secondary electrons, seen from above: bright fibres with brighter edges on a dark ground.</summary>
    SecondaryElectron,

    /// <summary>Light through a thin layer: dark fibres with bright cores on a bright ground.</summary>
    Transmitted,

    /// <summary>An embedded and polished section: bright discs and ellipses on a dark ground.</summary>
    CrossSection,
}
