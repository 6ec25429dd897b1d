using CsCheck;
using UnitsNet;

namespace FiberScope.Fibres.Tests;

public sealed class DiameterDistributionTests
{
    [Fact]
    public void A_log_normal_keeps_its_fibre_volume()
    {
        // Hatch and Choate (1929): root-mean-square diameter = median exp(ln^2 GSD); for 2 um and 1.5: 2.3574 um.
        var rms = DiameterDistribution.LogNormal(Length.FromMicrometers(2), 1.5).RootMeanSquare;
        Assert.Equal(2.3574, rms.Micrometers, 1e-4);
    }

    [Fact]
    public void A_log_normal_keeps_its_mean_nearly()
    {
        // Hatch and Choate (1929): mean = median exp(ln^2 GSD / 2); for 2 um and 1.5: 2.1713 um.
        var mean = DiameterDistribution.LogNormal(Length.FromMicrometers(2), 1.5).Mean;
        Assert.Equal(2.1713, mean.Micrometers, 0.002);
    }

    [Fact]
    public void No_spread_is_one_diameter() =>
        Assert.Equal(DiameterDistribution.OfOneDiameter(Length.FromMicrometers(3)), DiameterDistribution.LogNormal(Length.FromMicrometers(3), 1));

    [Fact]
    public void Fractions_sum_to_one() =>
        Gen.Select(Gen.Double[0.1, 20], Gen.Double[1, 3], Gen.Int[2, 60]).Sample((median, gsd, count) =>
            Assert.Equal(1, DiameterDistribution.LogNormal(Length.FromMicrometers(median), gsd, count).Classes.Sum(c => c.LengthFraction), 1e-12));

    [Fact]
    public void Readings_keep_their_fibre_volume() =>
        Gen.Select(Gen.Double[0.2, 30], Gen.Double[0.5, 5]).Array[1, 300].Sample(pairs =>
        {
            var readings = pairs.Select(p => new DiameterReading(Length.FromMicrometers(p.Item1), Length.Zero, Length.FromMicrometers(p.Item2), 0, 0));
            var square = pairs.Sum(p => p.Item2 * p.Item1 * p.Item1) / pairs.Sum(p => p.Item2);
            var found = DiameterDistribution.FromReadings(readings);
            Assert.Equal(Math.Sqrt(square), found.RootMeanSquare.Micrometers, 1e-9 * Math.Sqrt(square));
            Assert.True(found.Classes.Length <= DiameterDistribution.DefaultClassCount + 1);
        });

    [Fact]
    public void No_classes_are_refused() => Assert.Throws<ArgumentException>(() => new DiameterDistribution([]));
}
