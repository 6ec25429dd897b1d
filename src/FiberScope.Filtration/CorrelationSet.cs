namespace FiberScope.Filtration;

/// <summary>A set of single-fibre formulas, taken whole: efficiency, drag, (1 − α) convention and range.</summary>
public enum CorrelationSet
{
    /// <summary>The fan model with an inhomogeneity factor (Kirsch and Stechkina 1978); <c>kirsch-stechkina-1978</c>.</summary>
    KirschStechkina1978,

    /// <summary>Lee and Liu (1982), empirical coefficients; <c>lee-liu-1982</c>.</summary>
    LeeLiu1982,

    /// <summary>The textbook set of Hinds (1999), chapter 9; <c>hinds-1999</c>.</summary>
    Hinds1999,

    /// <summary>The numerical solution of the Kuwabara cell with slip, tabulated: an even array of fibres; <c>cell</c>.</summary>
    Cell,

    /// <summary>The same, as uneven as Davies' law for real pads says mats are; <c>cell-mat</c>.</summary>
    CellMat,
}
