using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Imaging;
using UnitsNet;

namespace FiberScope.Assessment.Measuring;

/// <summary>Brings a field's readings from pixels to lengths.</summary>
public static class FieldReadings
{
    /// <summary>The readings of a field as lengths on the specimen.</summary>
    /// <param name="measurement">The field.</param>
    /// <param name="number">The number that the readings carry for their field.</param>
    public static ImmutableArray<DiameterReading> Of(FieldMeasurement measurement, int number)
    {
        var pixel = measurement.Micrograph.PixelSize.Meters;
        return
        [
            .. measurement.Readings.Select(r => new DiameterReading(
                Length.FromMeters(r.Diameter * pixel),
                Length.FromMeters(r.StandardUncertainty * pixel),
                Length.FromMeters(r.RepresentedLength * pixel),
                r.Trace,
                number)),
        ];
    }
}
