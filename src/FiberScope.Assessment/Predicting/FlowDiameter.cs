using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Predicting;

/// <summary>The fibre diameter that a measured pressure drop stands for, beside the one in the pictures.</summary>
internal static class FlowDiameter
{
    /// <summary>Relative standard uncertainty of a rig's pressure drop. Common practice, no source.</summary>
    private const double RigUncertainty = 0.03;

    /// <summary>By Davies' law.</summary>
    public static Length Of(MediaLayer layer, OperatingPoint operation, Speed velocity, Pressure drop) =>
        EffectiveDiameter.FromPressureDrop(drop, velocity, layer.Solidity, layer.Thickness, operation.Air.Properties);

    /// <summary>The likely reasons where the two differ by more than chance explains; told once, by the first pressure drop.</summary>
    public static ImmutableArray<Caveat> Compare(MediaLayer layer, IEnumerable<RigPoint> rig)
    {
        if (rig.Select(r => r.EffectiveDiameter).FirstOrDefault(d => d is not null) is not { } byFlow)
        {
            return [];
        }

        // d goes as the root of f(solidity) t / drop, and Davies' f about as solidity to the power 1.5.
        var u = layer.Uncertainty ?? new LayerUncertainty();
        double[] parts = [u.DiameterScale, 0.75 * u.Solidity, 0.5 * u.Thickness, 0.5 * RigUncertainty];
        return EffectiveDiameter.Compare(byFlow, layer.Diameters, Math.Sqrt(parts.Sum(p => p * p)), layer.BasisWeightVariation);
    }
}
