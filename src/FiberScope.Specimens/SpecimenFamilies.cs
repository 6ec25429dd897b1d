using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Specimens;

/// <summary>Named recipes: the kinds of mat and picture that a measurement must cope with. All are invented.</summary>
public static class SpecimenFamilies
{
    /// <summary>All families.</summary>
    public static ImmutableArray<SpecimenRecipe> All { get; } =
    [
        FineMeltBlown, SpunBonded, FineInCoarse, Electrospun, Oriented, DenseLayers, Noisy, DefocusedCharging, ThinFibres, RopesShotFilms,
        SparseOnGround, TransmittedLight, CrossSections,
    ];

    /// <summary>The family of a name, or null when there is none.</summary>
    public static SpecimenRecipe? Find(string name) => All.FirstOrDefault(r => string.Equals(r.Name, name, StringComparison.OrdinalIgnoreCase));

    private static SpecimenRecipe FineMeltBlown => Family("fine-melt-blown", 0.1) with
    {
        Mat = Mat([Part(1.3, 1.74)], solidity: 0.08, wander: 0.22, wanderMicrometres: 60),
        Electrons = new() { RimHeight = 0.45, Dome = 0.15, BrightnessSpread = 0.12 },
        Camera = new() { BlurPixels = 1, DefocusPixels = 0.35, ElectronsPerPixel = 25 },
    };

    private static SpecimenRecipe SpunBonded => Family("spun-bonded", 0.6) with
    {
        Mat = Mat([Part(17, 1.08)], solidity: 0.12, wander: 0.07, wanderMicrometres: 700) with { PairedShare = 0.08 },
        Electrons = new() { RimHeight = 0.8, RimSpread = 0.25, Dome = 0.05, ShadingDepth = 1.6 },
        Camera = new() { BlurPixels = 0.9, DefocusPixels = 0.3, ElectronsPerPixel = 30, ClippedShare = 0.01 },
    };

    private static SpecimenRecipe FineInCoarse => Family("fine-in-coarse", 0.15) with
    {
        Mat = Mat([Part(1.2, 1.5, 0.94), Part(13, 1.15, 0.06)], solidity: 0.07, wander: 0.18, wanderMicrometres: 80),
        Electrons = new() { RimHeight = 0.55, ShadingDepth = 1.5 },
        Camera = new() { BlurPixels = 0.9, DefocusPixels = 0.4, ElectronsPerPixel = 25 },
    };

    private static SpecimenRecipe Electrospun => Family("electrospun", 0.02) with
    {
        Mat = Mat([Part(0.25, 1.28)], solidity: 0.12, wander: 0.07, wanderMicrometres: 14) with { Thickness = Length.FromMicrometers(30), PairedShare = 0.06 },
        Electrons = new() { RimHeight = 0.2, Dome = 0.2, Translucency = 0.1, BrightnessSpread = 0.14, ChargedShare = 0.02 },
        Camera = new() { BlurPixels = 1.2, DefocusPixels = 0.3, ElectronsPerPixel = 18, JpegQuality = 90 },
    };

    private static SpecimenRecipe Oriented => Family("md-oriented", 0.2) with
    {
        Mat = Mat([Part(3, 1.35)], solidity: 0.09, wander: 0.06, wanderMicrometres: 150) with { OrientationOrder = 0.6, PairedShare = 0.1 },
        Electrons = new() { RimHeight = 0.4, ShadingDepth = 1.5, ChargedShare = 0.02 },
        Camera = new() { BlurPixels = 1, DefocusPixels = 0.3, ElectronsPerPixel = 25, ClippedShare = 0.006 },
    };

    private static SpecimenRecipe DenseLayers => Family("dense-layers", 0.1) with
    {
        Mat = Mat([Part(1, 1.4)], solidity: 0.2, wander: 0.12, wanderMicrometres: 50) with { DeepestCover = 8, PairedShare = 0.1 },
        Electrons = new() { RimHeight = 0.35, ShadingDepth = 2.6, DeepBrightness = 0.3, CreviceShadow = 0.6, Translucency = 0.12, Glow = 0.1 },
        Camera = new() { BlurPixels = 1.1, DefocusPixels = 0.35, ElectronsPerPixel = 20, BlackLevel = 0.06 },
    };

