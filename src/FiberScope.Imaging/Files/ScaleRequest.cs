using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Imaging.Files;

/// <summary>What the user says about the scale of a picture; both may be absent, then the file itself must tell.</summary>
public sealed record ScaleRequest
{
    /// <summary>The user says nothing: only the file's own metadata count.</summary>
    public static ScaleRequest FromFile { get; } = new();

    /// <summary>The side of a pixel on the specimen, as the user gives it; above zero.</summary>
    public Length? PixelSize { get; init => field = Checked(value, nameof(PixelSize)); }

    /// <summary>What the scale bar in the information strip stands for; above zero.</summary>
    public Length? ScaleBarLength { get; init => field = Checked(value, nameof(ScaleBarLength)); }

    /// <summary>The user's word for where <see cref="PixelSize"/> stands, used in messages. Default <c>given pixel size</c>.</summary>
    public string GivenBy { get; init; } = "given pixel size";

    private static Length? Checked(Length? value, string name)
    {
        if (value is { } length)
        {
            Require.Positive(length.Meters, name);
        }

        return value;
    }
}
