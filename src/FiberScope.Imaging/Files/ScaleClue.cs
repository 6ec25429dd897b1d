namespace FiberScope.Imaging.Files;

/// <summary>A pixel size that one source gives.</summary>
/// <param name="Origin">The source, for people.</param>
/// <param name="MetresX">Width of a pixel on the specimen; metres, above zero.</param>
/// <param name="MetresY">Height of a pixel on the specimen; metres, above zero.</param>
internal readonly record struct ScaleClue(string Origin, double MetresX, double MetresY)
{
    /// <summary>A clue that knows one size only: the pixel is taken as square.</summary>
    public ScaleClue(string origin, double metres)
        : this(origin, metres, metres)
    {
    }
}
