using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Predicting;

/// <summary>What the fields tell the filtration model beside diameters and solidity, where the swatch file does not tell it.</summary>
/// <param name="Openings">The openings between the foremost fibres, for straining; null when told, or too few were seen.</param>
/// <param name="WeightVariation">Coefficient of variation of the local basis weight; null when told, or when the mat is too thick to see through.</param>
/// <param name="Layer">The layer's name; may be empty.</param>
internal sealed record MeasuredTraits(OpeningSummary? Openings, double? WeightVariation, string Layer)
{
    private const int LeastOpenings = 30;

    /// <summary>The widest that the model takes.</summary>
    private const double MostVariation = 0.9;

    /// <summary>What was used of the measured structure, for the reader.</summary>
    public IEnumerable<Caveat> Caveats
    {
        get
        {
            var where = Layer.Length > 0 ? $"layer '{Layer}': " : "";
            if (Openings is { } o)
            {
                yield return new Caveat("openings-measured", FormattableString.Invariant($"{where}Straining uses the openings seen between the foremost fibres (median {o.Median.Micrometers:G3} µm): deeper layers narrow them, so it is a lower bound; tell 'openings' to replace it."));
            }

            if (WeightVariation is { } cv)
            {
                yield return new Caveat("basis-weight-variation-measured", FormattableString.Invariant($"{where}The basis weight is taken to vary by {cv:P0} from place to place, from the cover of the largest windows of the fields; tell 'basis_weight_variation' to replace it."));
            }
        }
    }

    /// <summary>The same for the recipe.</summary>
    public IEnumerable<RecipeEntry> Entries
    {
        get
        {
            var suffix = Layer.Length > 0 ? ", " + Layer : "";
            if (Openings is { } o)
            {
                yield return new RecipeEntry("openings" + suffix, FormattableString.Invariant($"median {o.Median.Micrometers:G4} µm, GSD {o.GeometricStandardDeviation:G3}"), "measured");
            }

            if (WeightVariation is { } cv)
            {
                yield return new RecipeEntry("basis weight variation" + suffix, FormattableString.Invariant($"{cv:G3}"), "measured");
            }
        }
    }

    public static MeasuredTraits Of(LayerFinding layer, LayerTraits told) => new(
        told.Openings is null && layer.Structure?.Openings is { Count: >= LeastOpenings } o ? o : null,
        told.BasisWeightVariation is null ? Variation(layer) : null,
        layer.Name);

    public MediaLayer PutInto(MediaLayer layer) => layer with
    {
        Openings = Openings is { } o ? new MatOpenings(o.Median, Math.Clamp(o.GeometricStandardDeviation, 1.01, 20)) : layer.Openings,
        BasisWeightVariation = WeightVariation ?? layer.BasisWeightVariation,
    };

    /// <summary>
    /// Only a layer whose ground shows through tells its local weight: w = −ln(1 − C) up to a factor (see <see cref="ImageSolidity"/>), so
    /// that a spread s of the cover is one of s / ((1 − C) w) of the weight.
    /// </summary>
    private static double? Variation(LayerFinding layer)
    {
        if (layer.Structure is not { Uniformity.Windows: [.., var largest], Openings: { } openings } || !layer.Fields.Any(f => f.IsIncluded && f.Measurement.FibreShare is not null))
        {
            return null;
        }

        var open = Math.Clamp(openings.OpenShare, 0.01, 0.99);
        return Math.Min(MostVariation, largest.StandardDeviation / (open * -Math.Log(open)));
    }
}
