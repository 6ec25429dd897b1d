using FiberScope.Specimens;
using FiberScope.Statistics;

namespace FiberScope.Validation.Imaging;

/// <summary>The figures of a family, pooled over its fields, against the visible length-weighted truth.</summary>
internal sealed class FamilyCheck
{
    public FamilyCheck(SpecimenRecipe family, IReadOnlyList<FieldCheck> fields)
    {
        (Family, Fields) = (family, fields);
        Readings = [.. fields.SelectMany(f => f.Readings)];
        Truth = TrueSample(fields);
        Read = Readings.Length == 0 ? null : new WeightedSample([.. Readings.Select(r => r.Read)], [.. Readings.Select(r => r.Weight)]);
        var onFibre = Readings.Where(r => r.Fibre >= 0).ToArray();
        Selected = onFibre.Length == 0 ? null : new WeightedSample([.. onFibre.Select(r => r.True)], [.. onFibre.Select(r => r.Weight)]);
    }

    public SpecimenRecipe Family { get; }

    public IReadOnlyList<FieldCheck> Fields { get; }

    public CheckedReading[] Readings { get; }

    /// <summary>True diameters over all visible length.</summary>
    public WeightedSample Truth { get; }

    /// <summary>Diameters read; null when nothing was.</summary>
    public WeightedSample? Read { get; }

    /// <summary>True diameters where something was read, with the readings' weights: what edges found without error would give.</summary>
    public WeightedSample? Selected { get; }

    public double MeanError => Relative(s => s.Mean);

    public double SpreadError => Relative(s => s.StandardDeviation);

    public double Distance => Read is null ? 1 : KolmogorovSmirnov.Distance(Truth, Read);

    /// <summary>The part of the mean's error that comes from which places were read and how they were weighted.</summary>
    public double SelectionError => Selected is null ? double.NaN : (Selected.Mean / Truth.Mean) - 1;

    public double GrossShare => Readings.Length == 0 ? double.NaN : Readings.Count(r => r.IsGross) / (double)Readings.Length;

    /// <summary>The share of the length showing both edges that was read.</summary>
    public double ReadShare => Fields.Any(f => f.IsRead.Length > 0) ? LengthRead() : SectionsFound();

    public double QuantileError(double probability) => Relative(s => s.Quantile(probability));

    private double Relative(Func<WeightedSample, double> figure) => Read is null ? double.NaN : (figure(Read) / figure(Truth)) - 1;

    private double LengthRead()
    {
        double shown = 0, read = 0;
        foreach (var check in Fields)
        {
            for (var i = 0; i < check.IsRead.Length; i++)
            {
                var s = check.Specimen.Truth.Stations[i];
                shown += s.BothEdges ? s.Length : 0;
                read += s.BothEdges && check.IsRead[i] ? s.Length : 0;
            }
        }

        return read / shown;
    }

    private double SectionsFound()
    {
        var whole = Fields.Sum(f => f.Specimen.Truth.Sections.Count(s => s.Whole));
        var found = Fields.Sum(f => f.Readings.Where(r => r.Fibre >= 0 && f.Specimen.Truth.Sections[r.Fibre].Whole).Select(r => r.Fibre).Distinct().Count());
        return whole > 0 ? (double)found / whole : double.NaN;
    }

    private static WeightedSample TrueSample(IReadOnlyList<FieldCheck> fields)
    {
        var truths = fields.Select(f => f.Specimen.Truth).ToArray();
        var (diameters, lengths) = (new List<double>(), new List<double>());
        foreach (var truth in truths)
        {
            diameters.AddRange(truth.Stations.Select(s => (double)s.Diameter).Concat(truth.Sections.Select(s => (double)s.Minor)));
            lengths.AddRange(truth.Stations.Select(s => (double)s.Length).Concat(truth.Sections.Select(s => (double)s.Major / s.Minor)));
        }

        return new WeightedSample([.. diameters], [.. lengths]);
    }
}
