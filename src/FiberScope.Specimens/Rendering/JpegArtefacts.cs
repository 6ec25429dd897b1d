using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>What a JPEG compression leaves behind: 8 × 8 cosine transform, quantisation, and back.</summary>
/// <remarks>
/// ITU-T T.81 (1992), Annex A.3.3 (transform) and Annex K, table K.1 (luminance quantisation). Scaling of the table with the quality
/// follows common practice, no source. Written out here so that the result is the same on every machine; files are written by a library.
/// </remarks>
internal static class JpegArtefacts
{
    private static ReadOnlySpan<byte> Table =>
    [
        16, 11, 10, 16, 24, 40, 51, 61, 12, 12, 14, 19, 26, 58, 60, 55, 14, 13, 16, 24, 40, 57, 69, 56, 14, 17, 22, 29, 51, 87, 80, 62,
        18, 22, 37, 56, 68, 109, 103, 77, 24, 35, 55, 64, 81, 104, 113, 92, 49, 64, 78, 87, 103, 121, 120, 101, 72, 92, 95, 98, 112, 100, 103, 99,
    ];

    public static void Apply(byte[] bytes, int width, int height, int quality)
    {
        if (quality is < 1 or > 99)
        {
            return;
        }

        var scale = quality < 50 ? 5000 / quality : 200 - (2 * quality);
        var steps = new double[64];
        for (var i = 0; i < 64; i++)
        {
            steps[i] = Math.Clamp(((Table[i] * scale) + 50) / 100, 1, 255);
        }

        var basis = Basis();
        Parallel.For(0, (height + 7) / 8, blockRow =>
        {
            var (block, work) = (new double[64], new double[64]);
            for (var left = 0; left < width; left += 8)
            {
                Load(bytes, width, height, left, blockRow * 8, block);
                Transform(block, work, basis, forward: true);
                for (var i = 0; i < 64; i++)
                {
                    block[i] = Math.Floor((block[i] / steps[i]) + 0.5) * steps[i];
                }

                Transform(block, work, basis, forward: false);
                Store(bytes, width, height, left, blockRow * 8, block);
            }
        });
    }

    private static double[] Basis()
    {
        var basis = new double[64];
        for (var k = 0; k < 8; k++)
        {
            for (var n = 0; n < 8; n++)
            {
                basis[(k * 8) + n] = (k == 0 ? Math.Sqrt(0.125) : 0.5) * PortableMath.SinCos(Math.PI * k * ((2 * n) + 1) / 16).Cos;
            }
        }

        return basis;
    }

    private static void Transform(double[] block, double[] work, double[] basis, bool forward)
    {
        double Weight(int to, int from) => forward ? basis[(to * 8) + from] : basis[(from * 8) + to];
        for (var pass = 0; pass < 2; pass++)
        {
            var (source, target) = pass == 0 ? (block, work) : (work, block);
            for (var line = 0; line < 8; line++)
            {
                for (var to = 0; to < 8; to++)
                {
                    var sum = 0.0;
                    for (var from = 0; from < 8; from++)
                    {
                        sum += Weight(to, from) * (pass == 0 ? source[(line * 8) + from] : source[(from * 8) + line]);
                    }

                    target[pass == 0 ? (line * 8) + to : (to * 8) + line] = sum;
                }
            }
        }
    }

    private static void Load(byte[] bytes, int width, int height, int left, int top, double[] block)
    {
        for (var i = 0; i < 64; i++)
        {
            var (x, y) = (Math.Min(width - 1, left + (i % 8)), Math.Min(height - 1, top + (i / 8)));
            block[i] = bytes[(y * width) + x] - 128.0;
        }
    }

    private static void Store(byte[] bytes, int width, int height, int left, int top, double[] block)
    {
        for (var i = 0; i < 64; i++)
        {
            var (x, y) = (left + (i % 8), top + (i / 8));
            if (x < width && y < height)
            {
                bytes[(y * width) + x] = (byte)Math.Clamp((int)Math.Floor(block[i] + 128.5), 0, 255);
            }
        }
    }
}
