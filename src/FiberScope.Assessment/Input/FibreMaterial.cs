using FiberScope.Fibres;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>What a layer's fibres are made of, as far as weighing needs it.</summary>
/// <param name="Name">For people: the polymer's name, or <c>density as given</c>.</param>
/// <param name="Density">The density of the fibre; above zero.</param>
/// <param name="RelativeUncertainty">The standard uncertainty of the density over the density; dimensionless.</param>
/// <param name="Source">Where the density comes from.</param>
public sealed record FibreMaterial(string Name, Density Density, double RelativeUncertainty, string Source)
{
    /// <summary>The relative standard uncertainty of a density that was given without one. Common practice, no source.</summary>
    public const double GivenDensityUncertainty = 0.005;

    /// <summary>The material of a polymer from the table.</summary>
    public static FibreMaterial Of(Polymer polymer) =>
        new(polymer.Name, polymer.Density, polymer.DensityUncertainty / polymer.Density, "polymer table: " + polymer.Source);

    /// <summary>The material of a density that a person gave.</summary>
    public static FibreMaterial Of(Stated<Density> density) =>
        new("density as given", density.Value, density.RelativeUncertainty ?? GivenDensityUncertainty, "as given");
}
