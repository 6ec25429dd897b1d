using FiberScope.Fibres;
using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;
using MathNet.Numerics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The arithmetic behind <see cref="GradeCalibration.Fit"/>.</summary>
/// <remarks>
/// One parameter after the other, each from the data that shows it best: ε from pressure drops (all rolls in the mean of ln ε); the
/// variation of basis weight and the open area from discharged penetrations, or from all when none were discharged; the charge from penetrations as
/// received. ε is fitted with the unevenness in place, since an uneven mat has less drag. Least squares in P, where counting noise is even.
/// </remarks>
internal sealed class CalibrationFit
{
    private const double LargestCharge = 500e-6;
    private const double LeastRelative = 0.02;

    /// <summary>Relative spread of ε from roll to roll where one roll cannot show it; a guess.</summary>
    private const double SpreadOfOneRoll = 0.1;

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
            InhomogeneityFactor = fit.Factors.Inhomogeneity,
            InhomogeneityRelativeUncertainty = fit.InhomogeneityRelative,
            BasisWeightVariation = fit.Factors.Variation,
            OpenArea = fit.Factors.OpenArea,
            Charge = ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(fit.Factors.CoulombsPerSquareMetre),
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

        var factors = Parameters(others).Factors;
        var pressure = roll.PressureDrop is { } measured ? [(Medium(roll, factors with { CoulombsPerSquareMetre = 0 }).Pascals / measured.Pascals) - 1] : Array.Empty<double>();
        return (Residuals(roll, factors, _ => true), pressure);
    }

    private Fitted Parameters(IReadOnlyList<CalibrationRoll> rolls)
    {
        var all = rolls.SelectMany(r => r.Penetrations).ToArray();
        var (discharged, received) = (all.Any(p => p.Discharged), all.Any(p => !p.Discharged));
        double Misfit(double variation, double openArea) =>
            Squares(rolls, new GradeFactors(Inhomogeneity(rolls, variation, openArea).Factor, variation, openArea, 0), p => p.Discharged || !discharged);
        var (variation, openArea) = all.Length > 1 ? UnevennessSearch.Best(Misfit) : (0, 0);
        var (factor, relative) = Inhomogeneity(rolls, variation, openArea);
        var factors = new GradeFactors(factor, variation, openArea, 0);
        var (charge, chargeRelative) = discharged && received ? Charge(rolls, factors) : (0, 0);
        return new Fitted(factors with { CoulombsPerSquareMetre = charge }, relative, chargeRelative);
    }

    /// <summary>ε of all rolls: the mean of ln ε, and the spread of the rolls about it.</summary>
    private (double Factor, double Relative) Inhomogeneity(IReadOnlyList<CalibrationRoll> rolls, double variation, double openArea)
    {
        var logs = rolls.Where(r => r.PressureDrop is not null).Select(r => Math.Log(MatchingFactor(r, variation, openArea))).ToArray();
        if (logs.Length == 0)
        {
            // Without a pressure drop the mats are taken to obey Davies' law.
            return (rolls.Average(r => r.Layers.Average(l => KirschStechkinaModel.DaviesInhomogeneity(l.Solidity.Fraction))), 0.25);
        }

        var mean = logs.Average();
        var spread = logs.Length > 1 ? Math.Sqrt(logs.Sum(l => (l - mean) * (l - mean)) / (logs.Length - 1)) : SpreadOfOneRoll;
        return (Math.Exp(mean), Math.Max(LeastRelative, spread * Math.Sqrt(1 + (1.0 / logs.Length))));
    }

    /// <summary>ε that gives one roll its pressure drop. The mat's drag goes as 1/ε; holes beside it make that a short iteration.</summary>
    private double MatchingFactor(CalibrationRoll roll, double variation, double openArea)
    {
        var factor = 1.0;
        for (var i = 0; i < (openArea > 0 ? 6 : 1); i++)
        {
            factor *= Medium(roll, new GradeFactors(factor, variation, openArea, 0)).Pascals / roll.PressureDrop!.Value.Pascals;
        }

        return factor;
    }

    private (double Value, double Relative) Charge(IReadOnlyList<CalibrationRoll> rolls, GradeFactors factors)
    {
        static bool Received(RigPenetration p) => !p.Discharged;
        double[] At(double charge) => [.. rolls.SelectMany(r => Residuals(r, factors with { CoulombsPerSquareMetre = charge }, Received))];
        var root = Minimum(x => At(x * x).Sum(e => e * e), 0, Math.Sqrt(LargestCharge));
        var charge = root * root;
        if (charge < 1e-9)
        {
            return (0, 0);
        }

        // Linear propagation: the variance of the fit's residuals over the curvature of their sum of squares.
        var residuals = At(charge);
        var step = 0.02 * charge;
        var slopes = At(charge + step).Zip(residuals, (a, b) => (a - b) / step).ToArray();
        var noise = residuals.Sum(e => e * e) / Math.Max(1, residuals.Length - 1);
        var deviation = Math.Sqrt(noise / Math.Max(1e-300, slopes.Sum(s => s * s)));
        return (charge, Math.Max(LeastRelative, deviation / charge));
    }

    private double Squares(IReadOnlyList<CalibrationRoll> rolls, GradeFactors factors, Func<RigPenetration, bool> used) =>
        rolls.SelectMany(r => Residuals(r, factors, used)).Sum(e => e * e);

    private double[] Residuals(CalibrationRoll roll, GradeFactors factors, Func<RigPenetration, bool> used)
    {
        var bare = Medium(roll, factors with { CoulombsPerSquareMetre = 0 });
        var charged = factors.CoulombsPerSquareMetre > 0 ? Medium(roll, factors) : bare;
        return [.. roll.Penetrations.Where(used).Select(p => Math.Exp(-(p.Discharged ? bare : charged).Attenuation(p.Particle.Meters)) - Math.Min(1, p.Penetration))];
    }

    private MediumModel Medium(CalibrationRoll roll, GradeFactors factors) =>
        new([.. roll.Layers.Select(factors.PutInto)], roll.Point, _model);

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

        if (fit.Factors.Inhomogeneity is < 0.8 or > 3)
        {
            yield return new Caveat("unusual-inhomogeneity", FormattableString.Invariant($"The fitted inhomogeneity factor {fit.Factors.Inhomogeneity:G3} is unusual (0.8 to 3): check diameter, thickness and solidity."));
        }

        var penetrations = _rolls.SelectMany(r => r.Penetrations).ToArray();
        if (penetrations.Length > 0 && !penetrations.Any(p => p.Discharged))
        {
            yield return new Caveat("charge-not-separable", "No penetration was measured discharged: a charge cannot be told from finer fibres, and none was fitted.");
        }
    }

    private readonly record struct Fitted(GradeFactors Factors, double InhomogeneityRelative, double ChargeRelative);
}
