using System.Collections.Immutable;

namespace FiberScope.Imaging.Files;

/// <summary>One decoded page of a file, before its scale is settled.</summary>
/// <param name="Grey">Brightness, row by row from the top left; 0 (black) to 1 (the format's white).</param>
/// <param name="Width">Columns.</param>
/// <param name="Height">Rows.</param>
/// <param name="BitDepth">Bits per channel in the file.</param>
/// <param name="Page">The page of a multi-page file, from 0.</param>
/// <param name="Clues">Every pixel size that the file itself gives for this page.</param>
internal sealed record Picture(float[] Grey, int Width, int Height, int BitDepth, int Page, ImmutableArray<ScaleClue> Clues);
