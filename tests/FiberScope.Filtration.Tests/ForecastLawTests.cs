using CsCheck;
using FiberScope.Fibres;
using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests;

/// <summary>Laws that hold for every medium, whatever the set of correlations.</summary>
public sealed class ForecastLawTests
{
    private const int Samples = 25;

    private static readonly ForecastSettings Quick = new() { Draws = 0 };

    private static readonly Gen<(MediaLayer Layer, double Velocity, double Particle, CorrelationSet Set)> Cases =
        from fibre in Gen.Double[-6.9, -4.7]
        from solidity in Gen.Double[0.01, 0.25]
        from thickness in Gen.Double[-5, -2.8]
        from velocity in Gen.Double[0.006, 0.4]
        from particle in Gen.Double[-8, -5]
        from set in Gen.Int[0, 3].Select(i => (CorrelationSet)i)
        select (Layer(Math.Pow(10, fibre), solidity, Math.Pow(10, thickness)), velocity, Math.Pow(10, particle), set);

    [Fact]
    public void Penetration_lies_between_0_and_1_and_so_do_its_bands() => Cases.Sample(
        c => MediaModel.Forecast([c.Layer], At(c.Velocity, c.Particle), By(c.Set)).Curve.All(p =>
            p.Penetration is >= 0 and <= 1 && p.ModelBand.Low >= 0 && p.ModelBand.High <= 1 && p.ModelBand.Contains(p.Penetration)),
        iter: Samples);

    [Fact]
    public void Penetration_falls_with_thickness() => Cases.Sample(
        c => P(c, c.Layer with { Thickness = c.Layer.Thickness * 1.3 }) <= P(c, c.Layer),
        iter: Samples);

    [Fact]
    public void A_layer_cut_in_two_lets_through_the_same_at_the_same_pressure_drop() => Cases.Sample(
        c =>
        {
            var half = c.Layer with { Thickness = c.Layer.Thickness / 2 };
            var one = MediaModel.Forecast([c.Layer], At(c.Velocity, c.Particle), By(c.Set));
            var two = MediaModel.Forecast([half, half], At(c.Velocity, c.Particle), By(c.Set));
            return Near(one.Curve[0].Penetration, two.Curve[0].Penetration) && Near(one.PressureDrop.Pascals, two.PressureDrop.Pascals);
        },
        iter: Samples);

    [Fact]
    public void A_distribution_without_width_is_a_single_diameter() => Cases.Sample(
        c => Near(P(c, c.Layer), P(c, c.Layer with { Diameters = DiameterDistribution.LogNormal(c.Layer.Diameters.Mean, 1.000001) }), 1e-4),
        iter: Samples);

    [Fact]
    public void A_mixture_of_two_diameters_lies_between_them() => Cases.Sample(
        c =>
        {
            var thick = c.Layer.Diameters.Mean * 2.5;
            MediaLayer With(params DiameterClass[] classes) => c.Layer with { Diameters = new DiameterDistribution(classes) };
            var mixed = P(c, With(new DiameterClass(c.Layer.Diameters.Mean, 0.6), new DiameterClass(thick, 0.4)));
            var (one, other) = (P(c, c.Layer), P(c, With(new DiameterClass(thick, 1))));
            return mixed >= Math.Min(one, other) - 1e-12 && mixed <= Math.Max(one, other) + 1e-12;
        },
        iter: Samples);

    [Fact]
    public void The_most_penetrating_size_falls_with_velocity_while_diffusion_meets_interception() =>
        Gen.Select(Gen.Double[0.5e-6, 5e-6], Gen.Double[0.02, 0.15], Gen.Double[0.01, 0.1], Gen.Int[0, 3].Select(i => (CorrelationSet)i)).Sample(
            (fibre, solidity, velocity, set) =>
            {
                double Size(double u) => MediaModel.Forecast([Layer(fibre, solidity, 3e-4)], At(u, 3e-7), Set(set)).MostPenetratingSize!.Value.Meters;
                return Size(velocity * 1.3) < Size(velocity);
            },
            iter: 8);

