using FiberScope.Imaging.Edges;

namespace FiberScope.Imaging.Tests.Edges;

/// <summary>The edge model against cylinders rendered without it; what it reaches is told in docs/physics/edge-of-a-fibre.md.</summary>
public sealed class EdgeModelTests
{
    private static readonly double[] Widths = [3, 4, 6, 9, 14, 25, 50, 110];

    private static readonly Dictionary<string, Func<double, double>> Laws = new(StringComparer.Ordinal)
    {
        ["secant"] = CylinderLook.Secant,
        ["steep secant"] = CylinderLook.SteepSecant,
        ["low cap"] = CylinderLook.LowCap,
        ["fading"] = CylinderLook.Fading,
        ["soft"] = CylinderLook.Soft,
        ["flat"] = CylinderLook.Flat,
    };

    [Theory]
    [InlineData("secant", 0.8, 0.4, 0.1)]
    [InlineData("secant", 1.6, 0.8, 0.1)]
    [InlineData("steep secant", 1, 0.3, 0.15)]
    [InlineData("low cap", 1, 0.5, 0.15)]
    [InlineData("fading", 1, 0.3, 0.15)]
    [InlineData("soft", 1, 0.3, 0.15)]
    [InlineData("flat", 1, 0, 0.1)]
    public void Widths_are_geometric_under_several_yield_laws(string law, double blur, double rim, double bound)
    {
        var group = FibreGroup.Of(Looks(Laws[law], blur, rim, 25, 8), 3);
        var report = string.Join("; ", Widths.Select(w => FormattableString.Invariant($"{w} px: steepest {group.Fibres.Where(f => f.Look.Width == w).Average(f => f.Steepest - w):+0.00;-0.00}, fitted {group.Bias(w):+0.00;-0.00}")));
        TestContext.Current.SendDiagnosticMessage(report);
        Assert.All(Widths.Where(w => w > 2.5 * blur), w => Assert.True(Math.Abs(group.Bias(w)) <= Math.Max(bound * Math.Max(1, blur), 0.01 * w) + group.BiasError(w), FormattableString.Invariant($"{law} {report} {group.Optics}")));
    }

    [Fact]
    public void The_stated_uncertainty_covers_the_true_width()
    {
        var group = FibreGroup.Of(Looks(CylinderLook.Secant, 1, 0.4, 12, 12), 5);
        Assert.InRange(group.Coverage(2), 0.88, 1);
        Assert.InRange(group.Coverage(0.67), 0.35, 0.85);
    }

    [Fact]
    public void The_same_fibre_enlarged_twice_reads_twice_as_wide()
    {
        double[] widths = [4, 6, 9, 14, 25];
        var small = FibreGroup.Of(widths.SelectMany(w => Enumerable.Range(0, 8).Select(_ => Look(w, 0.9, CylinderLook.SteepSecant, 0.4, 25))), 7);
        var large = FibreGroup.Of(widths.SelectMany(w => Enumerable.Range(0, 8).Select(_ => Look(2 * w, 1.8, CylinderLook.SteepSecant, 0.4, 100))), 8);
        Assert.All(widths, w => Assert.InRange((w + small.Bias(w)) / (w + (0.5 * large.Bias(2 * w))), 0.97, 1.03));
    }

    [Fact]
    public void A_blurred_copy_reads_the_same()
    {
        double[] widths = [6, 9, 14, 25, 50];
        double MeanAt(double blur) => FibreGroup.Of(widths.SelectMany(w => Enumerable.Range(0, 8).Select(_ => Look(w, blur, CylinderLook.LowCap, 0.5, 50))), 9).Fibres.Where(f => f.Fit.IsAccepted).Average(f => f.Fit.Width / f.Look.Width);
        Assert.InRange(MeanAt(2) / MeanAt(0.8), 0.985, 1.015);
    }

    [Fact]
    public void Blur_is_found_from_the_fibres_themselves()
    {
        // Pixel and interpolation add 1/12 and about 1/6 to the variance.
        var group = FibreGroup.Of(Looks(CylinderLook.Secant, 1.5, 0.5, 25, 6), 11);
        Assert.InRange(group.Optics.Blur / Math.Sqrt((1.5 * 1.5) + (1 / 12.0) + (1 / 6.0)), 0.93, 1.07);
    }

    [Fact]
    public void A_fibre_out_of_focus_is_told_by_its_blur()
    {
        var looks = Looks(CylinderLook.Secant, 1, 0.4, 25, 5).Append(Look(40, 3, CylinderLook.Secant, 0.4, 60));
        var group = FibreGroup.Of(looks, 13);
        Assert.InRange(group.Fibres[^1].Fit.Blur, 2.4, 3.6);
    }

    [Fact]
    public void A_profile_without_a_fibre_is_not_accepted()
    {
        double[] offsets = [.. Enumerable.Range(0, 60).Select(i => (0.5 * i) - 15)];
        double[] grey = [.. offsets.Select(o => 0.3 + (0.01 * o))];
        var fit = EdgeModel.Fit(new EdgeProfile { Offsets = offsets, Grey = grey, PixelNoise = 0.05, Length = 40, Left = -5, Right = 5 }, PictureOptics.Vague(1));
        Assert.False(fit.IsAccepted && fit.WidthUncertainty < 0.5);
    }

    private static IEnumerable<CylinderLook> Looks(Func<double, double> law, double blur, double rim, double electrons, int each) =>
        Widths.SelectMany(w => Enumerable.Range(0, each).Select(i => Look(w, blur * (1 + (0.05 * ((i % 3) - 1))), law, rim * (1 + (0.2 * ((i % 4) - 1.5))), electrons) with
        {
            GroundLeft = 0.06 + (0.04 * (i % 4)),
            GroundRight = 0.06 + (0.05 * (i % 3)),
            Tilt = 0.1 * ((i % 3) - 1),
        }));

    private static CylinderLook Look(double width, double blur, Func<double, double> law, double rim, double electrons) =>
        new() { Width = width, Blur = blur, Law = law, Rim = rim, Electrons = electrons };
}
