using FiberScope.Assessment.Input;
using FiberScope.Assessment.Predicting;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Designing;

/// <summary>The model run backwards for a design file.</summary>
public static class Designer
{
    /// <summary>Trials of the first, even grid over all variables; the search refines about its best.</summary>
    private const double Trials = 1200;

    private const int FewestSteps = 3;
    private const int MostSteps = 24;
    private const int Kept = 5;
    private const int MapSteps = 25;

    /// <summary>Searches, and maps two variables about the best.</summary>
    /// <param name="design">What is asked.</param>
    /// <param name="settings">Correlations, draws and seed.</param>
    /// <param name="cancellation">Stops the work between its parts.</param>
    public static DesignFinding Run(DesignFile design, ForecastSettings settings, CancellationToken cancellation)
    {
        var steps = (int)Math.Clamp(Math.Pow(Trials, 1.0 / design.Variables.Length), FewestSteps, MostSteps);
        var candidates = Search(Predictor.Prepared(design.Start.Layers, design.Start.Operation, design.Start.Request, settings), design, settings).Search(steps, Kept);
        cancellation.ThrowIfCancellationRequested();
        var best = candidates[0];
        var surer = new SurerDesign(design, settings, steps).Find(candidates[0]);
        cancellation.ThrowIfCancellationRequested();
        DesignMap? map = null;
        if (design.Map is var (across, up))
        {
            var (a, u) = (design.Variables[across], design.Variables[up]);
            map = new DesignMap(a, u, Search(best.Layers, design, settings).Map(a, u, MapSteps));
        }

        cancellation.ThrowIfCancellationRequested();
        Caveat[] calibrated = design.Start.Request.Calibration is { } calibration ? [calibration.Note, .. calibration.Caveats] : [];
        return new DesignFinding
        {
            Design = design,
            Correlations = settings.Correlations,
            Candidates = candidates,
            Surer = surer,
            Map = map,
            Caveats = [.. calibrated, .. MediaModel.Forecast(best.Layers, design.Start.Operation, settings with { Draws = 0 }).Caveats],
        };
    }

    private static MediaDesign Search(IEnumerable<MediaLayer> start, DesignFile design, ForecastSettings settings) =>
        new(start, design.Start.Operation, design.Targets, design.Variables, design.FibreDensity, settings);
}
