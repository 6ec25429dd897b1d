namespace FiberScope.Specimens.Rendering;

/// <summary>Smooth mottle: random values on a lattice, blended between; mean 0, values from −1 to 1.</summary>
internal readonly struct ValueNoise(ulong seed, float cell)
{
    public float At(float x, float y)
    {
        var (px, py) = (x / cell, y / cell);
        var (ix, iy) = ((int)MathF.Floor(px), (int)MathF.Floor(py));
        var (fx, fy) = (Ease(px - ix), Ease(py - iy));
        var top = Corner(ix, iy) + (fx * (Corner(ix + 1, iy) - Corner(ix, iy)));
        var bottom = Corner(ix, iy + 1) + (fx * (Corner(ix + 1, iy + 1) - Corner(ix, iy + 1)));
        return top + (fy * (bottom - top));
    }

    private static float Ease(float t) => t * t * (3 - (2 * t));

    private float Corner(int x, int y)
    {
        unchecked
        {
            var h = seed ^ ((ulong)(uint)x * 0x9E3779B97F4A7C15UL) ^ ((ulong)(uint)y * 0xC2B2AE3D27D4EB4FUL);
            h = (h ^ (h >> 31)) * 0xBF58476D1CE4E5B9UL;
            h ^= h >> 29;
            return ((h >> 40) * (2f / (1 << 24))) - 1;
        }
    }
}
