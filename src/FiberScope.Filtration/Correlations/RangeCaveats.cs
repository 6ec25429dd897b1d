using FiberScope.Fibres;

namespace FiberScope.Filtration.Correlations;

/// <summary>Says where a forecast leaves the ranges that its formulas were fitted or tested on.</summary>
internal static class RangeCaveats
{
    internal const string Outside = "outside-fitted-range";

    /// <summary>−ln P beyond which leaks, not the mat, decide.</summary>
    private const double LeaksDecide = 20;

    /// <summary>A share of the fibre length below which a tail of the distribution raises no caveat.</summary>
    private const double NegligibleTail = 0.02;

    public static IEnumerable<Caveat> For(IReadOnlyList<MediaLayer> layers, OperatingPoint point, IReadOnlyList<double> particleMetres, ApplicableRange range)
    {
        var velocity = point.FaceVelocity.MetersPerSecond;
        if (!range.MetresPerSecond.Contains(velocity))
        {
            yield return new Caveat(Outside, Text($"Face velocity {velocity * 100:G4} cm/s is outside {range.Name}'s range, {range.MetresPerSecond.Low * 100:G3} to {range.MetresPerSecond.High * 100:G3} cm/s; the forecast is an extrapolation."));
        }

        var left = particleMetres.Where(d => !range.ParticleMetres.Contains(d)).ToArray();
        if (left.Length > 0)
        {
            yield return new Caveat(Outside, Text($"Particles of {Span(left, 1e6)} µm are outside {range.Name}'s range, {range.ParticleMetres.Low * 1e6:G3} to {range.ParticleMetres.High * 1e6:G3} µm; the curve is an extrapolation there."));
        }

        foreach (var (layer, name) in layers.Select((l, i) => (l, Name(l, i))))
        {
            foreach (var caveat in ForLayer(layer, name, point, particleMetres, range))
            {
                yield return caveat;
            }
        }
    }

    /// <summary>The caveat on −ln P so large that the mat's own penetration cannot be seen behind any leak.</summary>
    public static IEnumerable<Caveat> ForDepth(double smallestAttenuation)
    {
        if (smallestAttenuation > LeaksDecide)
        {
            yield return new Caveat("leaks-decide", Text($"Even the most-penetrating size is held back to 1e-{Math.Floor(smallestAttenuation / Math.Log(10)):F0} by the mat alone; pinholes and the edge seal decide what passes, not the fibres."));
        }
    }

    private static IEnumerable<Caveat> ForLayer(MediaLayer layer, string name, OperatingPoint point, IReadOnlyList<double> particleMetres, ApplicableRange range)
    {
        var solidity = layer.Solidity.Fraction;
        if (!range.Solidity.Contains(solidity))
        {
            yield return new Caveat(Outside, Text($"{name}: solidity {solidity:G3} is outside {range.Name}'s range, {range.Solidity.Low:G3} to {range.Solidity.High:G3}; the forecast is an extrapolation."));
        }

        var beyond = layer.Diameters.Classes.Where(c => !range.FibreMetres.Contains(c.Diameter.Meters)).ToArray();
        if (beyond.Sum(c => c.LengthFraction) > NegligibleTail)
        {
            yield return new Caveat(Outside, Text($"{name}: {beyond.Sum(c => c.LengthFraction):P0} of the fibre length, {Span([.. beyond.Select(c => c.Diameter.Meters)], 1e6)} µm, is outside {range.Name}'s range, {range.FibreMetres.Low * 1e6:G3} to {range.FibreMetres.High * 1e6:G3} µm."));
        }

        var air = point.Air.Properties;
        var rarefied = layer.Diameters.Classes.Where(c => 2 * air.MeanFreePathMetres / c.Diameter.Meters > range.LargestFibreKnudsen).Sum(c => c.LengthFraction);
        if (rarefied > NegligibleTail)
        {
            yield return new Caveat("slip-beyond-range", Text($"{name}: {rarefied:P0} of the fibre length is so thin that its Knudsen number 2 λ / d exceeds {range.LargestFibreKnudsen:G3}, the most that {range.Name} allows for; pressure drop and efficiency may be off by a factor of two."));
        }

        var reynolds = air.KilogramsPerCubicMetre * point.FaceVelocity.MetersPerSecond * layer.Diameters.RootMeanSquare.Meters / air.PascalSeconds;
        if (reynolds > 1)
        {
            yield return new Caveat("inertial-flow", Text($"{name}: the fibre Reynolds number is {reynolds:G3}; every formula here is for creeping flow, below 1. The real pressure drop is higher."));
        }

        var gap = layer.Diameters.RootMeanSquare.Meters * ((1 / Math.Sqrt(solidity)) - 1);
        if (particleMetres.Any(d => d > gap))
        {
            yield return new Caveat("particle-fills-gap", Text($"{name}: particles above {gap * 1e6:G3} µm do not fit between the fibres' cells; single-fibre formulas have no meaning there, and straining decides."));
        }
    }

    internal static string Name(MediaLayer layer, int index) => layer.Name.Length > 0 ? $"Layer '{layer.Name}'" : Text($"Layer {index + 1}");

    private static string Span(double[] values, double scale) =>
        values.Length == 1 ? Text($"{values[0] * scale:G3}") : Text($"{values.Min() * scale:G3} to {values.Max() * scale:G3}");

    private static string Text(FormattableString text) => FormattableString.Invariant(text);
}
