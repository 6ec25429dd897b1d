using FiberScope.Statistics;

namespace FiberScope.Imaging.Transmitted;

/// <summary>How fibres are read in transmitted light.</summary>
public sealed record TransmittedSettings
{
    /// <summary>How much of the neighbourhood's shade is added to every place before tracing, so that bright cores do not look like gaps; 0 to 2. Default 1.</summary>
    /// <remarks>It helps to find fibres and changes no diameter: those are read from the light itself.</remarks>
    public double CoreFill { get; init => field = Require.Within(value, 0, 2); } = 1;

    /// <summary>The largest blur of a fibre that is read, over the blur of the picture's sharpest fibres; 1 to 10. Default 1.8.</summary>
    public double LargestBlurRatio { get; init => field = Require.Within(value, 1, 10); } = 1.8;

    /// <summary>The share of the fibres, by length, that the sharpest ones are taken from; 0 to 1. Default 0.2.</summary>
    public double SharpestShare { get; init => field = Require.Inside(value, 0, 1); } = 0.2;

    /// <summary>The least contrast of a fibre's edges over the empty field's light; 0 to 1. Default 0.06.</summary>
    public double LeastContrast { get; init => field = Require.Within(value, 0, 1); } = 0.06;

    /// <summary>A line without a partner whose one flank is less steep than this share of the other's is a rim, no fibre; 0 to 1. Default 0.82.</summary>
    public double LeastEvenFlanks { get; init => field = Require.Within(value, 0, 1); } = 0.82;
}
