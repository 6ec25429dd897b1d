using System.Collections.Immutable;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Fibres;

/// <summary>The arithmetic behind <see cref="DiameterSurvey.From"/>; in metres throughout.</summary>
internal sealed class SurveyCalculation
{
    private readonly ImmutableArray<DiameterReading> _readings;
    private readonly SurveySettings _settings;
    private readonly double[] _diameters;
    private readonly double[] _lengths;
    private readonly int[] _fields;
    private readonly int[] _fibres;
    private readonly ImmutableArray<FibreMean> _means;

    public SurveyCalculation(ImmutableArray<DiameterReading> readings, SurveySettings settings)
    {
        if (readings.IsEmpty || readings.Any(r => !(r.Diameter.Meters > 0) || !(r.RepresentedLength.Meters > 0)))
        {
            throw new ArgumentException("Needs at least one reading, each with a diameter and a length above zero.", nameof(readings));
        }

        _readings = readings;
        _settings = settings;
        _diameters = [.. readings.Select(r => r.Diameter.Meters)];
        _lengths = [.. readings.Select(r => r.RepresentedLength.Meters)];
        _fields = [.. readings.Select(r => r.Field)];
        _means = [.. readings.GroupBy(r => (r.Field, r.Fibre)).OrderBy(g => g.Key).Select(FibreMean.Of)];
        var numbers = _means.Select((m, i) => (m.Key, i)).ToDictionary(p => p.Key, p => p.i);
        _fibres = [.. readings.Select(r => numbers[(r.Field, r.Fibre)])];
    }

    public DiameterSurvey Run()
    {
        var byLength = new WeightedSample(_diameters, _lengths);
        var byNumber = WeightedSample.Even([.. _means.Select(m => m.Diameter)]);
        var budget = Budget();
        var draws = Bootstrap();
        return new DiameterSurvey
        {
            Readings = _readings,
            LengthWeighted = Describe(byLength, Weighting.Length),
            NumberWeighted = Describe(byNumber, Weighting.Number),
            FibreCount = _means.Length,
            FieldCount = _means.Select(m => m.Key.Field).Distinct().Count(),
            Budget = budget,
            MeanInterval95 = Around(byLength.Mean, budget.Expanded95.Meters),
            NumberMeanInterval95 = Around(byNumber.Mean, NumberHalfWidth()),
            StandardDeviationInterval95 = draws.Interval(d => d.StandardDeviation, byLength.StandardDeviation),
            D10Interval95 = draws.Interval(d => d.D10, byLength.Quantile(0.1)),
            D50Interval95 = draws.Interval(d => d.D50, byLength.Quantile(0.5)),
            D90Interval95 = draws.Interval(d => d.D90, byLength.Quantile(0.9)),
            Shapes = byLength.Values[0] < byLength.Values[^1] ? ShapeComparison.Of(byLength, EffectiveFibres()) : null,
            Caveats = Caveats(),
        };
    }

    private static DiameterStatistics Describe(WeightedSample sample, Weighting weighting) => new()
    {
        Weighting = weighting,
        Mean = Length.FromMeters(sample.Mean),
        StandardDeviation = Length.FromMeters(sample.StandardDeviation),
        GeometricMean = Length.FromMeters(sample.GeometricMean),
        GeometricStandardDeviation = sample.GeometricStandardDeviation,
        D10 = Length.FromMeters(sample.Quantile(0.1)),
        D50 = Length.FromMeters(sample.Quantile(0.5)),
        D90 = Length.FromMeters(sample.Quantile(0.9)),
    };

    private static LengthInterval Around(double centre, double half) =>
        new(Length.FromMeters(Math.Max(0, centre - half)), Length.FromMeters(centre + half));

