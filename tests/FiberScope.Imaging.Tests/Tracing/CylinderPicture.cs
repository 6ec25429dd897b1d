using UnitsNet;

namespace FiberScope.Imaging.Tests.Tracing;

/// <summary>A small picture of straight bright-rimmed cylinders of known diameter; a closed form, no code of the measurement in it.</summary>
internal static class CylinderPicture
{
    private const int Size = 320;
    private const double Blur = 1;

    /// <summary>Cylinders through given points at given angles (degrees) and diameters (pixels), the later ones on top.</summary>
    public static Micrograph Of(params (double X, double Y, double Angle, double Diameter)[] cylinders)
    {
        var grey = new float[Size * Size];
        var random = new CsCheck.PCG(7, 77);
        for (var y = 0; y < Size; y++)
        {
            for (var x = 0; x < Size; x++)
            {
                var noise = Enumerable.Range(0, 6).Sum(_ => random.Next(1000) / 999.0) - 3;
                grey[(y * Size) + x] = (float)Math.Clamp(Light(x + 0.5, y + 0.5, cylinders) + (0.03 * noise / 0.707), 0, 1);
            }
        }

        return Picture(grey, Size, Size);
    }

    public static Micrograph Picture(float[] grey, int width, int height) =>
        new(grey, width, height, Length.FromMicrometers(0.1), ImagingMode.SecondaryElectron, new MicrographSource("made", string.Empty, 0, 8, "made"));

    /// <summary>The same picture turned by a quarter or mirrored.</summary>
    public static Micrograph Moved(Micrograph picture, Func<int, int, (int X, int Y)> from)
    {
        var grey = new float[picture.Width * picture.Height];
        for (var y = 0; y < picture.Height; y++)
        {
            for (var x = 0; x < picture.Width; x++)
            {
                var (i, j) = from(x, y);
                grey[(y * picture.Width) + x] = picture.Grey[(j * picture.Width) + i];
            }
        }

        return Picture(grey, picture.Width, picture.Height);
    }

    private static double Light(double x, double y, (double X, double Y, double Angle, double Diameter)[] cylinders)
    {
        var light = 0.1;
        foreach (var (px, py, angle, diameter) in cylinders)
        {
            var (sin, cos) = Math.SinCos(angle * Math.PI / 180);
            var u = Math.Abs(((y - py) * cos) - ((x - px) * sin));
            var inside = 1 / (1 + Math.Exp((u - (diameter / 2)) * 1.702 / Blur));
            light += inside * (0.55 - light);
        }

        return light;
    }
}
