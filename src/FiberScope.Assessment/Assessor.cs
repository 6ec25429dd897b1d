using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Assessment.Measuring;
using FiberScope.Assessment.Predicting;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment;

/// <summary>The main job: from a swatch file to everything that can be said about the swatch.</summary>
/// <param name="settings">What changes the numbers besides the file and its images.</param>
/// <param name="clock">Tells the time that the record is stamped with.</param>
public sealed class Assessor(AssessmentSettings settings, TimeProvider clock)
{
    /// <summary>Assesses a swatch.</summary>
    /// <param name="swatch">The checked swatch file.</param>
    /// <param name="progress">Told after every step; null when nobody watches.</param>
    /// <param name="cancellation">Stops the work between and within fields.</param>
    /// <exception cref="InputException">Images are missing or unreadable, or a layer shows no measurable fibre at all.</exception>
    public SwatchAssessment Assess(SwatchFile swatch, IProgress<RunProgress>? progress, CancellationToken cancellation)
    {
        var sets = swatch.Layers.Select(l => new ImageSet(l.Name, l.Imaging, l.Images, swatch.Folder, swatch.Name)).ToArray();
        var fields = new Measurer(settings.Measuring).Measure(sets, progress, cancellation);
        var pools = swatch.Layers.Select((layer, i) => Pool(swatch, layer, fields[i])).ToArray();
        LayerFinding[] layers = [.. swatch.Layers.Select((layer, i) => Layer(layer, fields[i], pools[i].Survey))];
        var prediction = Predict(swatch, layers, cancellation);
        var rig = RigPoints(swatch, prediction);
        return new SwatchAssessment
        {
            Identity = swatch.Identity,
            Layers = [.. layers],
            Forecast = prediction?.Forecast,
            VelocitySweep = prediction?.Sweep() ?? [],
            AirPermeabilities = prediction?.Prediction.Permeabilities ?? [],
            Classes = prediction?.Prediction.Classes ?? [],
            PressureDropLaws = prediction?.Prediction.PressureDropLaws ?? ImmutableSortedDictionary<string, UnitsNet.Pressure>.Empty,
            Challenges = prediction?.Prediction.Challenges ?? [],
            Bands = prediction?.Prediction.Bands ?? [],
            TotalInwardLeakage = prediction?.Prediction.TotalInwardLeakage,
            RigPoints = rig,
            Verdict = swatch.Grade is null ? null : new GradeJudging(layers, layers[0], prediction?.Findings()).Judge(swatch.Grade),
            Recipe = RecipeKeeping.Of(swatch, settings, layers, clock.GetUtcNow()),
            Caveats = [.. pools.SelectMany(p => p.Caveats), .. layers.SelectMany(l => l.Solidity?.Caveats ?? []), .. layers.SelectMany(Unmeasured), .. prediction is null ? [] : layers.Zip(swatch.Layers).SelectMany(p => MeasuredTraits.Of(p.First, p.Second.Traits).Caveats), .. prediction?.Forecast.Caveats ?? [], .. prediction?.FlowCaveats(rig) ?? [], .. Missing(swatch)],
        };
    }

    private LayerPool Pool(SwatchFile swatch, SwatchLayer layer, ImmutableArray<FieldFinding> fields)
    {
        if (LayerPool.Of(fields, settings.Measuring) is { } pool)
        {
            return pool;
        }

        var where = layer.Name.Length > 0 ? $"layer '{layer.Name}': " : "";
        throw new InputException(fields.Select(f => new InputProblem(f.Name, 0, $"{where}{f.LeftOutBecause}"))
            .Append(new InputProblem(swatch.Name, layer.Images[0].Line, $"{where}no field is left to measure")));
    }

    private static LayerFinding Layer(SwatchLayer layer, ImmutableArray<FieldFinding> fields, DiameterSurvey survey)
    {
        var routes = SolidityRoutes.Of(layer, fields, survey);
        return new LayerFinding
        {
            Name = layer.Name,
            Fields = fields,
            Survey = survey,
            Structure = StructurePool.Of(fields),
            Solidity = routes.IsEmpty ? null : SolidityFinding.Combine(routes),
            PolymerName = layer.Material?.Name,
            FibreDensity = layer.Material?.Density,
            BasisWeight = layer.BasisWeight?.Value,
            BasisWeightUncertainty = layer.BasisWeight?.RelativeUncertainty ?? SolidityRoutes.BasisWeightUncertainty,
            Thickness = layer.Thickness?.Value,
            ThicknessUncertainty = layer.Thickness?.RelativeUncertainty ?? SolidityRoutes.ThicknessUncertainty,
        };
    }

    private SwatchPrediction? Predict(SwatchFile swatch, LayerFinding[] layers, CancellationToken cancellation)
    {
        if (swatch.Operation is not { } operation || layers.Any(l => l.Solidity is null || l.Thickness is null))
        {
            return null;
        }

        MediaLayer[] media = [.. layers.Zip(swatch.Layers, (found, told) => told.Traits.PutInto(MeasuredTraits.Of(found, told.Traits).PutInto(LayerMedia.Of(found))))];
        var chosen = ForecastSettingsOf(swatch);
        return new SwatchPrediction(Predictor.Prepared(media, operation, swatch.Request, chosen), operation, swatch.Request, chosen, cancellation);
    }

    private ForecastSettings ForecastSettingsOf(SwatchFile swatch)
    {
        var standard = new ForecastSettings { Seed = settings.Measuring.Seed };
        return Predictor.Settings(swatch.Request, settings.Correlations ?? swatch.Correlations, standard);
    }

    private static ImmutableArray<RigPoint> RigPoints(SwatchFile swatch, SwatchPrediction? prediction) => prediction is null
        ? [.. swatch.RigTests.Select(t => new RigPoint(t.FaceVelocity, t.PressureDrop, t.Particle, t.Penetration, null, null))]
        : prediction.Compare(swatch.RigTests);

    private static IEnumerable<Caveat> Unmeasured(LayerFinding layer)
    {
        if (layer.Solidity is { Routes: [{ Route: SolidityRoute.TopView }] })
        {
            var where = layer.Name.Length > 0 ? $"layer '{layer.Name}': " : "";
            yield return new Caveat("solidity-not-measured", $"{where}The solidity is not measured but only what is usual for fibre media; the forecast's band from it is wide. Give basis weight and polymer, a solidity, or cross-section images.");
        }
    }

    private static IEnumerable<Caveat> Missing(SwatchFile swatch)
    {
        if (swatch.Operation is null)
        {
            yield return new Caveat("no-forecast", "No forecast: the swatch file gives no face_velocity.");
        }
    }
}
