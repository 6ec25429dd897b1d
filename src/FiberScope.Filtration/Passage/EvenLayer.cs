namespace FiberScope.Filtration.Passage;

/// <summary>What the flow through a layer rests on, before unevenness, bonds and holes.</summary>
/// <param name="PascalsPerMetrePerSecond">Resistance of the even layer.</param>
/// <param name="ThicknessMetres">Its thickness, which is the length of its holes.</param>
internal readonly record struct EvenLayer(double PascalsPerMetrePerSecond, double ThicknessMetres);
