using FiberScope.Fibres;
using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;
using MathNet.Numerics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The arithmetic behind <see cref="GradeCalibration.Fit"/>.</summary>
/// <remarks>
/// One parameter after the other, each from the data that shows it best: ε from pressure drops (all rolls in the mean of ln ε); the
/// variation of basis weight from discharged penetrations, or from all when none are charged; the charge from penetrations as received.
/// ε is fitted with the variation in place, since an uneven mat has less drag. Least squares in P, where counting noise is even.
/// </remarks>
internal sealed class CalibrationFit
{
    private const double LargestVariation = 0.8;
    private const double LargestCharge = 500e-6;
    private const double LeastRelative = 0.02;

    private readonly string _grade;
    private readonly IReadOnlyList<CalibrationRoll> _rolls;
    private readonly ForecastSettings _settings;
    private readonly SingleFibreModel _model;

    public CalibrationFit(string grade, IReadOnlyList<CalibrationRoll> rolls, ForecastSettings settings)
    {
        if (rolls.Count == 0 || rolls.All(r => r.PressureDrop is null && r.Penetrations.Count == 0))
        {
            throw new ArgumentException("A calibration needs at least one roll with a measured pressure drop or penetration.", nameof(rolls));
        }

        _grade = grade;
        _rolls = rolls;
        _settings = settings;
        _model = SingleFibreModel.Of(settings.Correlations);
    }

