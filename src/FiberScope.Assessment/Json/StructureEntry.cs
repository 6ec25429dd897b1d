using System.Text.Json.Serialization;
using FiberScope.Fibres;

namespace FiberScope.Assessment.Json;

/// <summary>What the fields that count show besides diameters, pooled.</summary>
internal sealed record StructureEntry(PooledOrientationEntry? Orientation, OpeningsEntry? Openings, UniformityEntry? Uniformity, DefectKindEntry[] Defects, double DefectAreaShare)
{
    public static StructureEntry Of(MatStructure structure) => new(
        structure.Orientation is { } orientation ? PooledOrientationEntry.Of(orientation) : null,
        structure.Openings is { } openings ? OpeningsEntry.Of(openings) : null,
        structure.Uniformity is { } uniformity ? UniformityEntry.Of(uniformity) : null,
        [.. structure.Defects.Kinds.Select(k => new DefectKindEntry(k.Kind, k.Count, k.PerSquareMillimetre, k.AreaShare))],
        structure.Defects.AreaShare);
}

/// <summary>The pooled orientation; shares are of classes of equal width from 0 to 180 degrees.</summary>
internal sealed record PooledOrientationEntry(double PrincipalDirectionDeg, double OrderParameter, double MdOverCd, double[] Shares)
{
    public static PooledOrientationEntry Of(OrientationSummary o) => new(o.PrincipalDirection.Degrees, o.Order, o.MachineToCross, [.. o.Shares]);
}

/// <summary>Openings between the foremost fibres, by the largest circles that fit.</summary>
internal sealed record OpeningsEntry(int Count, double OpenShare, double MedianUm, double Gsd, double AreaMedianUm, double LargestUm, double LargestUUm, int Pinholes)
{
    public static OpeningsEntry Of(OpeningSummary o) => new(
        o.Count, o.OpenShare, o.Median.Micrometers, o.GeometricStandardDeviation, o.AreaMedian.Micrometers, o.Largest.Micrometers, o.LargestUncertainty.Micrometers, o.Pinholes);
}

/// <summary>Evenness of cover against the window, beside a random mat.</summary>
internal sealed record UniformityEntry(double OverRandom, WindowEntry[] Windows)
{
    public static UniformityEntry Of(UniformitySummary u) => new(u.Unevenness, [.. u.Windows.Select(w => new WindowEntry(w.Side.Micrometers, w.StandardDeviation, w.RandomStandardDeviation))]);
}

/// <summary>One size of window.</summary>
internal sealed record WindowEntry(double SideUm, double Sd, double RandomSd);

/// <summary>One kind of defect.</summary>
internal sealed record DefectKindEntry(string Kind, int Count, [property: JsonPropertyName("per_mm2")] double PerArea, double AreaShare);
