using FiberScope.Statistics;

namespace FiberScope.Filtration;

/// <summary>Standard uncertainties of what is known of a layer; each zero unless given.</summary>
public sealed record LayerUncertainty
{
    /// <summary>Relative standard uncertainty of all diameters together: pixel size, edge, fields.</summary>
    public double DiameterScale { get; init => field = Require.Within(value, 0, 1, nameof(DiameterScale)); }

    /// <summary>
    /// How many independent fibres the distribution rests on; it is drawn anew as if that many had been measured again. Null takes
    /// the distribution's shape as exact.
    /// </summary>
    public double? IndependentFibres { get; init => field = value is { } n ? Require.Positive(n, nameof(IndependentFibres)) : null; }

    /// <summary>
    /// Relative standard uncertainty of solidity; of basis weight over fibre density when <see cref="SolidityByWeighing"/>.
    /// </summary>
    public double Solidity { get; init => field = Require.Within(value, 0, 1, nameof(Solidity)); }

    /// <summary>Relative standard uncertainty of thickness.</summary>
    public double Thickness { get; init => field = Require.Within(value, 0, 1, nameof(Thickness)); }

    /// <summary>
    /// Whether solidity was found by weighing, α = W / (ρ t): then a thickness that is wrong makes solidity wrong the other way, and
    /// the fibre volume per area stays right.
    /// </summary>
    public bool SolidityByWeighing { get; init; }

    /// <summary>Relative standard uncertainty of a given inhomogeneity factor; without one it has no effect.</summary>
    public double Inhomogeneity { get; init => field = Require.Within(value, 0, 1, nameof(Inhomogeneity)); }

    /// <summary>Relative standard uncertainty of the fibre charge.</summary>
    public double Charge { get; init => field = Require.Within(value, 0, 2, nameof(Charge)); }
}
