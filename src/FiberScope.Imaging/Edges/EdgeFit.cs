namespace FiberScope.Imaging.Edges;

/// <summary>Where the geometric edges of a fibre are, and what its edges look like.</summary>
internal readonly record struct EdgeFit
{
    /// <summary>The left edge; pixels from the centre line.</summary>
    public double Left { get; init; }

    /// <summary>The right edge; pixels from the centre line.</summary>
    public double Right { get; init; }

    public double Width => Right - Left;

    /// <summary>Standard uncertainty of <see cref="Width"/> from noise, blur and rims; pixels.</summary>
    public double WidthUncertainty { get; init; }

    /// <summary>Blur as the sigma of a Gaussian; pixels.</summary>
    public double Blur { get; init; }

    public double LogBlurUncertainty { get; init; }

    /// <summary>Strength of the rim law against the inside.</summary>
    public double Rim { get; init; }

    public double RimUncertainty { get; init; }

    /// <summary>How much darker the flanks are than the middle before the rims, against the inside.</summary>
    public double Dome { get; init; }

    public double DomeUncertainty { get; init; }

    /// <summary>Root-mean-square misfit over the noise; about 1 when the model is right.</summary>
    public double Residual { get; init; }

    /// <summary>Length of fibre that the profile is the mean of; pixels. Its say among other fits.</summary>
    public double Length { get; init; }

    /// <summary>Whether the search ended at a fibre brighter than both its outsides, near where it was looked for.</summary>
    public bool IsAccepted { get; init; }
}
