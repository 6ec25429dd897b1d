namespace FiberScope.Imaging.Files;

/// <summary>A solid horizontal stroke in the strip: the rows and columns it covers, both ends included.</summary>
internal readonly record struct Stroke(int Top, int Bottom, int Left, int Right, float Ink)
{
    public int Length => Right - Left + 1;

    public int Thickness => Bottom - Top + 1;
}
