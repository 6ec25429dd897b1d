using FiberScope.Fibres;

namespace FiberScope.Assessment.Input;

/// <summary>A layer's fibre diameters as a file tells them, and how well they are known.</summary>
/// <param name="Distribution">The length-weighted distribution.</param>
/// <param name="ScaleUncertainty">Relative standard uncertainty of all diameters together; dimensionless, 0 to 1.</param>
/// <param name="IndependentFibres">How many fibres the distribution rests on; null to take its shape as exact.</param>
internal sealed record FibreDiameters(DiameterDistribution Distribution, double ScaleUncertainty, double? IndependentFibres);
