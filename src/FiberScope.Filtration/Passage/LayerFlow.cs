namespace FiberScope.Filtration.Passage;

/// <summary>How the air goes through a layer.</summary>
/// <param name="Pascals">Pressure drop.</param>
/// <param name="LeakShare">Share of the air that goes through holes; dimensionless.</param>
internal readonly record struct LayerFlow(double Pascals, double LeakShare);
