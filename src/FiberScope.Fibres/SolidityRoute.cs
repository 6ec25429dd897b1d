namespace FiberScope.Fibres;

/// <summary>How a solidity was found.</summary>
public enum SolidityRoute
{
    /// <summary>By weighing: basis weight over density and thickness.</summary>
    Weighing,

    /// <summary>By the area share of fibre in an embedded section (Delesse's principle).</summary>
    CrossSection,

    /// <summary>By the coverage of a thin layer in transmitted light.</summary>
    Coverage,

    /// <summary>By the pressure drop of one measured point.</summary>
    PressureDrop,

    /// <summary>By the look of a thick mat from above, which says little.</summary>
    TopView,

    /// <summary>Told by the user, not measured.</summary>
    Stated,
}
