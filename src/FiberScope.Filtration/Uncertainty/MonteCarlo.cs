using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration.Correlations;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration.Uncertainty;

/// <summary>Carries the inputs' uncertainties through to the forecast by drawing them many times.</summary>
internal sealed class MonteCarlo
{
    /// <summary>Draws of one input alone, for the ranking.</summary>
    private const int RankingDraws = 200;

    private readonly IReadOnlyList<MediaLayer> _layers;
    private readonly OperatingPoint _point;
    private readonly ForecastSettings _settings;
    private readonly UncertainInput[] _inputs;
    private readonly MediumResponse _response;
    private readonly SizeSearch _search;
    private readonly int _curveSizes;

    /// <summary>Prepares the draws for the sizes of a curve.</summary>
    /// <param name="layers">The layers.</param>
    /// <param name="point">How the medium is used.</param>
    /// <param name="settings">Draws, seed and set.</param>
    /// <param name="curveMetres">The curve's sizes, ascending.</param>
    public MonteCarlo(IReadOnlyList<MediaLayer> layers, OperatingPoint point, ForecastSettings settings, double[] curveMetres)
    {
        _layers = layers;
        _point = point;
        _settings = settings;
        _inputs = UncertainInput.Of(layers, point);
        _curveSizes = curveMetres.Length;
        _search = SizeSearch.For(curveMetres);
        _response = new MediumResponse(layers, point, SingleFibreModel.Of(settings.Correlations), _search.AllMetres(curveMetres));
    }

    /// <summary>95 % intervals of the penetration at each size of the curve; empty until <see cref="Run"/> has run.</summary>
    public ImmutableArray<Interval> Curve { get; private set; } = [];

    /// <summary>Whether a medium or its use has anything uncertain to draw.</summary>
    public static bool HasInputs(IReadOnlyList<MediaLayer> layers, OperatingPoint point) => UncertainInput.Of(layers, point).Length > 0;

    public MeasurementUncertainty Run(double mostPenetratingMetres)
    {
        var draws = _settings.Draws;
        var source = new InputDraws(_layers, _point, _settings.Seed, _inputs);
        var penetrations = Enumerable.Range(0, _curveSizes).Select(_ => new double[draws]).ToArray();
        var (pascals, worst, quality) = (new double[draws], new double[draws], new double[draws]);
        var sizes = new List<double>(draws);
        var attenuations = new double[_response.SizeCount];
        for (var draw = 0; draw < draws; draw++)
        {
            pascals[draw] = _response.Evaluate(source.Next(), null, attenuations);
            for (var i = 0; i < _curveSizes; i++)
            {
                penetrations[i][draw] = Math.Exp(-attenuations[i]);
            }

            var (metres, least) = _search.Find(attenuations);
            sizes.AddRange(metres is { } found ? [found] : []);
            worst[draw] = Math.Exp(-least);
            quality[draw] = least / pascals[draw];
        }

        Curve = [.. penetrations.Select(Middle95)];
        return new MeasurementUncertainty
        {
            Draws = draws,
            Seed = _settings.Seed,
            PressureDropPascals = Middle95(pascals),
            MostPenetratingSize = sizes.Count >= 0.9 * draws ? Lengths(Middle95([.. sizes])) : null,
            PenetrationAtMostPenetratingSize = Middle95(worst),
            QualityFactorPerPascal = Middle95(quality),
            Ranking = Rank(mostPenetratingMetres),
        };
    }

    private static LengthInterval Lengths(Interval metres) => new(Length.FromMeters(metres.Low), Length.FromMeters(metres.High));

    /// <summary>The interval between the 2.5 % and 97.5 % order statistics.</summary>
    private static Interval Middle95(double[] values)
    {
        Array.Sort(values);
        double At(double share)
        {
            var position = share * (values.Length - 1);
            var below = (int)position;
            var above = Math.Min(below + 1, values.Length - 1);
            return values[below] + ((position - below) * (values[above] - values[below]));
        }

        return new Interval(At(0.025), At(0.975));
    }

    private ImmutableArray<InputContribution> Rank(double metres)
    {
        var response = new MediumResponse(_layers, _point, SingleFibreModel.Of(_settings.Correlations), [metres]);
        var alone = Array.ConvertAll(_inputs, input => Alone(response, input));
        var (penetration, pressure) = (alone.Sum(a => a.Penetration), alone.Sum(a => a.Pressure));
        return
        [
            .. _inputs.Zip(alone).Select(pair => new InputContribution
            {
                Input = pair.First.Name,
                Layer = pair.First.Layer + 1,
                LogPenetrationDeviation = Math.Sqrt(pair.Second.Penetration),
                PressureDropDeviation = Math.Sqrt(pair.Second.Pressure),
                PenetrationShare = penetration > 0 ? pair.Second.Penetration / penetration : 0,
                PressureDropShare = pressure > 0 ? pair.Second.Pressure / pressure : 0,
            }).OrderByDescending(c => c.PenetrationShare + c.PressureDropShare),
        ];
    }

    /// <summary>Variances of −ln P and of ln Δp when one input alone varies.</summary>
    private (double Penetration, double Pressure) Alone(MediumResponse response, UncertainInput input)
    {
        var source = new InputDraws(_layers, _point, _settings.Seed, [input]);
        var (logs, pressures, buffer) = (new double[RankingDraws], new double[RankingDraws], new double[1]);
        for (var i = 0; i < RankingDraws; i++)
        {
            pressures[i] = Math.Log(response.Evaluate(source.Next(), 0, buffer));
            logs[i] = buffer[0];
        }

        return (Variance(logs), Variance(pressures));
    }

    private static double Variance(double[] values)
    {
        var mean = values.Average();
        return values.Sum(v => (v - mean) * (v - mean)) / (values.Length - 1);
    }
}
