using FiberScope.Fibres;
using FiberScope.Imaging;
using FiberScope.Specimens;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Validation.Imaging;

/// <summary>How often the 95 % interval of the mean holds the mean of all mats of the recipe, over many small swatches.</summary>
/// <param name="Swatches">Swatches made.</param>
/// <param name="FieldsEach">Fields of each.</param>
/// <param name="Covered">Share of the intervals that hold the true mean.</param>
/// <param name="HalfWidth">Mean half-width of the intervals over the mean.</param>
/// <param name="MeanError">Relative error of the mean over all swatches: an interval cannot cover what is shifted.</param>
/// <param name="Scatter">Standard deviation of the swatches' means over the mean.</param>
internal sealed record CoverageFigures(int Swatches, int FieldsEach, double Covered, double HalfWidth, double MeanError, double Scatter);

/// <summary>Makes the swatches and counts.</summary>
internal static class CoverageRun
{
    // The program's own defaults; the pixel size is known here.
    private const double EdgePixels = 0.1, Selection = 0.02;

    public static SpecimenRecipe Recipe { get; } = Small(SpecimenFamilies.Find("electrospun")!);

    public static CoverageFigures Run(int swatches, int fieldsEach, bool reporting)
    {
        var surveys = new List<DiameterSurvey>();
        var (diameters, lengths) = (new List<double>(), new List<double>());
        var pixel = Recipe.PixelSize.Meters;
        for (var s = 0; s < swatches; s++)
        {
            var readings = new List<DiameterReading>();
            for (var f = 0; f < fieldsEach; f++)
            {
                var specimen = SpecimenPicture.Of(Recipe, reporting, 10_000 + (s * fieldsEach) + f);
                diameters.AddRange(specimen.Truth.Stations.Select(t => t.Diameter * pixel));
                lengths.AddRange(specimen.Truth.Stations.Select(t => (double)t.Length));
                var measured = FieldMeter.Measure(SpecimenPicture.Micrograph(specimen), new MeasurementSettings());
                readings.AddRange(measured.Readings.Select(r => new DiameterReading(Metres(r.Diameter * pixel), Metres(r.StandardUncertainty * pixel), Metres(r.RepresentedLength * pixel), r.Trace, f)));
            }

            if (readings.Count > 0)
            {
                surveys.Add(DiameterSurvey.From(readings, new SurveySettings { ScaleRelativeUncertainty = 0, EdgeUncertainty = Metres(EdgePixels * pixel), SelectionRelativeUncertainty = Selection, BootstrapReplicates = 200 }));
            }
        }

        var truth = new WeightedSample([.. diameters], [.. lengths]).Mean;
        var means = WeightedSample.Even([.. surveys.Select(s => s.LengthWeighted.Mean.Meters)]);
        return new CoverageFigures(
            surveys.Count,
            fieldsEach,
            surveys.Count(s => s.MeanInterval95.Low.Meters <= truth && truth <= s.MeanInterval95.High.Meters) / (double)swatches,
            surveys.Average(s => (s.MeanInterval95.High - s.MeanInterval95.Low).Meters / 2 / truth),
            (means.Mean / truth) - 1,
            means.StandardDeviation / truth);
    }

    private static SpecimenRecipe Small(SpecimenRecipe family) => family with { WidthPixels = 448, HeightPixels = 384 };

    private static Length Metres(double metres) => Length.FromMeters(metres);
}
