using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration.Passage;
using UnitsNet;

namespace FiberScope.Filtration.Correlations;

/// <summary>What a reader of a forecast must know.</summary>
internal static class ForecastCaveats
{
    private const double UsualVariation = 0.5;

    public static IEnumerable<Caveat> For(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ImmutableArray<Length> particles, MediumModel central, MediumModel[] media)
    {
        var metres = particles.Select(p => p.Meters).ToArray();
        foreach (var caveat in RangeCaveats.For(layers, point, metres, central.Model.Range))
        {
            yield return caveat;
        }

        var others = media.Where(m => m != central && RangeCaveats.For(layers, point, metres, m.Model.Range).Any(c => c.Code == RangeCaveats.Outside))
            .Select(m => m.Model.Range.Name).ToArray();
        if (others.Length > 0)
        {
            yield return new Caveat("band-outside-fitted-range", $"The model band also holds {string.Join(" and ", others)}, outside the range of the fit for part of this curve.");
        }

        foreach (var caveat in layers.SelectMany((layer, i) => ForLayer(layer, i)))
        {
            yield return caveat;
        }
    }

    private static IEnumerable<Caveat> ForLayer(MediaLayer layer, int index)
    {
        var name = RangeCaveats.Name(layer, index);
        if (layer.InhomogeneityFactor is < 0.8 or > 3)
        {
            yield return new Caveat("unusual-inhomogeneity", FormattableString.Invariant($"{name}: an inhomogeneity factor of {layer.InhomogeneityFactor:G3} is unusual (0.8 to 3); check diameter, thickness and solidity."));
        }

        if (layer.BasisWeightVariation > UsualVariation)
        {
            yield return new Caveat("very-uneven", FormattableString.Invariant($"{name}: a basis weight that varies by {layer.BasisWeightVariation:P0} makes the thin places decide; the gamma law behind them is a guess there."));
        }

        if (layer.Charge is { CoulombsPerSquareMetre: > 0 })
        {
            yield return new Caveat("charge-fades", FormattableString.Invariant($"{name}: the forecast holds for a fresh charge; heat, solvents, oil mist and loading lower it. Judge the discharged state as well."));
        }
    }
}
