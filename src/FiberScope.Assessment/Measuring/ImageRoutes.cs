using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Imaging;
using UnitsNet;

namespace FiberScope.Assessment.Measuring;

/// <summary>The routes to a layer's solidity that its pictures open.</summary>
public static class ImageRoutes
{
    /// <summary>The range that the solidity of nearly every fibre medium lies in. Common practice, no source.</summary>
    private const double LeastUsual = 0.02, MostUsual = 0.3;

    /// <summary>How far the outline of a fibre may be off, as a relative standard uncertainty of the coverage.</summary>
    private const double OutlineInLight = 0.04, OutlineFromAbove = 0.08;

    /// <summary>Every route at hand; empty when there is none.</summary>
    /// <param name="fields">The layer's fields; those unfit for measuring count only where there are no others.</param>
    /// <param name="thickness">The layer's thickness; null when not told, and then only sections speak.</param>
    /// <param name="survey">The layer's diameters.</param>
    public static IEnumerable<SolidityEstimate> Of(IReadOnlyList<FieldFinding> fields, Stated<Length>? thickness, DiameterSurvey survey)
    {
        if (Shares(fields, ImagingMode.CrossSection) is { Length: > 0 } sections)
        {
            yield return ImageSolidity.FromSections(sections);
        }

        if (thickness is null)
        {
            yield break;
        }

        foreach (var (mode, outline, seen) in new[] { (ImagingMode.Transmitted, OutlineInLight, "in transmitted light"), (ImagingMode.SecondaryElectron, OutlineFromAbove, "from above, the ground showing between the fibres") })
        {
            if (Shares(fields, mode) is { Length: > 0 } coverages && Coverage(coverages, thickness, survey, outline, seen) is { } estimate)
            {
                yield return estimate;
            }
        }
    }

    /// <summary>What may be said of a mat of which nothing but the look from above is known: what is usual.</summary>
    public static SolidityEstimate Unmeasured()
    {
        var middle = Math.Sqrt(LeastUsual * MostUsual);
        return new SolidityEstimate(
            SolidityRoute.TopView,
            new Solidity(middle),
            middle * Math.Log(MostUsual / LeastUsual) / (2 * 1.96),
            FormattableString.Invariant($"Not measured: a mat too thick to see through says little of its solidity from above; nearly all fibre media lie from {LeastUsual} to {MostUsual}. Give basis weight and polymer, or a cross-section."));
    }

    private static SolidityEstimate? Coverage(double[] coverages, Stated<Length> thickness, DiameterSurvey survey, double outline, string seen)
    {
        var byLength = survey.LengthWeighted;
        var known = thickness.RelativeUncertainty ?? SolidityRoutes.ThicknessUncertainty;
        try
        {
            return ImageSolidity.FromCoverage(coverages, byLength.Mean, byLength.StandardDeviation, thickness.Value, outline, known, seen);
        }
        catch (ArgumentException)
        {
            // A thickness far too small for what the fields show: no solidity at all rather than a wrong one.
            return null;
        }
    }

    private static double[] Shares(IReadOnlyList<FieldFinding> fields, ImagingMode mode)
    {
        var telling = fields.Where(f => f.Measurement.Micrograph.Mode == mode && f.Measurement.FibreShare is > 0 and < 1).ToArray();
        var fit = telling.Where(f => f.Measurement.Fitness.IsFit).ToArray();
        return [.. (fit.Length > 0 ? fit : telling).Select(f => f.Measurement.FibreShare!.Value)];
    }
}
