using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>What fibres are made of.</summary>
/// <param name="Key">The short name that files use, lower case: <c>pp</c>, <c>pet</c>…</param>
/// <param name="Name">The chemical name.</param>
/// <param name="Density">The usual density of the drawn, partly crystalline fibre at room temperature.</param>
/// <param name="DensityUncertainty">The standard uncertainty of that density: grades, crystallinity and additives differ.</param>
/// <param name="Source">Where the density comes from.</param>
public sealed record Polymer(string Key, string Name, Density Density, Density DensityUncertainty, string Source)
{
    private const string Handbook = "from memory; the range of the usual polymer handbooks. Give a measured density where it matters.";

    /// <summary>The polymers whose density is known here.</summary>
    public static ImmutableArray<Polymer> Known { get; } =
    [
        Of("pp", "polypropylene", 905, 5),
        Of("pe", "polyethylene, high density", 955, 8),
        Of("pet", "poly(ethylene terephthalate)", 1380, 15),
        Of("pbt", "poly(butylene terephthalate)", 1310, 10),
        Of("pla", "poly(lactic acid)", 1250, 10),
        Of("pa6", "polyamide 6", 1140, 8),
        Of("pa66", "polyamide 6,6", 1140, 8),
        Of("pan", "polyacrylonitrile", 1180, 10),
        Of("pvdf", "poly(vinylidene fluoride)", 1780, 15),
        Of("ptfe", "polytetrafluoroethylene", 2180, 25),
        Of("ps", "polystyrene", 1050, 5),
        Of("pc", "polycarbonate", 1200, 8),
        Of("pu", "polyurethane, thermoplastic", 1150, 40),
        Of("cellulose", "cellulose, cotton or regenerated", 1520, 20),
        Of("glass", "glass, borosilicate microfibre", 2500, 50),
    ];

    /// <summary>The polymer with a short name, in any case; null when it is not known.</summary>
    public static Polymer? Find(string key) => Known.FirstOrDefault(p => string.Equals(p.Key, key, StringComparison.OrdinalIgnoreCase));

    private static Polymer Of(string key, string name, double density, double uncertainty) =>
        new(key, name, Density.FromKilogramsPerCubicMeter(density), Density.FromKilogramsPerCubicMeter(uncertainty), Handbook);
}
