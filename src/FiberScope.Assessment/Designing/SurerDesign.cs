using FiberScope.Assessment.Input;
using FiberScope.Assessment.Predicting;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Designing;

/// <summary>Seeks a structure that keeps the targets even where the models and the uncertain inputs are against it.</summary>
/// <param name="design">What is asked.</param>
/// <param name="settings">Correlations, draws and seed.</param>
/// <param name="steps">Grid points per variable.</param>
internal sealed class SurerDesign(DesignFile design, ForecastSettings settings, int steps)
{
    /// <summary>Draws behind the bands that the targets are tightened by.</summary>
    private const int Draws = 500;

    /// <summary>A best structure whose least probable target is this probable needs nothing surer.</summary>
    private const double SureEnough = 0.9;

    /// <summary>A gain in probability below this is not worth telling.</summary>
    private const double WorthIt = 0.03;

    /// <summary>How far towards the unfavourable ends of the bands the targets are tightened; the whole way first.</summary>
    private static readonly double[] Extents = [1, 0.5, 0.25];

    /// <summary>
    /// The best structure by targets that are tightened by as much as the unfavourable ends of the bands lie beyond the central forecast of
    /// the best one, or by part of it where that is out of reach; judged by the targets themselves. Null when the best is sure enough, or
    /// none is surer.
    /// </summary>
    public DesignCandidate? Find(DesignCandidate best)
    {
        if (!best.MeetsTargets || Least(best) >= SureEnough)
        {
            return null;
        }

        var forecast = MediaModel.Forecast(best.Layers, design.Start.Operation, settings with { Draws = Math.Min(settings.Draws, Draws) });
        foreach (var extent in Extents)
        {
            var judged = Search(design.Targets).Judge(Search(Tightened(forecast, extent)).Search(steps, 1)[0]);
            if (judged.MeetsTargets && Least(judged) > Least(best) + WorthIt)
            {
                return judged;
            }
        }

        return null;
    }

    private static double Least(DesignCandidate candidate) => candidate.Probabilities.Values.DefaultIfEmpty(1).Min();

    private DesignTargets Tightened(MediaForecast forecast, double extent)
    {
        var open = forecast.Uncertainty;
        double Worst(double central, double? models, double? inputs) => Math.Max(central, Math.Max(models ?? 0, inputs ?? 0));
        var pascals = forecast.PressureDrop.Pascals;
        var drop = Worst(pascals, forecast.PressureDropModelBandPascals?.High, open?.PressureDropPascals.High) / pascals;
        var passes = forecast.PenetrationAtMostPenetratingSize;
        var worst = Math.Min(0.999, Worst(passes, forecast.PenetrationAtMostPenetratingSizeModelBand?.High, open?.PenetrationAtMostPenetratingSize.High));

        // Depths of filtration add up, so a band is a factor on -ln P.
        var depth = passes < worst ? Math.Log(passes) / Math.Log(worst) : 1;
        return design.Targets with
        {
            PressureDrop = design.Targets.PressureDrop is { } limit ? Pressure.FromPascals(limit.Pascals / Math.Pow(drop, extent)) : null,
            PenetrationAtMostPenetratingSize = design.Targets.PenetrationAtMostPenetratingSize is { } p ? Math.Pow(p, Math.Pow(depth, extent)) : null,
            AerosolPenetration = design.Targets.AerosolPenetration is { } a ? Math.Pow(a, Math.Pow(depth, extent)) : null,
        };
    }

    private MediaDesign Search(DesignTargets targets) =>
        new(Predictor.Prepared(design.Start.Layers, design.Start.Operation, design.Start.Request, settings), design.Start.Operation, targets, design.Variables, design.FibreDensity, settings);
}