    [Fact]
    public void A_leak_never_improves_anything() => Gen.Select(Cases, Gen.Double[10e-6, 500e-6], Gen.Double[1e-6, 1e-2]).Sample(
        (c, hole, area) =>
        {
            var whole = MediaModel.Forecast([c.Layer], At(c.Velocity, c.Particle), Set(c.Set));
            var pierced = MediaModel.Forecast([c.Layer with { Holes = [new Pinholes(Length.FromMeters(hole), area)] }], At(c.Velocity, c.Particle), Set(c.Set));
            return pierced.PressureDrop <= whole.PressureDrop * (1 + 1e-9) && (pierced.HoleShares[0] < 1e-3 || pierced.Curve[0].Penetration >= pierced.HoleShares[0] * (1 - 1e-12));
        },
        iter: Samples);

    [Fact]
    public void Unevenness_lowers_the_pressure_drop_and_lets_more_of_what_would_be_stopped_through() => Cases.Sample(
        c =>
        {
            var even = MediaModel.Forecast([c.Layer], At(c.Velocity, 3e-6), Set(c.Set));
            var uneven = MediaModel.Forecast([c.Layer with { BasisWeightVariation = 0.35 }], At(c.Velocity, 3e-6), Set(c.Set));
            return uneven.PressureDrop < even.PressureDrop && (even.Curve[0].Penetration > 0.1 || uneven.Curve[0].Penetration >= even.Curve[0].Penetration * 0.999);
        },
        iter: Samples);

    [Fact]
    public void Units_do_not_matter() => Cases.Sample(
        c =>
        {
            var other = c.Layer with { Thickness = Length.FromInches(c.Layer.Thickness.Inches), Diameters = DiameterDistribution.OfOneDiameter(Length.FromNanometers(c.Layer.Diameters.Mean.Nanometers)) };
            var point = At(c.Velocity) with { FaceVelocity = Speed.FromFeetPerMinute(Speed.FromMetersPerSecond(c.Velocity).FeetPerMinute), Particles = [Length.FromNanometers(c.Particle * 1e9)] };
            return Near(P(c, c.Layer), MediaModel.Forecast([other], point, Set(c.Set)).Curve[0].Penetration);
        },
        iter: Samples);

    [Theory]
    [InlineData(CorrelationSet.KirschStechkina1978)]
    [InlineData(CorrelationSet.LeeLiu1982)]
    [InlineData(CorrelationSet.Hinds1999)]
    [InlineData(CorrelationSet.Cell)]
    public void The_curve_has_no_jumps(CorrelationSet set)
    {
        const int Steps = 6000;
        double[] sizes = [.. Enumerable.Range(0, Steps).Select(i => 1e-8 * Math.Pow(1000, (double)i / (Steps - 1)))];
        foreach (var fibre in new[] { 0.3e-6, 4e-6 })
        {
            var charged = Layer(fibre, 0.06, fibre * 30) with { Charge = new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(2e-6)) };
            foreach (var layer in fibre < 1e-6 ? new[] { Layer(fibre, 0.06, fibre * 30) } : [charged])
            {
                var p = MediaModel.Forecast([layer], At(0.05, sizes), Set(set)).Penetrations().Select(x => -Math.Log(x)).ToArray();
                Assert.All(p.Zip(p.Skip(1)), pair => Assert.InRange(Math.Abs(pair.Second - pair.First), 0, 0.01 * (pair.First + 0.01)));
            }
        }
    }

    private static ForecastSettings Set(CorrelationSet set) => Quick with { Correlations = set };

    private static double P((MediaLayer Layer, double Velocity, double Particle, CorrelationSet Set) c, MediaLayer layer) =>
        MediaModel.Forecast([layer], At(c.Velocity, c.Particle), Set(c.Set)).Curve[0].Penetration;

    private static bool Near(double a, double b, double tolerance = 1e-9) => Math.Abs(a - b) <= (tolerance * Math.Max(Math.Abs(a), Math.Abs(b))) + 1e-300;
}
