namespace FiberScope.Imaging.Tests.Edges;

/// <summary>
/// A straight cylinder under the electron beam, rendered pixel by pixel: any yield law, blurred numerically, integrated over each pixel,
/// with counted electrons. Written without the edge model's formulas.
/// </summary>
internal sealed class CylinderPicture
{
    private const double Fine = 0.02;
    private const int Size = 90;

    /// <summary>Nothing is read further along the fibre than this, to either side.</summary>
    private const double Needed = 34;

    private readonly double[] _across;
    private readonly double _reach, _sin, _cos, _offset;
    private readonly float[] _pixels;
    private readonly int _wide;

    public CylinderPicture(CylinderLook look, Random random)
    {
        Look = look;
        _reach = (0.5 * look.Width) + 20 + (6 * look.Blur);
        _across = Blurred(look, _reach);
        (_sin, _cos) = Math.SinCos(random.NextDouble() * Math.PI);
        _offset = random.NextDouble() - 0.5;
        _wide = (int)Math.Ceiling(look.Width + Size);
        _pixels = new float[_wide * _wide];
        for (var y = 0; y < _wide; y++)
        {
            for (var x = 0; x < _wide; x++)
            {
                var along = ((y - (0.5 * _wide)) * _cos) - ((x - (0.5 * _wide)) * _sin);
                if (Math.Abs(along) > Needed)
                {
                    continue;
                }

                var expected = Pixel(x - (0.5 * _wide), y - (0.5 * _wide));
                _pixels[(y * _wide) + x] = (float)Math.Pow(Math.Max(0, Counted(expected, random)), look.Gamma);
            }
        }
    }

    public CylinderLook Look { get; }

    /// <summary>The mean along the fibre at places across, sampled between pixels by straight-line interpolation.</summary>
    public double[] Mean(double[] offsets, int rows)
    {
        var mean = new double[offsets.Length];
        for (var r = 0; r < rows; r++)
        {
            for (var i = 0; i < offsets.Length; i++)
            {
                var along = r - (0.5 * rows);
                mean[i] += Sample((offsets[i] * _cos) - (along * _sin), (offsets[i] * _sin) + (along * _cos)) / rows;
            }
        }

        return mean;
    }

    private static double[] Blurred(CylinderLook look, double reach)
    {
        var count = (int)(2 * reach / Fine) + 1;
        var sharp = new double[count];
        for (var i = 0; i < count; i++)
        {
            var v = (i * Fine) - reach;
            var t = 2 * v / look.Width;
            sharp[i] = Math.Abs(t) < 1 ? look.Brightness * (1 + (look.Rim * look.Law(t)) + (look.Tilt * t)) : t < 0 ? look.GroundLeft : look.GroundRight;
        }

        var half = (int)(5 * look.Blur / Fine);
        var kernel = new double[(2 * half) + 1];
        for (var k = -half; k <= half; k++)
        {
            kernel[k + half] = Math.Exp(-0.5 * Math.Pow(k * Fine / look.Blur, 2));
        }

        var sum = kernel.Sum();
        var blurred = new double[count];
        for (var i = 0; i < count; i += 5)
        {
            var value = 0.0;
            for (var k = -half; k <= half; k++)
            {
                value += kernel[k + half] * sharp[Math.Clamp(i + k, 0, count - 1)];
            }

            Array.Fill(blurred, value / sum, i, Math.Min(5, count - i));
        }

        return blurred;
    }

    private double Pixel(double x, double y)
    {
        var sum = 0.0;
        for (var k = 0; k < 16; k++)
        {
            var (sx, sy) = (x + (((k % 4) - 1.5) / 4), y + (((k / 4) - 1.5) / 4));
            var v = (sx * _cos) + (sy * _sin) + _offset;
            sum += _across[Math.Clamp((int)Math.Round((v + _reach) / Fine), 0, _across.Length - 1)];
        }

        return sum / 16;
    }

    private double Counted(double expected, Random random)
    {
        var spread = Math.Sqrt(Math.Max(0, expected) / Look.Electrons);
        return expected + (spread * Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble()));
    }

    private double Sample(double x, double y)
    {
        var (px, py) = (Math.Clamp(x + (0.5 * _wide), 0, _wide - 1.001), Math.Clamp(y + (0.5 * _wide), 0, _wide - 1.001));
        var (i, j) = ((int)px, (int)py);
        var (fx, fy) = (px - i, py - j);
        double At(int a, int b) => _pixels[(b * _wide) + a];
        return ((1 - fy) * (((1 - fx) * At(i, j)) + (fx * At(i + 1, j)))) + (fy * (((1 - fx) * At(i, j + 1)) + (fx * At(i + 1, j + 1))));
    }
}
