using FiberScope.Conformity;
using FiberScope.Fibres;
using FiberScope.Imaging;
using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>Finds, for each limit of a grade, what an assessment says about it and how sure that is.</summary>
internal sealed class GradeJudging(IReadOnlyList<LayerFinding> layers, LayerFinding graded, Predicting.ForecastFindings? forecast)
{
    private const double NormalWidth95 = 2 * 1.959964;

    public GradeVerdict Judge(Grade grade) => grade.Judge(Observed);

    private ObservedValue? Observed(Limit limit)
    {
        var c = limit.Characteristic;
        return c.IsForecast ? forecast?.Observed(limit)
            : c == Characteristic.Solidity ? SolidityValue()
            : c == Characteristic.BasisWeight ? Told(l => l.BasisWeight, l => l.BasisWeightUncertainty)
            : c == Characteristic.Thickness ? Told(l => l.Thickness, l => l.ThicknessUncertainty)
            : c == Characteristic.ShotCount ? Count(d => d.Kind == DefectKind.Shot)
            : c == Characteristic.DefectCount ? Count(_ => true)
            : c == Characteristic.DefectArea ? AreaShare()
            : c == Characteristic.LargestOpening ? LargestOpening()
            : Diameter(c);
    }

    private ObservedValue? Diameter(Characteristic c)
    {
        var survey = graded.Survey;
        var s = survey.LengthWeighted;
        return c == Characteristic.MeanDiameter ? Mean(survey)
            : c == Characteristic.NumberMeanDiameter ? FromInterval(survey.NumberWeighted.Mean, survey.NumberMeanInterval95)
            : c == Characteristic.D10 ? FromInterval(s.D10, survey.D10Interval95)
            : c == Characteristic.D50 ? FromInterval(s.D50, survey.D50Interval95)
            : c == Characteristic.D90 ? FromInterval(s.D90, survey.D90Interval95)
            : c == Characteristic.DiameterVariation ? Spread(s.CoefficientOfVariation, survey)
            : c == Characteristic.DiameterGsd ? Spread(s.GeometricStandardDeviation, survey)
            : null;
    }

    private static ObservedValue Mean(DiameterSurvey survey)
    {
        double Square(string name) => survey.Budget.Parts.Where(p => p.Name == name).Sum(p => Math.Pow(p.StandardUncertainty.Meters, 2));
        var sampling = Length.FromMeters(Math.Sqrt(Square("fibres") + Square("fields")));
        return new ObservedValue(survey.LengthWeighted.Mean, survey.Budget.Combined)
        {
            DegreesOfFreedom = Math.Max(1, survey.Budget.EffectiveDegreesOfFreedom),
            Sampling = new SamplingShare(sampling, survey.FieldCount),
        };
    }

    private static ObservedValue FromInterval(Length value, LengthInterval interval) => new(value, (interval.High - interval.Low) / NormalWidth95);

    /// <summary>The spread's relative uncertainty is taken from the standard deviation's; for a GSD it acts on ln GSD.</summary>
    private static ObservedValue Spread(double value, DiameterSurvey survey)
    {
        var interval = survey.StandardDeviationInterval95;
        var relative = (interval.High - interval.Low) / survey.LengthWeighted.StandardDeviation / NormalWidth95;
        var isGsd = value >= 1 && value == survey.LengthWeighted.GeometricStandardDeviation;
        var uncertainty = isGsd ? value * Math.Log(value) * relative : value * relative;
        return new ObservedValue(Ratio.FromDecimalFractions(value), Ratio.FromDecimalFractions(double.IsFinite(uncertainty) ? uncertainty : 0));
    }

    private ObservedValue? SolidityValue() => graded.Solidity is { } finding
        ? new ObservedValue(Ratio.FromDecimalFractions(finding.Combined.Value.Fraction), Ratio.FromDecimalFractions(finding.Combined.StandardUncertainty)) { Scale = UncertaintyScale.Logarithmic }
        : null;

    /// <summary>What was told of every layer, summed; null when a layer lacks it.</summary>
    private ObservedValue? Told<T>(Func<LayerFinding, T?> value, Func<LayerFinding, double> relative)
        where T : struct, IQuantity
    {
        if (layers.Any(l => value(l) is null))
        {
            return null;
        }

        var unit = value(layers[0])!.Value.Unit;
        double Number(LayerFinding l) => value(l)!.Value.As(unit);
        var sum = layers.Sum(Number);
        var uncertainty = Math.Sqrt(layers.Sum(l => Math.Pow(Number(l) * relative(l), 2)));
        return new ObservedValue(Quantity.From(sum, unit), Quantity.From(uncertainty, unit));
    }

    /// <summary>A count has the Poisson law's uncertainty, √n, and none found still leaves that of one.</summary>
    private ObservedValue? Count(Func<DefectRegion, bool> wanted)
    {
        var area = graded.Fields.Sum(SeenSquareMillimetres);
        if (!(area > 0))
        {
            return null;
        }

        var count = graded.Fields.Sum(f => f.Measurement.Defects.Count(wanted));
        return new ObservedValue(ReciprocalArea.FromInverseSquareMillimeters(count / area), ReciprocalArea.FromInverseSquareMillimeters(Math.Sqrt(Math.Max(1, count)) / area));
    }

    /// <summary>The area share of defects over the fields; its uncertainty is the standard error between fields.</summary>
    private ObservedValue? AreaShare()
    {
        double[] shares = [.. graded.Fields.Select(f => f.Measurement.Defects.Sum(d => d.AreaPixels) / (f.Measurement.Micrograph.Width * (double)f.Measurement.Micrograph.UsableHeight))];
        if (shares.Length < 2)
        {
            return null;
        }

        var mean = shares.Average();
        var error = Math.Sqrt(shares.Sum(s => (s - mean) * (s - mean)) / (shares.Length - 1) / shares.Length);
        return new ObservedValue(Ratio.FromDecimalFractions(mean), Ratio.FromDecimalFractions(error)) { DegreesOfFreedom = shares.Length - 1 };
    }

    /// <summary>The largest opening of the fields seen; its uncertainty is how much the largest one differs from field to field.</summary>
    private ObservedValue? LargestOpening() => graded.Structure?.Openings is { Count: > 0 } openings
        ? new ObservedValue(openings.Largest, openings.LargestUncertainty)
        : null;

    private static double SeenSquareMillimetres(FieldFinding field)
    {
        var picture = field.Measurement.Micrograph;
        var pixel = picture.PixelSize.Millimeters;
        return picture.Width * (double)picture.UsableHeight * pixel * pixel;
    }
}
