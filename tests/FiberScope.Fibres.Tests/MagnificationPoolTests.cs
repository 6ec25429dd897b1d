using UnitsNet;

namespace FiberScope.Fibres.Tests;

public sealed class MagnificationPoolTests
{
    [Fact]
    public void One_magnification_is_left_as_it_is()
    {
        var group = Group(100, (0.5, 50), [(1, 3), (2, 4)]);
        Assert.Equal(group.Readings, MagnificationPool.Of([group]).Readings);
    }

    [Fact]
    public void A_mat_seen_at_two_magnifications_keeps_its_lengths_per_area()
    {
        // A mat with 2 um of 1-um fibre and 1 um of 20-um fibre in every square micrometre. The close view (100 um2) cannot show the
        // thick ones, the wide view (10,000 um2) cannot show the thin ones.
        var close = Group(100, (0.2, 5), [(1, 200), (20, 30)]);
        var wide = Group(10_000, (3, 100), [(1, 500), (20, 10_000)]);
        var pooled = MagnificationPool.Of([close, wide]);
        double LengthOf(double diameter) => pooled.Readings.Where(r => r.Diameter.Micrometers == diameter).Sum(r => r.RepresentedLength.Micrometers);
        Assert.Equal(2, LengthOf(1) / LengthOf(20), 1e-9);
        Assert.Equal(2, pooled.LeftOut);
    }

    [Fact]
    public void A_diameter_that_no_magnification_can_show_is_kept_and_counted()
    {
        var pooled = MagnificationPool.Of([Group(100, (1, 5), [(2, 9), (0.5, 1)])]);
        Assert.Equal(0.1, pooled.OutsideEveryRange, 1e-9);
        Assert.Equal(2, pooled.Readings.Length);
    }

    private static MagnificationGroup Group(double squareMicrometres, (double Low, double High) range, (double Diameter, double Length)[] readings) => new(
        [.. readings.Select(r => new DiameterReading(Length.FromMicrometers(r.Diameter), Length.Zero, Length.FromMicrometers(r.Length), 0, 0))],
        Area.FromSquareMicrometers(squareMicrometres),
        new LengthInterval(Length.FromMicrometers(range.Low), Length.FromMicrometers(range.High)));
}
