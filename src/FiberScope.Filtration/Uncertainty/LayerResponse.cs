using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;

namespace FiberScope.Filtration.Uncertainty;

/// <summary>
/// A layer's ln K (K = −ln P of the even layer) as a fast function of its uncertain inputs: single-fibre efficiency tabulated over
/// ln d, read by cubic interpolation, and the other inputs as a parabola in their logarithms.
/// </summary>
/// <remarks>K is linear in the table, so a draw costs one weighted sum per size however many diameter classes there are.</remarks>
internal sealed class LayerResponse
{
    private const double LogStep = 0.1;
    private const double SolidityStep = 0.1;
    private const double VelocityStep = 0.1;
    private const double InhomogeneityStep = 0.1;
    private const double ChargeStep = 0.2;
    private const double PressureStep = 0.02;
    private const double KelvinStep = 5;

    private readonly LayerFigures _figures;
    private readonly SingleFibreModel _model;
    private readonly AirProperties _air;
    private readonly OperatingPoint _point;
    private readonly double _lowest;
    private readonly int _nodes;
    private readonly double[] _table;
    private readonly int[] _starts;
    private readonly Parabola[] _solidity;
    private readonly Parabola[] _velocity;
    private readonly Parabola[] _inhomogeneity;
    private readonly Parabola[] _charge;
    private readonly Parabola[] _temperature;
    private readonly Parabola[] _pressure;

    public LayerResponse(MediaLayer layer, OperatingPoint point, SingleFibreModel model, VelocityNodes velocities, double metresPerSecond, SizeTraits[] sizes)
    {
        _figures = LayerFigures.Of(layer);
        _model = model;
        _point = point;
        _air = point.Air.Properties;
        Velocities = velocities;
        var reach = 5 * (layer.Uncertainty?.DiameterScale ?? 0);
        _lowest = Math.Log(_figures.DiameterMetres.Min()) - reach - LogStep;
        _nodes = 4 + (int)Math.Ceiling((Math.Log(_figures.DiameterMetres.Max()) + reach + LogStep - _lowest) / LogStep);
        _starts = Starts(sizes, velocities.Relative.Length);
        _table = Tabulate(sizes, metresPerSecond);
        var middle = metresPerSecond * velocities.Relative[velocities.Relative.Length / 2];
        var u = layer.Uncertainty;
        var air = point.Uncertainty;
        _solidity = Parabolas(u is { Solidity: > 0 } or { Thickness: > 0 }, SolidityStep, sizes, x => (_figures with { Solidity = _figures.Solidity * Math.Exp(x) }, _air, 0), middle);
        _velocity = Parabolas(true, VelocityStep, sizes, x => (_figures, _air, x), middle);
        _inhomogeneity = Parabolas(u is { Inhomogeneity: > 0 } && layer.InhomogeneityFactor is not null, InhomogeneityStep, sizes, x => (_figures with { Inhomogeneity = _figures.Inhomogeneity * Math.Exp(x) }, _air, 0), middle);
        _charge = Parabolas(u is { Charge: > 0 } && layer.Charge is not null, ChargeStep, sizes, x => (_figures with { CoulombsPerSquareMetre = _figures.CoulombsPerSquareMetre * Math.Exp(x) }, _air, 0), middle);
        _temperature = Parabolas(air is { Temperature.Kelvins: > 0 }, KelvinStep, sizes, x => (_figures, DrawnAir.Of(point.Air, x, 0), 0), middle);
        _pressure = Parabolas(air is { AirPressure: > 0 }, PressureStep, sizes, x => (_figures, DrawnAir.Of(point.Air, 0, x), 0), middle);
    }

    public VelocityNodes Velocities { get; }

    /// <summary>The layer's numbers in one draw.</summary>
    public LayerFigures Drawn(LayerDraw draw) => _figures with
    {
        DiameterMetres = draw.DiameterFactor == 1 ? _figures.DiameterMetres : Array.ConvertAll(_figures.DiameterMetres, d => d * draw.DiameterFactor),
        LengthFractions = draw.LengthFractions,
        Solidity = _figures.Solidity * Math.Exp(draw.LogSolidity),
        ThicknessMetres = _figures.ThicknessMetres * Math.Exp(draw.LogThickness),
        Inhomogeneity = _figures.Inhomogeneity * Math.Exp(draw.LogInhomogeneity),
    };

