using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration.Drag;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The fibre diameter that a mat's flow resistance stands for.</summary>
public static class EffectiveDiameter
{
    /// <summary>Relative difference from the measured root-mean-square diameter that calls for an explanation.</summary>
    private const double Notable = 0.15;

    /// <summary>d = √(f(α) μ U t / Δp) with f by Davies (1952): the effective fibre diameter of the trade.</summary>
    /// <param name="pressureDrop">Δp measured; above zero.</param>
    /// <param name="faceVelocity">U; above zero.</param>
    /// <param name="solidity">α.</param>
    /// <param name="thickness">t; above zero.</param>
    /// <param name="air">The air.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is not above zero.</exception>
    public static Length FromPressureDrop(Pressure pressureDrop, Speed faceVelocity, Solidity solidity, Length thickness, AirProperties air)
    {
        var pascals = Require.Positive(pressureDrop.Pascals, nameof(pressureDrop));
        var velocity = Require.Positive(faceVelocity.MetersPerSecond, nameof(faceVelocity));
        var metres = Require.Positive(thickness.Meters, nameof(thickness));
        return Length.FromMeters(Math.Sqrt(DragLaw.Davies(solidity.Fraction) * air.PascalSeconds * velocity * metres / pascals));
    }

    /// <summary>d = 4 / S, S the fibre surface per fibre volume.</summary>
    public static Length FromSpecificSurface(ReciprocalLength surfacePerVolume) => Length.FromMeters(4 / Require.Positive(surfacePerVolume.InverseMeters, nameof(surfacePerVolume)));

    /// <summary>The inhomogeneity factor that makes the fan model give a layer its measured pressure drop.</summary>
    /// <param name="layer">The layer; its own factor is disregarded.</param>
    /// <param name="point">The conditions of the measurement.</param>
    /// <param name="pressureDrop">Δp measured across this layer; above zero.</param>
    /// <returns>ε; dimensionless, above zero. Outside 0.8 to 3 something else is wrong.</returns>
    public static double Inhomogeneity(MediaLayer layer, OperatingPoint point, Pressure pressureDrop)
    {
        var one = MediaModel.PressureDropAt([layer with { InhomogeneityFactor = 1 }], point, point.FaceVelocity);
        return one.Pascals / Require.Positive(pressureDrop.Pascals, nameof(pressureDrop));
    }

    /// <summary>What may lie behind a difference between the diameter by flow and the diameter in the pictures.</summary>
    /// <param name="byFlow">Effective diameter from the pressure drop.</param>
    /// <param name="measured">The measured distribution; its root-mean-square diameter is compared.</param>
    /// <param name="relativeUncertainty">Combined relative standard uncertainty of the two; zero or above.</param>
    /// <param name="basisWeightVariation">Coefficient of variation of the local basis weight, if known; zero otherwise.</param>
    /// <returns>Empty when they agree; else the likely reasons, the likeliest first.</returns>
    public static ImmutableArray<Caveat> Compare(Length byFlow, DiameterDistribution measured, double relativeUncertainty, double basisWeightVariation = 0)
    {
        var ratio = byFlow / measured.RootMeanSquare;
        var allowed = Math.Max(Notable, 2 * Require.NotNegative(relativeUncertainty));
        if (Math.Abs(Math.Log(ratio)) <= Math.Log(1 + allowed))
        {
            return [];
        }

        var start = FormattableString.Invariant($"The pressure drop stands for fibres of {byFlow.Micrometers:G3} µm, the pictures show {measured.RootMeanSquare.Micrometers:G3} µm (root mean square)");
        return ratio > 1 ? [.. TooOpen(start, ratio, basisWeightVariation)] : [TooTight(start)];
    }

    private static IEnumerable<Caveat> TooOpen(string start, double ratio, double variation)
    {
        // Places of unlike weight lower the pressure drop by 1 − c², and so raise the diameter by its root.
        var explained = 1 / Math.Sqrt(1 - (variation * variation));
        if (explained > 1 + (0.5 * (ratio - 1)))
        {
            yield return new Caveat("flow-diameter-uneven", FormattableString.Invariant($"{start}: the unevenness of the basis weight ({variation:P0}) explains most of it."));
        }

        yield return new Caveat("flow-diameter-ropes", $"{start}: likely ropes and bundles, which the air meets as one thick fibre; or a mat more uneven than a few fields show, pinholes, or a thickness measured too large (at too low a pressure).");
    }

    private static Caveat TooTight(string start) =>
        new("flow-diameter-tight", $"{start}: likely a thickness measured too small (gauge pressure too high), fine fibres below the resolution of the pictures, a film or shot that blocks the air, or a pressure drop that holds more than this layer.");
}
