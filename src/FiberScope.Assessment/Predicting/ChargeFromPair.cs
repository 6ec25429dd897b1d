using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Fibres;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Predicting;

/// <summary>The fibre charge that no micrograph shows, from a penetration as received and one discharged.</summary>
internal static class ChargeFromPair
{
    /// <summary>The layers, all with the charge that was inferred and its uncertainty.</summary>
    public static IReadOnlyList<MediaLayer> PutInto(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ChargePair pair, ForecastSettings settings)
    {
        var found = Infer(layers, operation, pair, settings);
        return
        [
            .. layers.Select(layer => layer with
            {
                Charge = found.Charge.SurfaceDensity.CoulombsPerSquareMeter > 0 ? found.Charge : null,
                Uncertainty = (layer.Uncertainty ?? new LayerUncertainty()) with { Charge = Math.Min(2, found.RelativeUncertainty) },
            }),
        ];
    }

    /// <summary>Says what was inferred; empty when nothing was.</summary>
    public static ImmutableArray<Caveat> Notes(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastRequest request, ForecastSettings settings)
    {
        if (request.ChargePair is not { } pair)
        {
            return [];
        }

        var found = Infer(layers, operation, pair, settings);
        return
        [
            new Caveat("charge-inferred", FormattableString.Invariant($"Charge of {found.Charge.SurfaceDensity.CoulombsPerSquareMeter * 1e6:G3} µC/m² ± {found.RelativeUncertainty * 100:F0} %, the same in every layer, from penetrations of {pair.AsReceived * 100:G3} % as received and {pair.Discharged * 100:G3} % discharged at {pair.Particle.Micrometers:G3} µm; the forecast of the structure itself is not fitted to them.")),
            .. found.Caveats,
        ];
    }

    private static InferredCharge Infer(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ChargePair pair, ForecastSettings settings) =>
        ChargeInference.FromPair(layers, operation, pair.Particle, pair.AsReceived, pair.Discharged, pair.RelativeUncertainty, settings);
}
