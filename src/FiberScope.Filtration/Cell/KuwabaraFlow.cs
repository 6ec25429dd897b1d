using FiberScope.Statistics;

namespace FiberScope.Filtration.Cell;

/// <summary>The creeping flow of air across one fibre in its cell, with slip at the fibre's surface.</summary>
/// <remarks>
/// Lengths are in fibre radii and speeds in face velocities. Stream function ψ = F(r) sin θ with
/// F = a r + b / r + c r³ + d r ln r. No vorticity at the cell's rim r = α^−½, where the radial speed is that of the
/// undisturbed air; first-order slip u_θ = ζ r ∂(u_θ / r)/∂r at r = 1 with ζ = 0.998 Kn.
/// Holds for Re ≪ 1; first-order slip is accurate up to Kn ≈ 0.25 and only qualitative to Kn = 1.
/// Sources: Kuwabara (1959), J. Phys. Soc. Jpn. 14(4), 527–532, for the cell; slip coefficient 0.998: Albertoni,
/// Cercignani and Gotusso (1963), Phys. Fluids 6, 993 (both from memory; the solution is re-derived here).
/// </remarks>
public sealed class KuwabaraFlow
{
    /// <summary>Slip length divided by the mean free path; Albertoni, Cercignani and Gotusso (1963), from memory.</summary>
    private const double SlipCoefficient = 0.998;

    private readonly double _a;
    private readonly double _b;
    private readonly double _c;
    private readonly double _d;

    /// <summary>Solves the flow.</summary>
    /// <param name="solidity">α; dimensionless, 0 &lt; α &lt; 1.</param>
    /// <param name="fibreKnudsen">Kn = 2 λ / df; dimensionless, 0 or above.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public KuwabaraFlow(double solidity, double fibreKnudsen)
    {
        var alpha = Require.Inside(solidity, 0, 1);
        var zeta = SlipCoefficient * Require.NotNegative(fibreKnudsen);
        Solidity = alpha;
        FibreKnudsen = fibreKnudsen;
        Rim = 1 / Math.Sqrt(alpha);
        var kappa = (1 - (alpha * (0.5 - zeta))) / (2 * (1 + (2 * zeta)));
        _d = 1 / (-(0.5 * Math.Log(alpha)) - 0.25 + (0.25 * alpha) - ((1 - alpha) * kappa));
        _b = _d * kappa;
        _c = -0.25 * alpha * _d;
        _a = -_b - _c;
    }

    /// <summary>α; dimensionless.</summary>
    public double Solidity { get; }

    /// <summary>Kn = 2 λ / df; dimensionless.</summary>
    public double FibreKnudsen { get; }

    /// <summary>The cell's radius in fibre radii, α^−½.</summary>
    public double Rim { get; }

    /// <summary>Drag per fibre length divided by 4 π μ U; 1 / Ku without slip, less with it.</summary>
    public double Drag => _d;

    /// <summary>Dimensionless pressure drop f = Δp df² / (μ U t) = 16 α × <see cref="Drag"/>.</summary>
    public double PressureDropFactor => 16 * Solidity * _d;

    /// <summary>F′(1), the air's speed along the surface at θ = 90°; zero without slip.</summary>
    public double SurfaceSpeed => _a - _b + (3 * _c) + _d;

    /// <summary>½ F″(1); (1 − α) / Ku without slip.</summary>
    public double HalfCurvature => _b + (3 * _c) + (0.5 * _d);

    /// <summary>F(r), the stream function along θ = 90°.</summary>
    /// <param name="radius">r in fibre radii, from 1 to <see cref="Rim"/>.</param>
    public double Stream(double radius) =>
        (radius * (_a + (_c * radius * radius) + (_d * Math.Log(radius)))) + (_b / radius);

    /// <summary>
    /// Exact interception E_R = F(1 + R): what the fibre collects of particles that follow the air and do not diffuse.
    /// </summary>
    /// <param name="ratio">R = dp / df; dimensionless, 0 or above.</param>
    /// <returns>
    /// E_R per projected fibre diameter, dimensionless, 0 to α^−½. A particle that does not fit in the cell (1 + R ≥ α^−½)
    /// gets all the air that the cell holds.
    /// </returns>
    public double Interception(double ratio)
    {
        var radius = 1 + Require.NotNegative(ratio);
        return radius >= Rim ? Rim : Stream(radius);
    }

    /// <summary>The interception parameter at which interception alone collects a given efficiency: the inverse of <see cref="Interception"/>.</summary>
    /// <param name="efficiency">E, from 0 to α^−½.</param>
    /// <param name="atLeast">Where the answer is known to lie above; dimensionless, 0 or above.</param>
    public double ReachOf(double efficiency, double atLeast)
    {
        var (low, high) = (1 + atLeast, Rim);
        // F = F′(1) x + ½ F″(1) x² + … close to the surface.
        var guess = (Math.Sqrt((SurfaceSpeed * SurfaceSpeed) + (4 * HalfCurvature * efficiency)) - SurfaceSpeed) / (2 * HalfCurvature);
        var radius = Math.Clamp(1 + guess, low, high);
        for (var step = 0; step < 60 && high - low > 1e-9; step++)
        {
            var excess = Stream(radius) - efficiency;
            (low, high) = excess > 0 ? (low, radius) : (radius, high);
            // Newton where it stays inside the bracket, else halving; F is rising and convex near the surface.
            var slope = _a - (_b / (radius * radius)) + (3 * _c * radius * radius) + (_d * (Math.Log(radius) + 1));
            var next = radius - (excess / slope);
            next = next > low && next < high ? next : 0.5 * (low + high);
            if (Math.Abs(next - radius) < 1e-8)
            {
                return next - 1;
            }

            radius = next;
        }

        return radius - 1;
    }
}
