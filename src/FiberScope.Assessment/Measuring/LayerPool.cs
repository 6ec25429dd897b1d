using System.Collections.Immutable;
using FiberScope.Fibres;
using UnitsNet;

namespace FiberScope.Assessment.Measuring;

/// <summary>The pooled diameters of a layer's fields, and what to know about the pooling.</summary>
/// <param name="Survey">The pooled survey.</param>
/// <param name="Caveats">Left-out fields, fields counted although unfit, gaps between magnifications.</param>
public sealed record LayerPool(DiameterSurvey Survey, ImmutableArray<Caveat> Caveats)
{
    /// <summary>Pixel sizes within this factor count as one magnification.</summary>
    private const double OneMagnification = 1.05;

    /// <summary>The widest fibre that a field shows without favour, over the field's smaller side: a quarter.</summary>
    private const double WidestShare = 0.25;

    /// <summary>Pools the included fields; several magnifications by visible length per area.</summary>
    /// <param name="fields">The fields of one layer.</param>
    /// <param name="settings">Uncertainties, draws and seed.</param>
    /// <returns>Null when no field has readings to pool.</returns>
    public static LayerPool? Of(IReadOnlyList<FieldFinding> fields, MeasuringSettings settings)
    {
        var included = fields.Where(f => f.IsIncluded).ToArray();
        if (included.Length == 0)
        {
            return null;
        }

        var caveats = ImmutableArray.CreateBuilder<Caveat>();
        caveats.AddRange(fields.Where(f => !f.IsIncluded).Select(f => new Caveat("field-left-out", $"{f.Name} is left out: {f.LeftOutBecause!.TrimEnd('.')}.")));
        caveats.AddRange(Twins(included));
        var pooled = Pool(included, caveats);
        var pixel = included.Average(f => f.Measurement.Micrograph.PixelSize.Meters);
        var survey = DiameterSurvey.From(pooled, new SurveySettings
        {
            ScaleRelativeUncertainty = included.Max(f => f.PixelSizeUncertainty),
            EdgeUncertainty = Length.FromMeters(settings.EdgeUncertainty * pixel),
            SelectionRelativeUncertainty = settings.SelectionUncertainty,
            BootstrapReplicates = settings.BootstrapDraws,
            Seed = settings.Seed,
        });
        return new LayerPool(survey, [.. caveats, .. survey.Caveats]);
    }

    private static ImmutableArray<DiameterReading> Pool(FieldFinding[] fields, ImmutableArray<Caveat>.Builder caveats)
    {
        var groups = Magnifications(fields);
        if (groups.Count == 1)
        {
            return [.. fields.SelectMany(f => Readings(f))];
        }

        var pool = MagnificationPool.Of(groups.Select(Group));
        var sizes = string.Join(", ", groups.Select(g => FormattableString.Invariant($"{g[0].Measurement.Micrograph.PixelSize.Nanometers:G4} nm")));
        caveats.Add(new Caveat("magnifications-pooled", FormattableString.Invariant($"Fields of {groups.Count} pixel sizes ({sizes}) are pooled by visible length per area; {pool.LeftOut} readings were left to another magnification.")));
        if (pool.OutsideEveryRange > 0.01)
        {
            caveats.Add(new Caveat("magnification-gap", FormattableString.Invariant($"{pool.OutsideEveryRange:P1} of the fibre length has diameters that no magnification shows without favour; add fields at a pixel size between.")));
        }

        return pool.Readings;
    }

    private static List<List<FieldFinding>> Magnifications(FieldFinding[] fields)
    {
        var groups = new List<List<FieldFinding>>();
        foreach (var field in fields.OrderBy(f => f.Measurement.Micrograph.PixelSize.Meters).ThenBy(f => f.Number))
        {
            if (groups.Count == 0 || field.Measurement.Micrograph.PixelSize > groups[^1][0].Measurement.Micrograph.PixelSize * OneMagnification)
            {
                groups.Add([]);
            }

            groups[^1].Add(field);
        }

        return groups;
    }

    private static MagnificationGroup Group(List<FieldFinding> fields)
    {
        double area = 0, smallest = 0, widest = double.PositiveInfinity;
        foreach (var measurement in fields.Select(f => f.Measurement))
        {
            var picture = measurement.Micrograph;
            var pixel = picture.PixelSize.Meters;
            area += picture.Width * (double)picture.UsableHeight * pixel * pixel;
            smallest = Math.Max(smallest, measurement.DetectionLimitPixels * pixel);
            widest = Math.Min(widest, WidestShare * Math.Min(picture.Width, picture.UsableHeight) * pixel);
        }

        return new MagnificationGroup(
            [.. fields.SelectMany(f => Readings(f))],
            Area.FromSquareMeters(area),
            new LengthInterval(Length.FromMeters(smallest), Length.FromMeters(Math.Max(smallest, widest))));
    }

    private static ImmutableArray<DiameterReading> Readings(FieldFinding field) => FieldReadings.Of(field.Measurement, field.Number);

    private static IEnumerable<Caveat> Twins(FieldFinding[] fields) => fields
        .GroupBy(f => (f.Measurement.Micrograph.Source.Sha256, f.Measurement.Micrograph.Source.Page))
        .Where(g => g.Key.Sha256.Length > 0 && g.Count() > 1)
        .Select(g => new Caveat("same-image-twice", $"{string.Join(" and ", g.Select(f => f.Name))} are the same picture; counting it twice makes the interval too narrow."));
}
