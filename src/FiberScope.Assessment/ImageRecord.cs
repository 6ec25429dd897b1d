using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>The identity and scale of one measured image.</summary>
/// <param name="Name">The file as the user named it, with its page.</param>
/// <param name="Sha256">SHA-256 of the file's bytes; 64 lower-case hexadecimal digits.</param>
/// <param name="PixelSize">The side of a pixel on the specimen.</param>
/// <param name="PixelSizeOrigin">Where the scale came from, for people.</param>
/// <param name="Algorithm">Name and version of the algorithms that measured it.</param>
public sealed record ImageRecord(string Name, string Sha256, Length PixelSize, string PixelSizeOrigin, string Algorithm);