    /// <summary>
    /// The sampling variance that fibres alone explain, what fields and swatches add to it, and the two systematic parts.
    /// </summary>
    private UncertaintyBudget Budget()
    {
        var byFibre = ClusteredMean.Of(_diameters, _lengths, _fibres);
        var byField = ClusteredMean.Of(_diameters, _lengths, _fields);
        var bySwatch = ClusteredMean.Of(_diameters, _lengths, [.. _readings.Select(r => r.Swatch)]);
        var (fibres, fields) = (Square(byFibre), Square(byField));
        var swatches = Square(bySwatch) - Math.Max(fibres, fields);
        return new UncertaintyBudget(
        [
            new("scale", Length.FromMeters(byFibre.Mean * _settings.ScaleRelativeUncertainty), double.PositiveInfinity, "The pixel size, the same for every reading."),
            new("edge", _settings.EdgeUncertainty, double.PositiveInfinity, "Where the edge of a fibre is, what remains in common after the correction."),
            new("selection", Length.FromMeters(byFibre.Mean * _settings.SelectionRelativeUncertainty), double.PositiveInfinity, "Which fibres can be read: thin, dim and crossed ones less often; what remains after weighting."),
            new("fibres", Length.FromMeters(byFibre.StandardError), Math.Max(1, byFibre.DegreesOfFreedom), "Fibre-to-fibre spread: other fibres of the same fields would have given another mean."),
            new("fields", Length.FromMeters(Math.Sqrt(Math.Max(0, fields - fibres))), Math.Max(1, byField.DegreesOfFreedom), "Field-to-field spread beyond what the fibres explain."),
            .. bySwatch.Clusters == 1 ? (BudgetPart[])[] :
            [
                new("swatches", Length.FromMeters(Math.Sqrt(Math.Max(0, swatches))), bySwatch.DegreesOfFreedom, "Swatch-to-swatch spread beyond what the fields explain."),
            ],
        ]);
    }

    private static double Square(ClusteredMean mean) => mean.StandardError * mean.StandardError;

    private double NumberHalfWidth()
    {
        double[] diameters = [.. _means.Select(m => m.Diameter)];
        double[] ones = [.. _means.Select(_ => 1.0)];
        var byFibre = ClusteredMean.Of(diameters, ones, [.. Enumerable.Range(0, ones.Length)]);
        var byField = ClusteredMean.Of(diameters, ones, [.. _means.Select(m => m.Key.Field)]);
        var sampling = Math.Max(byFibre.StandardError, byField.StandardError);
        var freedom = byField.StandardError > byFibre.StandardError ? byField.DegreesOfFreedom : byFibre.DegreesOfFreedom;
        var relative = Math.Pow(_settings.ScaleRelativeUncertainty, 2) + Math.Pow(_settings.SelectionRelativeUncertainty, 2);
        var fixedPart = (byFibre.Mean * byFibre.Mean * relative) + Math.Pow(_settings.EdgeUncertainty.Meters, 2);
        var t = ClusteredMean.StudentFactor95(Math.Max(1, freedom));
        return Math.Sqrt((t * t * sampling * sampling) + (1.96 * 1.96 * fixedPart));
    }

    private BootstrapFigures Bootstrap()
    {
        var order = Enumerable.Range(0, _diameters.Length).OrderBy(i => _diameters[i]).ThenBy(i => i).ToArray();
        var figures = new BootstrapFigures(order, _diameters, _lengths, _settings.BootstrapReplicates, _means.Select(m => m.Key.Field).Distinct().Count());
        ClusterBootstrap.Draw(_fields, _fibres, _settings.BootstrapReplicates, _settings.Seed, figures.Add);
        return figures;
    }

    /// <summary>The number of equally long independent fibres that would tell as much.</summary>
    /// <remarks>
    /// By the length of each traced stretch (Kish 1965, Survey Sampling), and no more than the spread of the mean between fields allows,
    /// (SD / standard error)²: one fibre seen in several stretches, or alike fibres lying together, count as one.
    /// </remarks>
    private double EffectiveFibres()
    {
        var total = _means.Sum(m => m.Length);
        var stretches = total * total / _means.Sum(m => m.Length * m.Length);
        var byField = ClusteredMean.Of(_diameters, _lengths, _fields).StandardError;
        var spread = new WeightedSample(_diameters, _lengths).StandardDeviation;
        return byField > 0 ? Math.Max(1, Math.Min(stretches, spread * spread / (byField * byField))) : stretches;
    }

    private ImmutableArray<Caveat> Caveats()
    {
        var fields = _means.Select(m => m.Key.Field).Distinct().Count();
        var caveats = ImmutableArray.CreateBuilder<Caveat>();
        if (fields < 3)
        {
            caveats.Add(new Caveat("few-fields", FormattableString.Invariant($"Only {fields} field(s) carry readings: differences between fields are hardly seen and the interval may be too narrow; measure at least five.")));
        }

        if (EffectiveFibres() < 30)
        {
            caveats.Add(new Caveat("few-fibres", FormattableString.Invariant($"The readings amount to {EffectiveFibres():F0} independent fibres; percentiles need about a hundred.")));
        }

        return caveats.ToImmutable();
    }

    private readonly record struct FibreMean((int Field, int Fibre) Key, double Diameter, double Length)
    {
        public static FibreMean Of(IGrouping<(int Field, int Fibre), DiameterReading> readings)
        {
            var length = readings.Sum(r => r.RepresentedLength.Meters);
            return new(readings.Key, readings.Sum(r => r.Diameter.Meters * r.RepresentedLength.Meters) / length, length);
        }
    }
}
