using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Rendering;
using UnitsNet;

namespace FiberScope.Specimens.Visibility;

/// <summary>The truth about a section: every cut fibre whose centre lies in the picture.</summary>
internal static class SectionTruth
{
    public static SpecimenTruth Of(CutMat cut, ulong seed)
    {
        var (width, height) = (cut.Scale.Width, cut.Scale.Height);
        var inside = cut.Fibres.Where(f => f.X >= 0 && f.Y >= 0 && f.X < width && f.Y < height).ToArray();
        var diameters = TrueDiameters.Of([.. inside.Select(f => f.Minor)], [.. inside.Select(f => f.Major / f.Minor)]);
        var share = SectionPainter.AreaShare(cut, seed);
        return new SpecimenTruth
        {
            Recipe = cut.Scale.Recipe,
            Seed = seed,
            FibreDiameters = [.. inside.Select(f => f.Minor)],
            Stations = [],
            Sections = [.. inside.Select(f => new TrueSection((float)f.X, (float)f.Y, (float)f.Minor, (float)f.Major, (float)Math.Atan2(f.Sin, f.Cos), IsWhole(f)))],
            Visible = diameters,
            BothEdges = diameters,
            Mat = diameters,
            Orientation = new TrueOrientation(Angle.FromDegrees(90), cut.Scale.Recipe.Mat.OrientationOrder),
            MatOrientation = new TrueOrientation(Angle.FromDegrees(90), cut.Scale.Recipe.Mat.OrientationOrder),
            Solidity = share,
            LaidSolidity = share,
            Cover = share,
            Defects = [],
            VisibleDepth = Length.Zero,
        };

        bool IsWhole(CutFibre f) =>
            f.X - (f.Major / 2) >= 0 && f.Y - (f.Minor / 2) >= 0 && f.X + (f.Major / 2) <= width && f.Y + (f.Minor / 2) <= height;
    }
}