    private static SpecimenRecipe Noisy => Family("noisy", 0.2) with
    {
        Mat = Mat([Part(2.2, 1.5)], solidity: 0.09, wander: 0.15, wanderMicrometres: 120),
        Electrons = new() { RimHeight = 0.4 },
        Camera = new() { BlurPixels = 1, DefocusPixels = 0.3, ElectronsPerPixel = 6, ReadNoise = 0.03, BlackLevel = 0.05 },
    };

    private static SpecimenRecipe DefocusedCharging => Family("defocused-charging", 0.2) with
    {
        Mat = Mat([Part(2.6, 1.4)], solidity: 0.09, wander: 0.15, wanderMicrometres: 120),
        Electrons = new() { RimHeight = 0.45, ChargedShare = 0.05, Glow = 0.1 },
        Camera = new() { BlurPixels = 2, DefocusPixels = 0.9, ElectronsPerPixel = 18, Charging = 0.2, DriftPixels = 5, JitterPixels = 0.25, JpegQuality = 85 },
    };

    private static SpecimenRecipe ThinFibres => Family("thin-fibres", 0.1) with
    {
        Mat = Mat([Part(0.4, 1.15)], solidity: 0.07, wander: 0.12, wanderMicrometres: 30),
        Electrons = new() { RimHeight = 0.4, BrightnessSpread = 0.14 },
        Camera = new() { BlurPixels = 0.8, DefocusPixels = 0.15, ElectronsPerPixel = 25 },
    };

    private static SpecimenRecipe RopesShotFilms => Family("ropes-shot-films", 0.2) with
    {
        Mat = Mat([Part(2.4, 1.4)], solidity: 0.08, wander: 0.14, wanderMicrometres: 120) with { PairedShare = 0.12 },
        Electrons = new() { RimHeight = 0.45 },
        Camera = new() { BlurPixels = 1, DefocusPixels = 0.35, ElectronsPerPixel = 22, JpegQuality = 92 },
        Defects = new() { Shot = 10, ShotSize = 7, Beads = 16, Ropes = 3, Films = 2, FilmSize = 20, Debris = 6, DebrisSize = 6 },
    };

    private static SpecimenRecipe SparseOnGround => Family("sparse-on-ground", 0.1) with
    {
        Mat = Mat([Part(0.9, 1.4)], solidity: 0.03, wander: 0.3, wanderMicrometres: 40) with { Thickness = Length.FromMicrometers(16) },
        Electrons = new() { RimHeight = 0.5, Ground = 0.3, ShadingDepth = 6, DeepBrightness = 0.5, CreviceShadow = 0.4 },
        Camera = new() { BlurPixels = 1, DefocusPixels = 0.2, ElectronsPerPixel = 20 },
    };

    private static SpecimenRecipe TransmittedLight => Family("transmitted-light", 0.5) with
    {
        Kind = SpecimenKind.Transmitted,
        Mat = Mat([Part(8, 1.3)], solidity: 0.03, wander: 0.12, wanderMicrometres: 400) with { Thickness = Length.FromMicrometers(140), DeepestCover = 12 },
        Camera = new() { BlurPixels = 1.1, ElectronsPerPixel = 1500, ReadNoise = 0.008, BlackLevel = 0 },
    };

    private static SpecimenRecipe CrossSections => Family("cross-sections", 0.4) with
    {
        Kind = SpecimenKind.CrossSection,
        Mat = Mat([Part(10, 1.25)], solidity: 0.14, wander: 0.1, wanderMicrometres: 400),
        Camera = new() { BlurPixels = 1, ElectronsPerPixel = 60, ReadNoise = 0.015, BlackLevel = 0 },
    };

    private static SpecimenRecipe Family(string name, double pixelMicrometres) => new()
    {
        Name = name,
        WidthPixels = 1280,
        HeightPixels = 960,
        PixelSize = Length.FromMicrometers(pixelMicrometres),
        Mat = new MatRecipe { Fibres = [] },
    };

    private static FibrePopulation Part(double medianMicrometres, double gsd, double share = 1) =>
        new() { MedianDiameter = Length.FromMicrometers(medianMicrometres), GeometricStandardDeviation = gsd, LengthShare = share };

    private static MatRecipe Mat(ImmutableArray<FibrePopulation> fibres, double solidity, double wander, double wanderMicrometres) => new()
    {
        Fibres = fibres,
        Solidity = solidity,
        Wander = Angle.FromRadians(wander),
        WanderLength = Length.FromMicrometers(wanderMicrometres),
    };
}
