using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Validation.Filtration.Measured;

/// <summary>The product's own calibration of a grade, on one layer as tested charged and one as tested discharged.</summary>
internal sealed class PairCalibration
{
    private readonly Dictionary<string, GradeCalibration> _grades = new(StringComparer.Ordinal);
    private readonly CorrelationSet _set;

    public PairCalibration(IReadOnlyList<MeasuredStack> single, CorrelationSet set)
    {
        _set = set;
        foreach (var (charged, discharged) in ChargeSection.Pairs)
        {
            var rolls = single.Where(s => s.Treatment == charged || s.Treatment == discharged).Select(Roll).ToList();
            _grades[charged] = _grades[discharged] = GradeCalibration.Fit(charged, rolls, UnfittedSection.Settings(set));
        }
    }

    /// <summary>What was fitted, in short.</summary>
    public string Fitted => string.Join("; ", _grades.Values.Distinct().Select(g => FormattableString.Invariant(
        $"{g.Grade}: ε {g.InhomogeneityFactor:0.00}, CV {g.BasisWeightVariation:0.00}, σ {1e6 * g.Charge.CoulombsPerSquareMeter:0.0} µC/m²")));

    /// <summary>Penetration of a stack by this calibration.</summary>
    public IReadOnlyList<double> Penetration(MeasuredStack stack)
    {
        var settings = UnfittedSection.Settings(_set);
        var layers = _grades[stack.Treatment].Apply(stack.Build(stack.EffectiveDiameter(settings)), stack.IsDischarged);
        return [.. MediaModel.Forecast(layers, stack.Point, settings).Curve.Select(c => c.Penetration)];
    }

    private CalibrationRoll Roll(MeasuredStack stack) => new(
        stack.Treatment,
        stack.Build(stack.EffectiveDiameter(UnfittedSection.Settings(_set))),
        stack.Point,
        Pressure.FromPascals(stack.Pascals),
        [.. stack.Micrometres.Zip(stack.Penetration, (d, p) => new RigPenetration(Length.FromMicrometers(d), Math.Min(p, 1), stack.IsDischarged))]);
}
