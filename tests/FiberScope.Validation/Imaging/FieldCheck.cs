using FiberScope.Imaging;
using FiberScope.Specimens;

namespace FiberScope.Validation.Imaging;

/// <summary>One field measured, each reading beside the truth.</summary>
internal sealed class FieldCheck
{
    private FieldCheck(SpecimenCase specimen, FieldMeasurement? measurement, CheckedReading[] readings, bool[] isRead, TimeSpan time) =>
        (Specimen, Measurement, Readings, IsRead, Time) = (specimen, measurement, readings, isRead, time);

    public SpecimenCase Specimen { get; }

    /// <summary>The whole measurement; null for the quick way.</summary>
    public FieldMeasurement? Measurement { get; }

    public CheckedReading[] Readings { get; }

    /// <summary>For every true station whether a reading of its fibre lies within a diameter along it.</summary>
    public bool[] IsRead { get; }

    public TimeSpan Time { get; }

    public static FieldCheck Of(SpecimenCase specimen, FieldMeasurement? measurement, IReadOnlyList<PixelReading> readings, int field, TimeSpan time)
    {
        var index = new TruthIndex(specimen.Truth);
        var isSection = specimen.Recipe.Kind == SpecimenKind.CrossSection;
        var stationsOf = new Dictionary<int, List<int>>();
        for (var i = 0; i < specimen.Truth.Stations.Length; i++)
        {
            var fibre = specimen.Truth.Stations[i].Fibre;
            (stationsOf.TryGetValue(fibre, out var list) ? list : stationsOf[fibre] = []).Add(i);
        }

        var isRead = new bool[specimen.Truth.Stations.Length];
        var checkedReadings = new CheckedReading[readings.Count];
        for (var i = 0; i < checkedReadings.Length; i++)
        {
            var reading = readings[i];
            var match = isSection ? index.MatchSection(reading) : index.Match(reading, double.IsNaN(reading.Direction));
            var (diameter, fibre) = match < 0 ? (double.NaN, -1) : isSection ? (specimen.Truth.Sections[match].Minor, match) : (specimen.Truth.Stations[match].Diameter, specimen.Truth.Stations[match].Fibre);
            checkedReadings[i] = new(reading.X, reading.Y, reading.Direction, reading.Diameter, reading.StandardUncertainty, reading.RepresentedLength, diameter, fibre, reading.Trace, field);
            if (match >= 0 && !isSection)
            {
                MarkRead(specimen.Truth, stationsOf[fibre], reading, isRead);
            }
        }

        return new FieldCheck(specimen, measurement, checkedReadings, isRead, time);
    }

    private static void MarkRead(SpecimenTruth truth, List<int> stations, PixelReading reading, bool[] isRead)
    {
        foreach (var i in stations)
        {
            var s = truth.Stations[i];
            var (dx, dy) = (s.X - reading.X, s.Y - reading.Y);
            var reach = Math.Max(6, s.Diameter);
            isRead[i] |= (dx * dx) + (dy * dy) <= reach * reach;
        }
    }
}
