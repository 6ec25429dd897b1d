using SixLabors.ImageSharp;
using SixLabors.ImageSharp.PixelFormats;

namespace FiberScope.Validation.Imaging;

/// <summary>Draws readings on a field: a line as long as the diameter read; green where right, yellow off by 10–25 %, red beyond, magenta on no fibre.</summary>
internal static class ErrorPicture
{
    public static void Save(FieldCheck field, string path)
    {
        var (width, height) = (field.Specimen.Width, field.Specimen.Height);
        using var image = new Image<Rgb24>(width, height);
        for (var i = 0; i < width * height; i++)
        {
            var grey = field.Specimen.Pixels[i];
            image[i % width, i / width] = new Rgb24(grey, grey, grey);
        }

        foreach (var reading in field.Readings)
        {
            var error = Math.Abs((reading.Read / reading.True) - 1);
            var colour = reading.Fibre < 0 ? new Rgb24(255, 0, 255) : error > 0.25 ? new Rgb24(255, 40, 30) : error > 0.1 ? new Rgb24(255, 220, 0) : new Rgb24(60, 230, 60);
            var direction = double.IsNaN(reading.Direction) ? 0 : reading.Direction;
            for (var t = -reading.Read / 2; t <= reading.Read / 2; t += 0.5)
            {
                var (x, y) = ((int)(reading.X - (t * Math.Sin(direction))), (int)(reading.Y + (t * Math.Cos(direction))));
                if (x >= 0 && y >= 0 && x < width && y < height)
                {
                    image[x, y] = colour;
                }
            }
        }

        image.SaveAsPng(path);
    }
}