    /// <summary>The weights of the table's nodes in one draw: for any size, K is their sum with its row.</summary>
    public double[] NodeWeights(LayerDraw draw)
    {
        var drawn = Drawn(draw) with { Solidity = _figures.Solidity };
        var classes = LayerModel.Weights(drawn, _model);
        var weights = new double[_nodes];
        Span<double> cubic = stackalloc double[4];
        for (var i = 0; i < classes.Length; i++)
        {
            var at = (Math.Log(drawn.DiameterMetres[i]) - _lowest) / LogStep;
            var first = Math.Clamp((int)at - 1, 0, _nodes - 4);
            Cubic(at - first, cubic);
            for (var k = 0; k < 4; k++)
            {
                weights[first + k] += classes[i] * cubic[k];
            }
        }

        return weights;
    }

    /// <summary>ln K at every velocity node for one size and charge state of one draw.</summary>
    public void Logarithms(double[] nodeWeights, int size, int state, InputDraw draw, LayerDraw layer, double logVelocity, Span<double> result)
    {
        var velocities = Velocities.Relative.Length;
        var index = _starts[size] + state;
        var shift = _solidity[index].At(layer.LogSolidity) + _velocity[index].At(logVelocity) + _inhomogeneity[index].At(layer.LogInhomogeneity) + _charge[index].At(layer.LogCharge)
            + _temperature[index].At(draw.KelvinsAbove) + _pressure[index].At(draw.LogPressure);
        for (var n = 0; n < velocities; n++)
        {
            var row = _table.AsSpan(((index * velocities) + n) * _nodes, _nodes);
            var sum = 0.0;
            for (var j = 0; j < nodeWeights.Length && j < row.Length; j++)
            {
                sum += nodeWeights[j] * row[j];
            }

            result[n] = Math.Log(Math.Max(sum, 1e-300)) + shift;
        }
    }

    private static int[] Starts(SizeTraits[] sizes, int velocities)
    {
        var starts = new int[sizes.Length + 1];
        for (var i = 0; i < sizes.Length; i++)
        {
            starts[i + 1] = starts[i] + sizes[i].States.Nodes.Length;
        }

        ArgumentOutOfRangeException.ThrowIfZero(velocities);
        return starts;
    }

    private static void Cubic(double x, Span<double> weights)
    {
        weights[0] = -(x - 1) * (x - 2) * (x - 3) / 6;
        weights[1] = x * (x - 2) * (x - 3) / 2;
        weights[2] = -x * (x - 1) * (x - 3) / 2;
        weights[3] = x * (x - 1) * (x - 2) / 6;
    }

    private double[] Tabulate(SizeTraits[] sizes, double metresPerSecond)
    {
        var diameters = Enumerable.Range(0, _nodes).Select(j => Math.Exp(_lowest + (j * LogStep))).ToArray();
        var model = new LayerModel(_figures with { DiameterMetres = diameters, LengthFractions = diameters }, _air, _point, _model);
        var velocities = Velocities.Relative;
        var table = new double[_starts[^1] * velocities.Length * _nodes];
        var at = 0;
        foreach (var size in sizes)
        {
            foreach (var charges in size.States.Nodes)
            {
                foreach (var relative in velocities)
                {
                    for (var j = 0; j < _nodes; j++)
                    {
                        table[at++] = model.SingleEfficiency(j, size.Particle, metresPerSecond * relative, charges);
                    }
                }
            }
        }

        return table;
    }

    private Parabola[] Parabolas(bool wanted, double step, SizeTraits[] sizes, Func<double, (LayerFigures Layer, AirProperties Air, double LogVelocity)> change, double metresPerSecond)
    {
        var result = new Parabola[_starts[^1]];
        if (!wanted)
        {
            return result;
        }

        var cases = new[] { -step, 0, step }.Select(x =>
        {
            var (layer, air, logVelocity) = change(x);
            return (Model: new LayerModel(layer, air, _point, _model), Air: air, Velocity: metresPerSecond * Math.Exp(logVelocity));
        }).ToArray();
        Span<double> values = stackalloc double[3];
        for (var size = 0; size < sizes.Length; size++)
        {
            for (var state = 0; state < sizes[size].States.Nodes.Length; state++)
            {
                for (var i = 0; i < 3; i++)
                {
                    var particle = cases[i].Air == _air ? sizes[size].Particle : new Particle(sizes[size].Particle.Diameter, _point.ParticleDensity, cases[i].Air);
                    values[i] = Math.Log(Math.Max(1e-300, cases[i].Model.Attenuation(particle, cases[i].Velocity, sizes[size].States.Nodes[state])));
                }

                result[_starts[size] + state] = Parabola.Through(values[0], values[1], values[2], step);
            }
        }

        return result;
    }
}
