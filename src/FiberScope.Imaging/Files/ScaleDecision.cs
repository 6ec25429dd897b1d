using UnitsNet;

namespace FiberScope.Imaging.Files;

/// <summary>Settles on one pixel size from all that is known, or says why that is impossible.</summary>
internal static class ScaleDecision
{
    /// <summary>Two sources that differ by more than this disagree: 2 %.</summary>
    public const double Tolerance = 0.02;

    /// <summary>Pixels whose sides differ by more than this are not square: 1 %.</summary>
    public const double SquareTolerance = 0.01;

    /// <summary>The pixel size, and where it came from.</summary>
    /// <param name="name">The file's name, for messages.</param>
    /// <param name="clues">Every pixel size known, the most trusted first.</param>
    /// <exception cref="ImageRejectedException">No source gives a size, two disagree, or the pixels are not square.</exception>
    public static (Length PixelSize, string Origin) Settle(string name, IReadOnlyList<ScaleClue> clues)
    {
        if (clues.Count == 0)
        {
            throw new ImageRejectedException($"{name}: no pixel size is known. Give it as a pixel size (such as 24.8 nm), give the length of the scale bar in the picture's information strip (such as 10 um), or use a file that carries it (OME-XML, a pixel-size entry or microscope resolution in the TIFF tags; 72 to 300 dpi count as printing defaults).");
        }

        foreach (var clue in clues)
        {
            if (Math.Abs((clue.MetresX / clue.MetresY) - 1) > SquareTolerance)
            {
                throw new ImageRejectedException($"{name}: the pixels are not square ({clue.Origin}: {Shown(clue.MetresX)} across, {Shown(clue.MetresY)} down); save the picture with square pixels.");
            }
        }

        var first = clues[0];
        foreach (var other in clues.Skip(1))
        {
            if (Math.Abs((other.MetresX / first.MetresX) - 1) > Tolerance)
            {
                throw new ImageRejectedException($"{name}: the pixel size is {Shown(first.MetresX)} by the {first.Origin} but {Shown(other.MetresX)} by the {other.Origin}; find out which is right and mend the other, or export the picture without it.");
            }
        }

        return (Length.FromMeters(first.MetresX), first.Origin);
    }

    private static string Shown(double metres) => metres < 0.1e-6
        ? FormattableString.Invariant($"{metres * 1e9:G5} nm")
        : FormattableString.Invariant($"{metres * 1e6:G5} µm");
}
