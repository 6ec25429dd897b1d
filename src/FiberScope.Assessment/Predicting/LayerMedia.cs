using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Predicting;

/// <summary>A measured layer as the filtration model takes it, its uncertainties with it.</summary>
internal static class LayerMedia
{
    /// <summary>The layer; it must have a solidity and a thickness.</summary>
    public static MediaLayer Of(LayerFinding layer)
    {
        var solidity = layer.Solidity!.Combined;

        // Weighing and coverage tell fibre per area; the solidity that follows moves against the thickness.
        var byWeighing = layer.Solidity.Routes.All(r => r.Route is SolidityRoute.Weighing or SolidityRoute.Coverage);
        var relative = solidity.StandardUncertainty / solidity.Value.Fraction;
        return new MediaLayer
        {
            Name = layer.Name,
            Diameters = layer.Survey.Distribution,
            Solidity = solidity.Value,
            Thickness = layer.Thickness!.Value,
            Uncertainty = new LayerUncertainty
            {
                DiameterScale = Math.Min(1, CommonToAllDiameters(layer.Survey)),
                IndependentFibres = layer.Survey.Shapes?.EffectiveCount ?? layer.Survey.FibreCount,
                Solidity = Math.Min(1, byWeighing ? WithoutThickness(relative, layer.ThicknessUncertainty) : relative),
                Thickness = layer.ThicknessUncertainty,
                SolidityByWeighing = byWeighing,
            },
        };
    }

    /// <summary>
    /// What moves all diameters together: every part of the budget but the fibres' own spread, which the draws make anew from the
    /// distribution.
    /// </summary>
    private static double CommonToAllDiameters(DiameterSurvey survey)
    {
        var squares = survey.Budget.Parts.Where(p => p.Name != "fibres").Sum(p => Math.Pow(p.StandardUncertainty / survey.LengthWeighted.Mean, 2));
        return Math.Sqrt(squares);
    }

    /// <summary>A weighed solidity's uncertainty holds the thickness's; the model draws thickness by itself and must not count it twice.</summary>
    private static double WithoutThickness(double relative, double thickness) => Math.Sqrt(Math.Max(0, (relative * relative) - (thickness * thickness)));
}
