using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;

namespace FiberScope.Assessment.Measuring;

/// <summary>What measuring alone gives: the fields and their pooled diameters.</summary>
/// <param name="Fields">The fields, in the order of the images.</param>
/// <param name="Survey">The pooled diameters.</param>
/// <param name="Solidity">The solidity where the images tell it by themselves: from sections; null otherwise.</param>
/// <param name="Caveats">What a reader must know.</param>
public sealed record MeasurementRun(ImmutableArray<FieldFinding> Fields, DiameterSurvey Survey, SolidityFinding? Solidity, ImmutableArray<Caveat> Caveats)
{
    /// <summary>Measures images that belong together.</summary>
    /// <remarks>Unfit fields are left out of the pool; should every field be unfit, they are pooled all the same and a caveat says so.</remarks>
    /// <param name="images">The images.</param>
    /// <param name="settings">How to measure.</param>
    /// <param name="progress">Told after every step; null when nobody watches.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="InputException">An image cannot be read, or none shows a measurable fibre.</exception>
    public static MeasurementRun Of(ImageSet images, MeasuringSettings settings, IProgress<RunProgress>? progress, CancellationToken cancellation)
    {
        var fields = new Measurer(settings).Measure([images], progress, cancellation)[0];
        if (LayerPool.Of(fields, settings) is { } pool)
        {
            return Of(fields, pool, []);
        }

        var insisted = DiameterSource.Choose(fields.Select(f => f.Measurement.Readings.IsEmpty ? f : f with { LeftOutBecause = null }));
        var unfit = fields.Zip(insisted).Where(p => p.Second.IsIncluded).Select(p => new Caveat("unfit-field-counted", $"{p.First.Name} counts although it is {p.First.LeftOutBecause}"));
        return LayerPool.Of(insisted, settings) is { } all
            ? Of(insisted, all, unfit)
            : throw new InputException(fields.Select(f => new InputProblem(f.Name, 0, f.LeftOutBecause!)));
    }

    private static MeasurementRun Of(ImmutableArray<FieldFinding> fields, LayerPool pool, IEnumerable<Caveat> unfit)
    {
        SolidityEstimate[] routes = [.. ImageRoutes.Of(fields, null, pool.Survey)];
        return new MeasurementRun(fields, pool.Survey, routes.Length == 0 ? null : SolidityFinding.Combine(routes), [.. unfit, .. pool.Caveats]);
    }
}
