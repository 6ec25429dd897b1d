using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Statistics;

namespace FiberScope.Assessment.Measuring;

/// <summary>The routes to a layer's solidity that its swatch file and its pictures open.</summary>
public static class SolidityRoutes
{
    /// <summary>The relative standard uncertainty of a basis weight that came without one. Common practice, no source.</summary>
    public const double BasisWeightUncertainty = 0.02;

    /// <summary>The relative standard uncertainty of a thickness that came without one. Common practice, no source.</summary>
    public const double ThicknessUncertainty = 0.03;

    /// <summary>The relative standard uncertainty of a solidity that was simply told. Common practice, no source.</summary>
    public const double StatedUncertainty = 0.05;

    /// <summary>Every route at hand; empty when there is none.</summary>
    /// <param name="layer">What was told of the layer.</param>
    /// <param name="fields">Its fields.</param>
    /// <param name="survey">Its diameters.</param>
    public static ImmutableArray<SolidityEstimate> Of(SwatchLayer layer, IReadOnlyList<FieldFinding> fields, DiameterSurvey survey)
    {
        ImmutableArray<SolidityEstimate> routes = [.. Told(layer), .. ImageRoutes.Of(fields, layer.Thickness, survey)];
        return routes.IsEmpty && layer.Thickness is not null ? [ImageRoutes.Unmeasured()] : routes;
    }

    private static ImmutableArray<SolidityEstimate> Told(SwatchLayer layer)
    {
        var routes = ImmutableArray.CreateBuilder<SolidityEstimate>();
        if (layer is { BasisWeight: { } weight, Thickness: { } thickness, Material: { } material })
        {
            var value = Solidity.FromWeighing(weight.Value, material.Density, thickness.Value);
            var (w, t, d) = (weight.RelativeUncertainty ?? BasisWeightUncertainty, thickness.RelativeUncertainty ?? ThicknessUncertainty, material.RelativeUncertainty);
            var relative = Math.Sqrt((w * w) + (t * t) + (d * d));
            routes.Add(new SolidityEstimate(
                SolidityRoute.Weighing,
                value,
                relative * value.Fraction,
                FormattableString.Invariant($"Basis weight / (density x thickness); relative uncertainties: weight {w:P1}, thickness {t:P1}, density {d:P1}.")));
        }

        if (layer.Solidity is { } told)
        {
            var note = layer.SolidityUncertainty is { } known
                ? FormattableString.Invariant($"As told, with its relative uncertainty of {known:P1}.")
                : FormattableString.Invariant($"As told, with a relative uncertainty of {StatedUncertainty:P0} assumed.");
            routes.Add(new SolidityEstimate(SolidityRoute.Stated, new Solidity(told), Require.Positive(told) * (layer.SolidityUncertainty ?? StatedUncertainty), note));
        }

        return routes.ToImmutable();
    }
}
