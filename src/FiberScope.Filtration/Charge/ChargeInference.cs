using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration.Correlations;
using FiberScope.Filtration.Passage;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The fibre charge that two penetrations tell, one as received and one discharged.</summary>
/// <param name="Charge">The charge, the same in every layer.</param>
/// <param name="RelativeUncertainty">Its relative standard uncertainty from the two penetrations; zero or above. The model's own error is not in it.</param>
/// <param name="Caveats">What a reader must know.</param>
public sealed record InferredCharge(FibreCharge Charge, double RelativeUncertainty, ImmutableArray<Caveat> Caveats);

/// <summary>Infers a charge that no micrograph shows.</summary>
public static class ChargeInference
{
    private const double LargestCoulombsPerSquareMetre = 1e-3;

    /// <summary>The charge whose gain in −ln P over the discharged medium is the measured one, ln(P discharged / P as received).</summary>
    /// <param name="layers">The structure; charges in it are disregarded.</param>
    /// <param name="point">The conditions of both tests.</param>
    /// <param name="particle">The particle size of both tests.</param>
    /// <param name="asReceived">Penetration as received; dimensionless, in (0, 1).</param>
    /// <param name="discharged">Penetration discharged; dimensionless, in (0, 1).</param>
    /// <param name="penetrationUncertainty">Relative standard uncertainty of each penetration; zero or above.</param>
    /// <param name="settings">The correlation set; the defaults when null.</param>
    /// <remarks>Only the difference counts, so an error of the mechanical forecast cancels to first order.</remarks>
    /// <exception cref="ArgumentOutOfRangeException">A penetration is not in (0, 1).</exception>
    public static InferredCharge FromPair(IReadOnlyList<MediaLayer> layers, OperatingPoint point, Length particle, double asReceived, double discharged, double penetrationUncertainty = 0.05, ForecastSettings? settings = null)
    {
        var wanted = Math.Log(Require.Inside(discharged, 0, 1) / Require.Inside(asReceived, 0, 1));
        var permittivity = layers.Select(l => l.Charge?.FibrePermittivity).FirstOrDefault(p => p is not null) ?? 2.3;
        var model = SingleFibreModel.Of((settings ?? new ForecastSettings()).Correlations);
        double Gain(double charge) => Attenuation(charge) - Attenuation(0);
        double Attenuation(double charge) =>
            new MediumModel([.. layers.Select(l => l with { Charge = charge > 0 ? Of(charge, permittivity) : null })], point, model).Attenuation(particle.Meters);
        if (wanted <= 0)
        {
            return new InferredCharge(Of(0, permittivity), 0, [new Caveat("no-charge-seen", "The medium lets no more through discharged than as received: no charge can be told from this pair.")]);
        }

        if (Gain(LargestCoulombsPerSquareMetre) < wanted)
        {
            return new InferredCharge(Of(LargestCoulombsPerSquareMetre, permittivity), 1, [new Caveat("charge-out-of-reach", "The gain from charge is more than any fibre charge explains: the discharge may have changed the mat, or the two tests were not alike.")]);
        }

        var found = RisingRoot.Solve(Gain, wanted, LargestCoulombsPerSquareMetre);
        var slope = (Gain(found * 1.02) - Gain(found * 0.98)) / 0.04;
        var relative = Math.Sqrt(2) * Require.NotNegative(penetrationUncertainty) / Math.Max(1e-9, slope);
        return new InferredCharge(Of(found, permittivity), relative, relative > 0.5
            ? [new Caveat("charge-poorly-known", FormattableString.Invariant($"The charge is known within {relative:P0} only: the two penetrations are too close together."))]
            : []);
    }

    private static FibreCharge Of(double coulombsPerSquareMetre, double permittivity) =>
        new(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(coulombsPerSquareMetre), permittivity);
}
