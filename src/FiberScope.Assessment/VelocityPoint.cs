using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>The forecast at one face velocity.</summary>
/// <param name="FaceVelocity">Flow over media area.</param>
/// <param name="PressureDrop">Pressure drop across all layers.</param>
/// <param name="MostPenetratingSize">MPPS; null when penetration has no maximum inside 10 nm to 2 µm.</param>
/// <param name="Penetration">Penetration at the MPPS, the curve's largest where there is none; dimensionless, 0 to 1.</param>
/// <param name="QualityFactorPerPascal">−ln P / Δp at that size; 1/Pa.</param>
public sealed record VelocityPoint(Speed FaceVelocity, Pressure PressureDrop, Length? MostPenetratingSize, double Penetration, double QualityFactorPerPascal);
