using System.Diagnostics;
using FiberScope.Imaging;
using FiberScope.Specimens;

namespace FiberScope.Validation.Imaging;

/// <summary>Makes a family's fields, measures them and sets every reading beside the truth.</summary>
internal static class FamilyRun
{
    public static FamilyCheck Of(SpecimenRecipe family, bool reporting, int fields, bool quick)
    {
        var checks = new List<FieldCheck>();
        for (var i = 0; i < fields; i++)
        {
            var specimen = SpecimenPicture.Of(family, reporting, i);
            var picture = SpecimenPicture.Micrograph(specimen);
            var clock = Stopwatch.StartNew();
            var measurement = quick ? null : FieldMeter.Measure(picture, new MeasurementSettings());
            IReadOnlyList<PixelReading> readings = measurement is null ? QuickWay.Measure(picture) : measurement.Readings;
            checks.Add(FieldCheck.Of(specimen, measurement, readings, i, clock.Elapsed));
        }

        return new FamilyCheck(family, checks);
    }
}
