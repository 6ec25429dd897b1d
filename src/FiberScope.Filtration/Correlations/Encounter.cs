namespace FiberScope.Filtration.Correlations;

/// <summary>The dimensionless numbers of one particle size passing one fibre.</summary>
/// <param name="Peclet">Pe = U df / D.</param>
/// <param name="Ratio">R = dp / df.</param>
/// <param name="Stokes">Stk = ρ dp² Cc U / (18 μ df).</param>
internal readonly record struct Encounter(double Peclet, double Ratio, double Stokes);
