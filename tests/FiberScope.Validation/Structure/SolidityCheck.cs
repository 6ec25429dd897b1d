using FiberScope.Fibres;
using FiberScope.Imaging;
using FiberScope.Specimens;
using FiberScope.Statistics;
using FiberScope.Validation.Imaging;
using UnitsNet;

namespace FiberScope.Validation.Structure;

/// <summary>Solidity by images, swatch by swatch, beside the truth.</summary>
/// <param name="Family">The family.</param>
/// <param name="True">Mean true solidity of the swatch's fields.</param>
/// <param name="TrueShare">Mean true share of the fields that fibre takes: cut area, or cover.</param>
/// <param name="ReadShare">The same as read.</param>
/// <param name="Read">The solidity read.</param>
/// <param name="Low">Lower end of its 95 % interval.</param>
/// <param name="High">Upper end.</param>
internal sealed record SolidityFigures(string Family, double True, double TrueShare, double ReadShare, double Read, double Low, double High)
{
    public double RelativeError => (Read / True) - 1;

    public bool Holds => Low <= True && True <= High;
}

/// <summary>Makes swatches of a family, measures them and works the solidity out as an assessment does.</summary>
internal static class SolidityCheck
{
    public static IEnumerable<SolidityFigures> Of(SpecimenRecipe family, bool reporting, int swatches, int fieldsEach) =>
        Enumerable.Range(0, swatches).Select(s => Swatch(family, [.. Enumerable.Range(s * fieldsEach, fieldsEach).Select(i => SpecimenPicture.Of(family, reporting, i))]));

    private static SolidityFigures Swatch(SpecimenRecipe family, SpecimenCase[] fields)
    {
        var found = fields.Select(f => FieldMeter.Measure(SpecimenPicture.Micrograph(f), new MeasurementSettings())).ToArray();
        double[] shares = [.. found.Select(m => m.FibreShare ?? double.NaN).Where(s => s is > 0 and < 1)];
        var truth = fields.Average(f => f.Truth.LaidSolidity);
        var section = family.Kind == SpecimenKind.CrossSection;
        var cover = section ? truth : fields.Average(f => f.Truth.Cover);
        if (shares.Length == 0)
        {
            return new SolidityFigures(family.Name, truth, cover, double.NaN, double.NaN, double.NaN, double.NaN);
        }

        var estimate = section ? ImageSolidity.FromSections(shares) : FromCoverage(family, found, shares);
        return new SolidityFigures(family.Name, truth, cover, shares.Average(), estimate.Value.Fraction, estimate.Interval95.Low, estimate.Interval95.High);
    }

    private static SolidityEstimate FromCoverage(SpecimenRecipe family, FieldMeasurement[] found, double[] shares)
    {
        var readings = found.SelectMany(m => m.Readings.Select(r => (Diameter: r.Diameter * m.Micrograph.PixelSize.Meters, Length: r.RepresentedLength * m.Micrograph.PixelSize.Meters))).ToArray();
        var sample = new WeightedSample([.. readings.Select(r => r.Diameter)], [.. readings.Select(r => r.Length)]);
        return ImageSolidity.FromCoverage(shares, Length.FromMeters(sample.Mean), Length.FromMeters(sample.StandardDeviation), family.Mat.Thickness);
    }
}
