namespace FiberScope.Imaging.Edges;

/// <summary>What the edge model says of one traced fibre.</summary>
/// <param name="Excess">How much wider the steepest points read the fibre than it is; pixels.</param>
/// <param name="Uncertainty">Standard uncertainty of a corrected width, what the model leaves open included; pixels.</param>
/// <param name="Blur">The fibre's own blur, as the sigma of a Gaussian; pixels.</param>
/// <param name="IsFitted">Whether the fibre's own profile was fitted; if not, the excess is what is usual for the picture.</param>
internal readonly record struct Correction(double Excess, double Uncertainty, double Blur, bool IsFitted);
