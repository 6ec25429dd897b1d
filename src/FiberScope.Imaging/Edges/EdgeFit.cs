namespace FiberScope.Imaging.Edges;

/// <summary>Where the geometric edges of a fibre are.</summary>
/// <param name="Left">Left edge; pixels from the centre line.</param>
/// <param name="Right">Right edge; pixels from the centre line.</param>
/// <param name="Blur">Blur as the sigma of a Gaussian; pixels.</param>
/// <param name="Rim">Strength of the rim law against the flat inside.</param>
/// <param name="Dome">How much darker the flanks are than the middle, before the rims.</param>
/// <param name="WidthUncertainty">Standard uncertainty of the width; pixels.</param>
/// <param name="Residual">Root-mean-square misfit over the noise.</param>
internal readonly record struct EdgeFit(double Left, double Right, double Blur, double Rim, double Dome, double WidthUncertainty, double Residual)
{
    public double Width => Right - Left;
}
