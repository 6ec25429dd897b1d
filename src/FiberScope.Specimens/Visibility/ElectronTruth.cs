using System.Collections.Immutable;
using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Rendering;
using UnitsNet;

namespace FiberScope.Specimens.Visibility;

/// <summary>Finds out which stretches of which fibre a secondary-electron micrograph shows.</summary>
internal static class ElectronTruth
{
    public static (SpecimenTruth Truth, byte[] DefectMask) Of(MatModel mat, Scene scene, float[] grey, ulong seed)
    {
        var sight = new Sight(mat, scene, grey);
        var perFibre = new List<TrueStation>[mat.Fibres.Length];
        var deepest = new double[mat.Fibres.Length];
        Parallel.For(0, mat.Fibres.Length, f => (perFibre[f], deepest[f]) = sight.Stations(f));
        var stations = perFibre.SelectMany(s => s).ToImmutableArray();
        var (mask, defects) = DefectCensus.Take(mat, scene, grey);
        var laid = LaidLength.Of(mat).ToArray();
        return (new SpecimenTruth
        {
            Recipe = mat.Scale.Recipe,
            Seed = seed,
            FibreDiameters = [.. mat.Fibres.Select(f => f.Diameter)],
            Stations = stations,
            Sections = [],
            Visible = Figures(stations),
            BothEdges = Figures(stations.Where(s => s.BothEdges)),
            Mat = TrueDiameters.Of([.. laid.Select(l => l.Diameter)], [.. laid.Select(l => l.Length)]),
            Orientation = TrueOrientation.Of(stations.Select(s => ((double)s.Direction, (double)s.Length))),
            MatOrientation = TrueOrientation.Of(laid.Select(l => (l.Direction, l.Length))),
            Solidity = mat.Scale.Recipe.Mat.Solidity,
            LaidSolidity = LaidLength.Solidity(mat),
            Cover = scene.TopFibre.Count(f => f >= 0) / (double)scene.TopFibre.Length,
            Defects = defects,
            VisibleDepth = Length.FromMeters(deepest.DefaultIfEmpty().Max() * mat.Scale.Recipe.PixelSize.Meters),
        }, mask);
    }

    internal static TrueDiameters Figures(IEnumerable<TrueStation> stations)
    {
        var list = stations.ToArray();
        return TrueDiameters.Of([.. list.Select(s => (double)s.Diameter)], [.. list.Select(s => (double)s.Length)]);
    }
}
