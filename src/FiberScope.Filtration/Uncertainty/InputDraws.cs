using MathNet.Numerics.Distributions;
using MathNet.Numerics.Random;

namespace FiberScope.Filtration.Uncertainty;

/// <summary>Draws the uncertain inputs, all of them or one alone.</summary>
/// <remarks>
/// Relative uncertainties are drawn log-normally, so that nothing turns negative. The distribution of diameters is drawn as if the
/// stated number of independent fibres had been measured again: shares of the classes by Dirichlet's law.
/// </remarks>
internal sealed class InputDraws(IReadOnlyList<MediaLayer> layers, OperatingPoint point, int seed, UncertainInput[] varying)
{
    private const double LargestLogSolidity = -0.05;

    private readonly MersenneTwister _random = new(seed, threadSafe: false);
    private readonly double[][] _fractions = [.. layers.Select(l => l.Diameters.Classes.Select(c => c.LengthFraction).ToArray())];

    public InputDraw Next()
    {
        var u = point.Uncertainty;
        return new InputDraw
        {
            Layers = [.. layers.Select((layer, i) => Layer(layer, i))],
            LogVelocity = Normal(UncertainInput.FaceVelocity, null, u?.FaceVelocity),
            KelvinsAbove = Normal(UncertainInput.Temperature, null, u?.Temperature.Kelvins),
            LogPressure = Normal(UncertainInput.AirPressure, null, u?.AirPressure),
        };
    }

    private LayerDraw Layer(MediaLayer layer, int index)
    {
        var u = layer.Uncertainty;
        var weighing = u?.SolidityByWeighing == true;
        var thickness = Normal(UncertainInput.Thickness, index, u?.Thickness);
        var solidity = Normal(weighing ? UncertainInput.BasisWeight : UncertainInput.Solidity, index, u?.Solidity) - (weighing ? thickness : 0);
        return new LayerDraw
        {
            DiameterFactor = Math.Exp(Normal(UncertainInput.DiameterScale, index, u?.DiameterScale)),
            LengthFractions = Varies(UncertainInput.DiameterDistribution, index) ? Dirichlet(_fractions[index], u!.IndependentFibres!.Value) : _fractions[index],
            LogThickness = thickness,
            LogSolidity = Math.Min(solidity, LargestLogSolidity - Math.Log(layer.Solidity.Fraction)),
            LogInhomogeneity = Normal(UncertainInput.Inhomogeneity, index, u?.Inhomogeneity),
            LogCharge = Normal(UncertainInput.Charge, index, u?.Charge),
        };
    }

    private double[] Dirichlet(double[] fractions, double fibres)
    {
        var drawn = Array.ConvertAll(fractions, f => Gamma.Sample(_random, fibres * f, 1));
        var sum = drawn.Sum();
        return Array.ConvertAll(drawn, d => d / sum);
    }

    private double Normal(string name, int? layer, double? deviation) =>
        Varies(name, layer) && deviation is { } u ? u * MathNet.Numerics.Distributions.Normal.Sample(_random, 0, 1) : 0;

    private bool Varies(string name, int? layer) => Array.IndexOf(varying, new UncertainInput(name, layer)) >= 0;
}
