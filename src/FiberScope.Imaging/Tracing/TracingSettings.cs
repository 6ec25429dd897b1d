using FiberScope.Statistics;

namespace FiberScope.Imaging.Tracing;

/// <summary>Every threshold of the tracing, with what it does.</summary>
public sealed record TracingSettings
{
    /// <summary>The narrowest fibre looked for; pixels, 1.5 to 10. Default 2.5.</summary>
    public double Narrowest { get; init => field = Require.Within(value, 1.5, 10); } = 2.5;

    /// <summary>The widest fibre looked for, as a share of the shorter side of the picture; 0.01 to 0.5. Default 0.25.</summary>
    public double WidestShare { get; init => field = Require.Within(value, 0.01, 0.5); } = 0.25;

    /// <summary>How far along an edge its gradient is smoothed; level pixels, 1 to 6. Default 4.</summary>
    /// <remarks>Longer finds fainter fibres and loses curved ones.</remarks>
    public double SmoothingAlong { get; init => field = Require.Within(value, 1, 6); } = 4;

    /// <summary>How strongly an edge inside a pair of edges speaks against it; 0 to 2. Default 0.7.</summary>
    public double InsideWeight { get; init => field = Require.Within(value, 0, 2); } = 0.7;

    /// <summary>The least strength of an edge point, in standard deviations of the noise; 1 to 20. Default 3.</summary>
    public double EdgeSignificance { get; init => field = Require.Within(value, 1, 20); } = 3;

    /// <summary>The least score of a seed, in standard deviations of the noise; 1 to 20. Default 3.8.</summary>
    public double SeedSignificance { get; init => field = Require.Within(value, 1, 20); } = 3.8;

    /// <summary>The weaker flank must have this share of the stronger one's contrast; 0 to 1. Default 0.25.</summary>
    public double LeastFlankRatio { get; init => field = Require.Within(value, 0, 1); } = 0.25;

    /// <summary>The least contrast of a flank, in standard deviations of the smoothed noise; 1 to 20. Default 4.</summary>
    public double FlankSignificance { get; init => field = Require.Within(value, 1, 20); } = 4;

    /// <summary>The darkest inside must stay this share of the contrast above the outside; 0 to 1. Default 0.2.</summary>
    public double LeastSolid { get; init => field = Require.Within(value, 0, 1); } = 0.2;

    /// <summary>The largest swing of the lateral gradient inside, as a share of the outer edges; 0 to 2. Default 0.32.</summary>
    /// <remarks>Near zero for a flat top, a dome or bright rims; large for two fibres side by side.</remarks>
    public double LargestSwing { get; init => field = Require.Within(value, 0, 2); } = 0.32;

    /// <summary>The largest share of the inside of a wide fibre that may be crossed by strong edges; 0 to 1. Default 0.12.</summary>
    /// <remarks>A mat of thin fibres seen from afar can look like a wide one; close to, its inside is full of edges.</remarks>
    public double LargestTexture { get; init => field = Require.Within(value, 0, 1); } = 0.12;

    /// <summary>How far a reading may stand from the running median of its trace, as a share of it; 0.01 to 1. Default 0.1.</summary>
    public double LargestStep { get; init => field = Require.Within(value, 0.01, 1); } = 0.1;

    /// <summary>The least contrast of a whole ribbon, in standard deviations of the smoothed noise of one row; 1 to 30. Default 6.</summary>
    /// <remarks>A picture has millions of places where noise could look like a thin fibre: one row in doubt is bearable, a ribbon is not.</remarks>
    public double RibbonSignificance { get; init => field = Require.Within(value, 1, 30); } = 6;

    /// <summary>How fast the width may change along a fibre, per length; 0.01 to 1. Default 0.09.</summary>
    /// <remarks>Two fibres that meet at a small angle look like one that tapers: 0.09 is an angle of five degrees.</remarks>
    public double LargestTaper { get; init => field = Require.Within(value, 0.01, 1); } = 0.09;

    /// <summary>The least share of a trace's length that must be accepted; 0 to 1. Default 0.4.</summary>
    public double LeastAccepted { get; init => field = Require.Within(value, 0, 1); } = 0.4;

    /// <summary>A wider ribbon sharing an edge with this share of the score makes a ribbon a rim or strip of it; 0 to 2. Default 0.7.</summary>
    public double RivalShare { get; init => field = Require.Within(value, 0, 2); } = 0.7;
}
