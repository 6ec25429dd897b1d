namespace FiberScope.Imaging.Tracing;

/// <summary>A measured candidate: its strip, which rows were accepted, and how good it is.</summary>
internal sealed class Ribbon(RibbonStrip strip, bool[] accepted, double[] widths, double contrast, double evidence)
{
    /// <summary>The contrast of the weaker flank, median over the accepted rows.</summary>
    public double Contrast { get; } = contrast;

    public RibbonStrip Strip { get; } = strip;

    /// <summary>For each row whether it gives a reading.</summary>
    public bool[] Accepted { get; } = accepted;

    /// <summary>For each row the width between the edges, running median where accepted; pixels.</summary>
    public double[] Widths { get; } = widths;

    /// <summary>Difference of the levels outside (right less left) over the contrast, median over the accepted rows; dimensionless.</summary>
    public double Asymmetry { get; init; }

    /// <summary>How well a ribbon several times as wide, lying on the brighter side, shares an edge: its score over this one's own.</summary>
    public double Body { get; init; }

    /// <summary>How much speaks for the ribbon: contrast times the root of its accepted length, less for wide claims and rivals.</summary>
    public double Evidence { get; } = evidence;

    public double Width { get; } = Series.Median([.. widths.Where((_, r) => accepted[r])]);
}
