namespace FiberScope.Imaging;

/// <summary>Where a micrograph came from, closely enough to find the very same pixels again.</summary>
/// <param name="Name">The file's name as the user gave it, or a made-up name for a picture from memory.</param>
/// <param name="Sha256">SHA-256 of the file's bytes, 64 lower-case hexadecimal digits; empty for a picture from memory.</param>
/// <param name="Page">The page of a multi-page file, from 0.</param>
/// <param name="BitDepth">Bits per channel in the file, 1 to 16.</param>
/// <param name="PixelSizeOrigin">Where the scale came from, for people: <c>swatch file</c>, <c>OME-XML</c>, <c>scale bar</c>…</param>
public sealed record MicrographSource(string Name, string Sha256, int Page, int BitDepth, string PixelSizeOrigin);
