using System.Collections.Immutable;
using FiberScope.Filtration.Classes;
using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The model run backwards: which structures reach the targets, and which of them does it best.</summary>
public sealed class MediaDesign
{
    private const int MostTrials = 20_000;

    private readonly ImmutableArray<MediaLayer> _start;
    private readonly OperatingPoint _point;
    private readonly DesignTargets _targets;
    private readonly ImmutableArray<DesignVariable> _variables;
    private readonly ForecastSettings _settings;
    private readonly Density _fibreDensity;
    private readonly SingleFibreModel _model;

    /// <summary>Prepares a search.</summary>
    /// <param name="start">The structure to start from; what no variable names stays as it is.</param>
    /// <param name="point">How the medium is used.</param>
    /// <param name="targets">What must be reached.</param>
    /// <param name="variables">What may change; at least one.</param>
    /// <param name="fibreDensity">Density of the fibres' polymer, for basis weight.</param>
    /// <param name="settings">How forecasts are made; the defaults when null.</param>
    /// <exception cref="ArgumentException">There are no layers or variables, or a variable names a layer that is not there.</exception>
    public MediaDesign(IEnumerable<MediaLayer> start, OperatingPoint point, DesignTargets targets, IEnumerable<DesignVariable> variables, Density fibreDensity, ForecastSettings? settings = null)
    {
        _start = [.. start];
        _variables = [.. variables];
        if (_start.IsEmpty || _variables.IsEmpty || _variables.Any(v => v.Layer >= _start.Length))
        {
            throw new ArgumentException("A design needs at least one layer and one variable, each of a layer that is there.", nameof(variables));
        }

        Require.Positive(fibreDensity.KilogramsPerCubicMeter, nameof(fibreDensity));
        _point = point;
        _targets = targets;
        _fibreDensity = fibreDensity;
        _settings = settings ?? new ForecastSettings();
        _model = SingleFibreModel.Of(_settings.Correlations);
    }

    /// <summary>Tries the variables on an even grid, refines about the best, and returns the best that meet the targets.</summary>
    /// <param name="steps">Grid points per variable, 2 to 40; lowered where all together would exceed 20,000 trials.</param>
    /// <param name="keep">How many to return, each with its probabilities.</param>
    /// <returns>By quality factor, best first; where none meets the targets, the nearest misses, marked as such.</returns>
    public ImmutableArray<DesignCandidate> Search(int steps = 12, int keep = 5)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(keep, 1);
        var count = Math.Clamp(Math.Min(steps, (int)Math.Pow(MostTrials, 1.0 / _variables.Length)), 2, 40);
        var tried = Grid(count).Select(shares => (Shares: shares, Candidate: Try(shares))).ToList();
        var best = Order(tried).Take(keep).ToList();
        var width = 1.0 / (count - 1);
        for (var round = 0; round < 3; round++)
        {
            width /= 2;
            tried = [.. best, .. best.SelectMany(b => Around(b.Shares, width)).Select(shares => (shares, Try(shares)))];
            best = [.. Order(tried).Take(keep)];
        }

