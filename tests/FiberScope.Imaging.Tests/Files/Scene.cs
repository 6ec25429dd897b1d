namespace FiberScope.Imaging.Tests.Files;

/// <summary>A made-up picture: noise over a few broad bands, and, when asked for, a strip at the bottom.</summary>
internal static class Scene
{
    public const int Width = 240;
    public const int Height = 180;

    public static byte[] Grey(int seed = 1, int width = Width, int height = Height)
    {
        var random = new Random(seed);
        var pixels = new byte[width * height];
        for (var y = 0; y < height; y++)
        {
            for (var x = 0; x < width; x++)
            {
                var band = 60 * Math.Sin((x * 0.09) + (y * 0.05)) * Math.Sin((x * 0.013) - (y * 0.07));
                pixels[(y * width) + x] = (byte)Math.Clamp(110 + band + (random.NextDouble() * 40), 0, 255);
            }
        }

        return pixels;
    }

    public static ushort[] Deep(byte[] pixels) => Array.ConvertAll(pixels, value => (ushort)(value * 257));

    public static byte[] Bytes(ushort[] samples)
    {
        var bytes = new byte[samples.Length * 2];
        Buffer.BlockCopy(samples, 0, bytes, 0, bytes.Length);
        return bytes;
    }
}
