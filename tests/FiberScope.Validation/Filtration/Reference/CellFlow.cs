using MathNet.Numerics.LinearAlgebra;

namespace FiberScope.Validation.Filtration.Reference;

/// <summary>Creeping flow across a cylinder in a cell without vorticity at its rim, with first-order slip at the surface.</summary>
/// <remarks>
/// Lengths in fibre radii, speeds in face velocities. Stream function ψ = F(r) sin θ with
/// F = a r + b / r + c r³ + d r ln r; u_r = F cos θ / r, u_θ = −F′ sin θ; the air flows towards θ = 0.
/// The four conditions: F(1) = 0; slip F′(1) = ζ (F″(1) − F′(1)) with ζ = 0.998 Kn; F(rim) = rim; no vorticity at the rim.
/// They are solved here as a linear system, on purpose not by the closed form that the product uses.
/// Source of the problem: Kuwabara (1959), J. Phys. Soc. Jpn. 14, 527; slip length 0.998 λ: Albertoni, Cercignani and
/// Gotusso (1963), Phys. Fluids 6, 993 (both from memory).
/// </remarks>
internal sealed class CellFlow
{
    private readonly double _a;
    private readonly double _b;
    private readonly double _c;
    private readonly double _d;

    /// <summary>Solves the flow.</summary>
    /// <param name="solidity">α, 0 &lt; α &lt; 1.</param>
    /// <param name="knudsen">Kn = 2 λ / df, 0 or above.</param>
    public CellFlow(double solidity, double knudsen = 0)
    {
        Solidity = solidity;
        Knudsen = knudsen;
        Rim = 1 / Math.Sqrt(solidity);
        var zeta = 0.998 * knudsen;
        var conditions = Matrix<double>.Build.DenseOfArray(new[,]
        {
            { 1, 1, 1, 0 },
            { 1 + zeta, -1 - (3 * zeta), 3 - (3 * zeta), 1 },
            { Rim, 1 / Rim, Rim * Rim * Rim, Rim * Math.Log(Rim) },
            { 0, 0, 8 * Rim, 2 / Rim },
        });
        var solution = conditions.Solve(Vector<double>.Build.DenseOfArray([0, 0, Rim, 0]));
        (_a, _b, _c, _d) = (solution[0], solution[1], solution[2], solution[3]);
    }

    /// <summary>α.</summary>
    public double Solidity { get; }

    /// <summary>Kn = 2 λ / df.</summary>
    public double Knudsen { get; }

    /// <summary>The cell's radius, α^−½.</summary>
    public double Rim { get; }

    /// <summary>Drag on the fibre per length, divided by 4 π μ U.</summary>
    public double Drag => _d;

    /// <summary>F(r), for r from 1 to the rim.</summary>
    public double Stream(double r) => (_a * r) + (_b / r) + (_c * r * r * r) + (_d * r * Math.Log(r));

    /// <summary>F′(r).</summary>
    public double StreamSlope(double r) => _a - (_b / (r * r)) + (3 * _c * r * r) + (_d * (Math.Log(r) + 1));

    /// <summary>F″(r).</summary>
    public double StreamCurvature(double r) => (2 * _b / (r * r * r)) + (6 * _c * r) + (_d / r);

    /// <summary>Exact interception of particles of R = dp / df without inertia or diffusion: E_R = F(1 + R).</summary>
    public double Interception(double ratio) => 1 + ratio >= Rim ? Rim : Stream(1 + ratio);

    /// <summary>The air's velocity in Cartesian components at a point outside the fibre.</summary>
    public (double X, double Y) Velocity(double x, double y)
    {
        var squared = (x * x) + (y * y);
        var r = Math.Sqrt(squared);
        var radial = Stream(r) * x / squared;
        var tangential = -StreamSlope(r) * y / r;
        return (((radial * x) - (tangential * y)) / r, ((radial * y) + (tangential * x)) / r);
    }
}
