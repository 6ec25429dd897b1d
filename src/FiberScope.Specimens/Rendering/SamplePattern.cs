using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>Where in each pixel the scene is sampled.</summary>
/// <remarks>
/// Eight points of the R2 sequence (Roberts 2018, quasirandom sequences; from memory), shifted as a whole by a random amount from pixel
/// to pixel (Cranley and Patterson 1976). Every point of the pixel is equally likely to be hit, so that an edge is placed without bias
/// whatever its direction.
/// </remarks>
internal sealed class SamplePattern
{
    private const int Side = 64;

    private SamplePattern(int count, float[] x, float[] y) => (Count, X, Y) = (count, x, y);

    /// <summary>Samples in a pixel.</summary>
    public int Count { get; }

    public float[] X { get; }

    public float[] Y { get; }

    /// <summary>One sample at the centre of each pixel.</summary>
    public static SamplePattern Centre { get; } = new(1, [.. Enumerable.Repeat(0.5f, Side * Side)], [.. Enumerable.Repeat(0.5f, Side * Side)]);

    public static SamplePattern Scattered(ulong seed)
    {
        const int count = 8;
        var random = new SeededRandom(seed, 71);
        var (x, y) = (new float[Side * Side * count], new float[Side * Side * count]);
        for (var pixel = 0; pixel < Side * Side; pixel++)
        {
            var (shiftX, shiftY) = (random.Next(), random.Next());
            for (var k = 0; k < count; k++)
            {
                x[(pixel * count) + k] = (float)((shiftX + (k * 0.7548776662466927)) % 1);
                y[(pixel * count) + k] = (float)((shiftY + (k * 0.5698402909980532)) % 1);
            }
        }

        return new SamplePattern(count, x, y);
    }

    /// <summary>The index of the first sample of a pixel.</summary>
    public int First(int column, int row) => (((row % Side) * Side) + (column % Side)) * Count;
}
