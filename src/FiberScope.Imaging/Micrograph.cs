using UnitsNet;

namespace FiberScope.Imaging;

/// <summary>One field of view: the grey picture, its scale, and where it came from.</summary>
/// <remarks>Immutable; the pixels are copied in and never change.</remarks>
public sealed class Micrograph
{
    private readonly float[] _grey;

    /// <summary>Takes a grey picture.</summary>
    /// <param name="grey">Brightness, row by row from the top left, 0 (black) to 1 (the format's white); array of height × width. Copied.</param>
    /// <param name="width">Columns, at least 1.</param>
    /// <param name="height">Rows, at least 1, the information strip included.</param>
    /// <param name="pixelSize">The side of a (square) pixel on the specimen; above zero.</param>
    /// <param name="mode">How the picture was made.</param>
    /// <param name="source">Where the picture came from.</param>
    /// <param name="excludedBottomRows">Rows at the bottom that show an information strip; 0 when there is none.</param>
    /// <exception cref="ArgumentException">The array does not fit the size.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A size is not positive, or the strip is taller than the picture.</exception>
    public Micrograph(ReadOnlySpan<float> grey, int width, int height, Length pixelSize, ImagingMode mode, MicrographSource source, int excludedBottomRows = 0)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(width);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(height);
        ArgumentOutOfRangeException.ThrowIfNegative(excludedBottomRows);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(excludedBottomRows, height);
        Statistics.Require.Positive(pixelSize.Meters, nameof(pixelSize));
        if (grey.Length != (long)width * height)
        {
            throw new ArgumentException("The array must hold width × height values.", nameof(grey));
        }

        _grey = grey.ToArray();
        Width = width;
        Height = height;
        PixelSize = pixelSize;
        Mode = mode;
        Source = source;
        ExcludedBottomRows = excludedBottomRows;
    }

    /// <summary>Columns of the picture; pixels.</summary>
    public int Width { get; }

    /// <summary>Rows of the picture, the information strip included; pixels.</summary>
    public int Height { get; }

    /// <summary>Rows that show the specimen; they start at the top.</summary>
    public int UsableHeight => Height - ExcludedBottomRows;

    /// <summary>Rows at the bottom that hold the information strip and give no readings.</summary>
    public int ExcludedBottomRows { get; }

    /// <summary>The side of a pixel on the specimen.</summary>
    public Length PixelSize { get; }

    /// <summary>How the picture was made.</summary>
    public ImagingMode Mode { get; }

    /// <summary>Where the picture came from.</summary>
    public MicrographSource Source { get; }

    /// <summary>Brightness, row by row from the top left; 0 (black) to 1 (white); height × width values.</summary>
    public ReadOnlySpan<float> Grey => _grey;

    /// <summary>The same values for code that cannot hold a span.</summary>
    public ReadOnlyMemory<float> GreyMemory => _grey;
}
