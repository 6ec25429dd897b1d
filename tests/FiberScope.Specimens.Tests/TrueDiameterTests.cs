using UnitsNet;

namespace FiberScope.Specimens.Tests;

/// <summary>The picture of a fibre must have the fibre's width: its light, added up across a flat-topped fibre, is brightness × diameter.</summary>
public sealed class TrueDiameterTests
{
    [Theory]
    [InlineData(4.0)]
    [InlineData(9.3)]
    [InlineData(31.7)]
    public void Light_across_a_flat_fibre_adds_up_to_its_diameter_within_a_hundredth_of_a_pixel(double diameter)
    {
        var specimen = VirtualSpecimen.Make(FlatFibres(diameter), 3, TestContext.Current.CancellationToken);
        var errors = specimen.Truth.Stations.Where(s => IsFree(specimen, s)).Select(s => LightAcross(specimen, s) - s.Diameter).ToArray();
        Assert.True(errors.Length > 500, $"Only {errors.Length} free places.");
        Assert.InRange(errors.Average(), -0.01, 0.01);
    }

    private static IEnumerable<(double X, double Y)> Across(TrueStation s)
    {
        var reach = (s.Diameter / 2.0) + 3;
        for (double t = -reach; t <= reach; t += 0.25)
        {
            yield return (s.X - (t * Math.Sin(s.Direction)), s.Y + (t * Math.Cos(s.Direction)));
        }
    }

    private static bool IsFree(Specimen specimen, TrueStation s) => Across(s).All(p =>
        p.X >= 2 && p.Y >= 2 && p.X < specimen.Width - 2 && p.Y < specimen.Height - 2
        && specimen.TopFibre[((int)p.Y * specimen.Width) + (int)p.X] is var top && (top == s.Fibre || top == -1));

    private static double LightAcross(Specimen specimen, TrueStation s) => 0.25 * Across(s).Sum(p => Grey(specimen, p.X - 0.5, p.Y - 0.5));

    private static double Grey(Specimen specimen, double x, double y)
    {
        var (ix, iy) = ((int)x, (int)y);
        var (fx, fy) = (x - ix, y - iy);
        double At(int dx, int dy) => specimen.NoiseFree[((iy + dy) * specimen.Width) + ix + dx];
        return ((1 - fy) * (((1 - fx) * At(0, 0)) + (fx * At(1, 0)))) + (fy * (((1 - fx) * At(0, 1)) + (fx * At(1, 1))));
    }

    private static SpecimenRecipe FlatFibres(double diameterPixels) => new()
    {
        Name = "flat",
        WidthPixels = 900,
        HeightPixels = 700,
        PixelSize = Length.FromMicrometers(1),
        Mat = new MatRecipe
        {
            Fibres = [new FibrePopulation { MedianDiameter = Length.FromMicrometers(diameterPixels), GeometricStandardDeviation = 1 }],
            Solidity = 0.01,
            Thickness = Length.FromMicrometers(25 * diameterPixels * diameterPixels / 31),
            DiameterUnevenness = 0,
            PairedShare = 0,
            Wander = Angle.FromRadians(0.02),
            DeepestCover = 0.3,
        },
        Electrons = new ElectronLook
        {
            RimHeight = 0,
            Dome = 0,
            Asymmetry = 0,
            BrightnessSpread = 0,
            ShadingDepth = 100,
            DeepBrightness = 1,
            CreviceShadow = 0,
            Translucency = 0,
            Ground = 0,
            Mottle = 0,
            Glow = 0,
            ChargedShare = 0,
        },
        Camera = new CameraRecipe { BlurPixels = 0, DefocusPixels = 0, BlackLevel = 0, ClippedShare = 0, ElectronsPerPixel = 0, ReadNoise = 0, JitterPixels = 0 },
    };
}