        return [.. best.Select(b => b.Candidate with { Probabilities = Probabilities(b.Candidate) })];
    }

    /// <summary>A structure found by another search, judged by the targets of this one.</summary>
    public DesignCandidate Judge(DesignCandidate candidate) => candidate with { MeetsTargets = Miss(candidate) == 0, Probabilities = Probabilities(candidate) };

    /// <summary>All combinations of two variables on an even grid, for a map; the other variables stay as the start has them.</summary>
    /// <param name="across">The variable along the map's width.</param>
    /// <param name="up">The variable along its height.</param>
    /// <param name="steps">Grid points of each; 2 to 200.</param>
    /// <returns>Rows from the low end of <paramref name="up"/>, each from the low end of <paramref name="across"/>.</returns>
    public ImmutableArray<ImmutableArray<DesignCandidate>> Map(DesignVariable across, DesignVariable up, int steps = 25)
    {
        Require.Within(steps, 2, 200);
        var map = new MediaDesign(_start, _point, _targets, [across, up], _fibreDensity, _settings);
        return [.. Enumerable.Range(0, steps).Select(row => Enumerable.Range(0, steps)
            .Select(column => map.Try([(double)column / (steps - 1), (double)row / (steps - 1)])).ToImmutableArray())];
    }

    private IEnumerable<double[]> Grid(int count)
    {
        IEnumerable<double[]> all = [[]];
        foreach (var _ in _variables)
        {
            all = all.SelectMany(head => Enumerable.Range(0, count).Select(i => (double[])[.. head, (double)i / (count - 1)]));
        }

        return all;
    }

    private static IEnumerable<double[]> Around(double[] shares, double width)
    {
        for (var i = 0; i < shares.Length; i++)
        {
            foreach (var step in new[] { -width, width })
            {
                var moved = (double[])shares.Clone();
                moved[i] = Math.Clamp(moved[i] + step, 0, 1);
                yield return moved;
            }
        }
    }

    /// <summary>Those that meet the targets by quality factor; behind them the rest by how far they miss.</summary>
    private IEnumerable<(double[] Shares, DesignCandidate Candidate)> Order(IEnumerable<(double[] Shares, DesignCandidate Candidate)> tried) => tried
        .DistinctBy(t => string.Join(',', t.Candidate.Values))
        .OrderBy(t => Miss(t.Candidate))
        .ThenByDescending(t => t.Candidate.QualityFactorPerPascal);

    private DesignCandidate Try(double[] shares)
    {
        var values = _variables.Zip(shares, (v, s) => v.At(s)).ToImmutableArray();
        var layers = _start.ToArray();
        foreach (var (variable, value) in _variables.Zip(values).OrderBy(p => p.First.Kind switch { DesignKind.WeightShare => 2, DesignKind.BasisWeight => 1, _ => 0 }))
        {
            // Weight late: it sets the thickness for whatever solidity was chosen, and shares divide the weight that came of it.
            layers = variable.PutInto(layers, value, _fibreDensity);
        }

        var medium = new MediumModel(layers, _point, _model);
        var worst = Worst.Of(medium, MediaModel.DefaultParticles);
        var candidate = new DesignCandidate
        {
            Values = values,
            Layers = [.. layers],
            PressureDrop = Pressure.FromPascals(medium.Pascals),
            MostPenetratingSize = worst.Metres is { } metres ? Length.FromMeters(metres) : null,
            PenetrationAtMostPenetratingSize = Math.Exp(-worst.Attenuation),
            AerosolPenetration = _targets.Aerosol is { } aerosol ? OfAerosol(layers, aerosol, _model) : null,
            QualityFactorPerPascal = worst.Attenuation / medium.Pascals,
            BasisWeight = AreaDensity.FromKilogramsPerSquareMeter(layers.Sum(l => l.Solidity.Fraction * l.Thickness.Meters) * _fibreDensity.KilogramsPerCubicMeter),
            Thickness = Length.FromMeters(layers.Sum(l => l.Thickness.Meters)),
            MeetsTargets = false,
        };
        return candidate with { MeetsTargets = Miss(candidate) == 0 };
    }

    private double OfAerosol(IReadOnlyList<MediaLayer> layers, ChallengeAerosol aerosol, SingleFibreModel model)
    {
        var medium = new MediumModel(layers, _point with { ParticleDensity = aerosol.ParticleDensity, ParticlePermittivity = aerosol.ParticlePermittivity }, model);
        return aerosol.Shares().Sum(s => s.Share * Math.Exp(-medium.Attenuation(s.Metres)));
    }

    /// <summary>How far all targets together are missed, on logarithms; zero when all are met.</summary>
    private double Miss(DesignCandidate candidate)
    {
        static double Over(double? value, double? limit) => value is { } v && limit is { } most ? Math.Max(0, Math.Log(v / most)) : 0;
        static double Passing(double? value, double? limit) => value is { } v && limit is { } most ? Math.Max(0, TestOutcome.OfPenetration(most) - TestOutcome.OfPenetration(v)) : 0;
        return Passing(candidate.PenetrationAtMostPenetratingSize, _targets.PenetrationAtMostPenetratingSize)
            + Passing(candidate.AerosolPenetration, _targets.AerosolPenetration)
            + Over(candidate.PressureDrop.Pascals, _targets.PressureDrop?.Pascals)
            + Over(candidate.BasisWeight.KilogramsPerSquareMeter, _targets.BasisWeight?.KilogramsPerSquareMeter * (1 + 1e-9))
            + Over(candidate.Thickness.Meters, _targets.Thickness?.Meters * (1 + 1e-9));
    }

    private ImmutableSortedDictionary<string, double> Probabilities(DesignCandidate candidate)
    {
        var forecast = MediaModel.Forecast(candidate.Layers, _point, _settings with { Draws = Math.Min(_settings.Draws, 500) });
        var bands = forecast.Uncertainty;
        var media = SingleFibreModel.Published.Select(set => new MediumModel(candidate.Layers, _point, SingleFibreModel.Of(set))).ToArray();
        var worst = Array.ConvertAll(media, m => Math.Log(Math.Max(1e-12, Worst.Of(m, MediaModel.DefaultParticles).Attenuation)));
        var passing = bands is { } b ? (TestOutcome.OfPenetration(b.PenetrationAtMostPenetratingSize.Low) - TestOutcome.OfPenetration(b.PenetrationAtMostPenetratingSize.High)) / 3.92 : 0;
        var result = ImmutableSortedDictionary.CreateBuilder<string, double>(StringComparer.Ordinal);
        if (_targets.PenetrationAtMostPenetratingSize is { } most)
        {
            result["penetration-at-most-penetrating-size"] = Mean(new TestOutcome(0, worst, passing), new ClassLimit("", AtLeast: 1 - most));
        }

        if (_targets is { Aerosol: { } aerosol, AerosolPenetration: { } limit })
        {
            var bySet = SingleFibreModel.Published.Select(set => TestOutcome.OfPenetration(OfAerosol(candidate.Layers, aerosol, SingleFibreModel.Of(set)))).ToArray();
            result["aerosol-penetration"] = Mean(new TestOutcome(0, bySet, passing), new ClassLimit("", AtLeast: 1 - limit));
        }

        if (_targets.PressureDrop is { } pressure)
        {
            var deviation = bands is { } p ? Math.Log(p.PressureDropPascals.High / p.PressureDropPascals.Low) / 3.92 : 0;
            result["pressure-drop"] = Mean(new TestOutcome(0, Array.ConvertAll(media, m => Math.Log(m.Pascals)), deviation), new ClassLimit("", AtMost: pressure.Pascals));
        }

        return result.ToImmutable();
    }

    private static double Mean(TestOutcome outcome, ClassLimit limit) =>
        Enumerable.Range(0, outcome.BySet.Length).Average(set => outcome.Probability(limit, set));
}
