using FiberScope.Statistics;

namespace FiberScope.Specimens;

/// <summary>How a polished section looks. All numbers are dimensionless.</summary>
public sealed record SectionLook
{
    /// <summary>Brightness of cut fibres.</summary>
    public double Fibre { get; init => field = Require.Within(value, 0, 1, nameof(Fibre)); } = 0.68;

    /// <summary>Brightness of the embedding resin.</summary>
    public double Resin { get; init => field = Require.Within(value, 0, 1, nameof(Resin)); } = 0.22;

    /// <summary>Fibre-to-fibre standard deviation of brightness.</summary>
    public double BrightnessSpread { get; init => field = Require.Within(value, 0, 0.3, nameof(BrightnessSpread)); } = 0.05;

    /// <summary>Standard deviation of the mottle of fibres and resin.</summary>
    public double Mottle { get; init => field = Require.Within(value, 0, 0.3, nameof(Mottle)); } = 0.05;

    /// <summary>Height of the bright seam at a fibre's edge.</summary>
    public double Seam { get; init => field = Require.Within(value, 0, 1, nameof(Seam)); } = 0.1;

    /// <summary>Number of polishing scratches.</summary>
    public int Scratches { get; init => field = (int)Require.Within(value, 0, 500, nameof(Scratches)); } = 12;

    /// <summary>Share of the fibres that touch a neighbour; from 0 to 0.9.</summary>
    public double TouchingShare { get; init => field = Require.Within(value, 0, 0.9, nameof(TouchingShare)); } = 0.2;
}
