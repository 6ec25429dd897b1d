namespace FiberScope.Imaging.Edges;

/// <summary>What is known of a picture's edges before one fibre is looked at.</summary>
/// <param name="Blur">The usual blur, as the sigma of a Gaussian; pixels.</param>
/// <param name="BlurSpread">The standard deviation of its logarithm from fibre to fibre.</param>
/// <param name="Rim">The usual strength of the rim law against the flat inside; dimensionless.</param>
/// <param name="RimSpread">The standard deviation of it from fibre to fibre.</param>
/// <param name="Dome">How much darker the flanks usually are than the middle, before the rims; dimensionless.</param>
/// <param name="DomeSpread">The standard deviation of it from fibre to fibre.</param>
internal sealed record EdgePriors(double Blur, double BlurSpread, double Rim, double RimSpread, double Dome, double DomeSpread)
{
    /// <summary>Before anything was seen: a sharp picture with moderate rims, hardly trusted.</summary>
    public static EdgePriors Vague(double blur) => new(blur, 0.5, 0.3, 0.5, 0.05, 0.15);
}
