namespace FiberScope.Fibres;

/// <summary>One kind of defect in a swatch.</summary>
/// <param name="Kind">Its name: <c>shot</c>, <c>rope</c>, <c>film</c>, <c>debris</c>.</param>
/// <param name="Count">How many were seen.</param>
/// <param name="PerSquareMillimetre">How many per mm².</param>
/// <param name="AreaShare">The share of the area that they take; 0 to 1.</param>
public sealed record DefectShare(string Kind, int Count, double PerSquareMillimetre, double AreaShare);