    /// <summary>A layer with the grade's factors in place of its own.</summary>
    public static MediaLayer With(MediaLayer layer, double? inhomogeneity, double variation, double coulombsPerSquareMetre) => layer with
    {
        InhomogeneityFactor = inhomogeneity,
        BasisWeightVariation = variation,
        Charge = coulombsPerSquareMetre > 0
            ? new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(coulombsPerSquareMetre), layer.Charge?.FibrePermittivity ?? 2.3)
            : null,
    };

    public GradeCalibration Run()
    {
        var fit = Parameters(_rolls);
        var left = _rolls.Count > 1 ? _rolls.Select((roll, i) => LeftOut(roll, i)).ToArray() : [];
        var penetrationErrors = left.SelectMany(l => l.Penetrations).ToArray();
        var pressureErrors = left.SelectMany(l => l.PressureDrop).ToArray();
        return new GradeCalibration
        {
            Grade = _grade,
            Rolls = [.. _rolls.Select(r => r.Name)],
            Correlations = _settings.Correlations,
            InhomogeneityFactor = fit.Inhomogeneity,
            InhomogeneityRelativeUncertainty = fit.InhomogeneityRelative,
            BasisWeightVariation = fit.Variation,
            Charge = ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(fit.Charge),
            ChargeRelativeUncertainty = fit.ChargeRelative,
            LeaveOneOutPenetrationError = RootMeanSquare(penetrationErrors),
            LeaveOneOutPressureDropError = RootMeanSquare(pressureErrors),
            Caveats = [.. Caveats(fit)],
        };
    }

    private static double? RootMeanSquare(double[] errors) => errors.Length == 0 ? null : Math.Sqrt(errors.Average(e => e * e));

    private (double[] Penetrations, double[] PressureDrop) LeftOut(CalibrationRoll roll, int index)
    {
        var others = _rolls.Where((_, i) => i != index).ToArray();
        if (others.All(r => r.PressureDrop is null && r.Penetrations.Count == 0))
        {
            return ([], []);
        }

        var fit = Parameters(others);
        var pressure = roll.PressureDrop is { } measured ? [(Medium(roll, fit.Inhomogeneity, fit.Variation, 0).Pascals / measured.Pascals) - 1] : Array.Empty<double>();
        return (Residuals(roll, fit.Inhomogeneity, fit.Variation, fit.Charge, _ => true), pressure);
    }

    private Fitted Parameters(IReadOnlyList<CalibrationRoll> rolls)
    {
        var shape = rolls.SelectMany(r => r.Penetrations).Any(p => p.Discharged);
        var received = rolls.SelectMany(r => r.Penetrations).Any(p => !p.Discharged);
        double Variation(double charge, Func<RigPenetration, bool> used) => Minimum(
            c => Squares(rolls, Inhomogeneity(rolls, c).Factor, c, charge, used), 0, LargestVariation);
        var variation = shape ? Variation(0, p => p.Discharged) : received ? Variation(0, _ => true) : 0;
        var (factor, relative) = Inhomogeneity(rolls, variation);
        var (charge, chargeRelative) = shape && received ? Charge(rolls, factor, variation) : (0, 0);
        return new Fitted(factor, relative, variation, charge, chargeRelative);
    }

    /// <summary>ε of all rolls: the mean of ln ε, and the spread of the rolls about it.</summary>
    private (double Factor, double Relative) Inhomogeneity(IReadOnlyList<CalibrationRoll> rolls, double variation)
    {
        var logs = rolls.Where(r => r.PressureDrop is not null)
            .Select(r => Math.Log(Medium(r, 1, variation, 0).Pascals / r.PressureDrop!.Value.Pascals)).ToArray();
        if (logs.Length == 0)
        {
            // Without a pressure drop the mats are taken to obey Davies' law.
            return (rolls.Average(r => r.Layers.Average(l => KirschStechkinaModel.DaviesInhomogeneity(l.Solidity.Fraction))), 0.25);
        }

        var mean = logs.Average();
        var spread = logs.Length > 1 ? Math.Sqrt(logs.Sum(l => (l - mean) * (l - mean)) / (logs.Length - 1)) : 0.1;
        return (Math.Exp(mean), Math.Max(LeastRelative, spread * Math.Sqrt(1 + (1.0 / logs.Length))));
    }

    private (double Value, double Relative) Charge(IReadOnlyList<CalibrationRoll> rolls, double factor, double variation)
    {
        bool Received(RigPenetration p) => !p.Discharged;
        double Squared(double root) => Squares(rolls, factor, variation, root * root, Received);
        var root = Minimum(Squared, 0, Math.Sqrt(LargestCharge));
        var charge = root * root;
        if (charge < 1e-9)
        {
            return (0, 0);
        }

        // Linear propagation: the variance of the fit's residuals over the curvature of their sum of squares.
        var residuals = rolls.SelectMany(r => Residuals(r, factor, variation, charge, Received)).ToArray();
        var step = 0.02 * charge;
        var slopes = rolls.SelectMany(r => Residuals(r, factor, variation, charge + step, Received)).Zip(residuals, (a, b) => (a - b) / step).ToArray();
        var noise = residuals.Sum(e => e * e) / Math.Max(1, residuals.Length - 1);
        var deviation = Math.Sqrt(noise / Math.Max(1e-300, slopes.Sum(s => s * s)));
        return (charge, Math.Max(LeastRelative, deviation / charge));
    }

    private double Squares(IReadOnlyList<CalibrationRoll> rolls, double factor, double variation, double charge, Func<RigPenetration, bool> used) =>
        rolls.SelectMany(r => Residuals(r, factor, variation, charge, used)).Sum(e => e * e);

    private double[] Residuals(CalibrationRoll roll, double factor, double variation, double charge, Func<RigPenetration, bool> used)
    {
        var bare = Medium(roll, factor, variation, 0);
        var charged = charge > 0 ? Medium(roll, factor, variation, charge) : bare;
        return [.. roll.Penetrations.Where(used).Select(p => Math.Exp(-(p.Discharged ? bare : charged).Attenuation(p.Particle.Meters)) - p.Penetration)];
    }

    private MediumModel Medium(CalibrationRoll roll, double factor, double variation, double charge) =>
        new([.. roll.Layers.Select(l => With(l, factor, variation, charge))], roll.Point, _model);

    /// <summary>A scan, so that a second minimum does not catch the search, then golden sections about the best.</summary>
    private static double Minimum(Func<double, double> value, double low, double high)
    {
        const int Steps = 16;
        var best = Enumerable.Range(0, Steps + 1).Select(i => low + ((high - low) * i / Steps)).MinBy(value);
        var step = (high - low) / Steps;
        var (from, to) = (Math.Max(low, best - step), Math.Min(high, best + step));

        // The search may step outside its bounds; the function may not.
        double Inside(double x) => value(Math.Clamp(x, low, high));
        return Math.Clamp(FindMinimum.OfScalarFunctionConstrained(Inside, from, to, 1e-4 * (high - low), 200), low, high);
    }

    private IEnumerable<Caveat> Caveats(Fitted fit)
    {
        if (_rolls.Count < 3)
        {
            yield return new Caveat("few-rolls", FormattableString.Invariant($"Calibrated on {_rolls.Count} roll(s): the spread from roll to roll is hardly known; use at least three."));
        }

        if (fit.Inhomogeneity is < 0.8 or > 3)
        {
            yield return new Caveat("unusual-inhomogeneity", FormattableString.Invariant($"The fitted inhomogeneity factor {fit.Inhomogeneity:G3} is unusual (0.8 to 3): check diameter, thickness and solidity."));
        }

        var penetrations = _rolls.SelectMany(r => r.Penetrations).ToArray();
        if (penetrations.Length > 0 && !penetrations.Any(p => p.Discharged))
        {
            yield return new Caveat("charge-not-separable", "No penetration was measured discharged: a charge cannot be told from finer fibres, and none was fitted.");
        }
    }

    private readonly record struct Fitted(double Inhomogeneity, double InhomogeneityRelative, double Variation, double Charge, double ChargeRelative);
}
