using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>The light that a fibre lets through, against the distance from its axis: a bright core, dark rims, a faint bright line outside.</summary>
internal sealed class LensProfile
{
    private const float Step = 0.05f;
    private readonly float[] _table;
    private readonly float _radius;

    private LensProfile(float[] table, float radius, float sigma) => (_table, _radius, Sigma) = (table, radius, sigma);

    /// <summary>The blur of this fibre; pixels.</summary>
    public float Sigma { get; }

    /// <summary>Beyond this distance the fibre does nothing; pixels.</summary>
    public float Reach => (_table.Length - 2) * Step;

    public static LensProfile Of(FibreCurve fibre, MatScale scale)
    {
        var look = scale.Recipe.Light;
        var radius = fibre.Diameter / 2;
        var sigma = SigmaAt(scale, scale.LaidDepth - fibre.Level);
        // A pixel gathers light over its own square: variance 1/12.
        var spread = Math.Sqrt((sigma * sigma) + (1.0 / 12));
        var count = (int)Math.Ceiling((radius + (4 * spread) + 8) / Step);
        var raw = new double[count];
        for (var i = 0; i < count; i++)
        {
            raw[i] = Raw(i * Step, radius, look) - 1;
        }

        var kernel = Smoothing.Kernel(spread / Step);
        var table = new float[count];
        for (var i = 0; i < count; i++)
        {
            var sum = kernel[0] * raw[i];
            for (var k = 1; k < kernel.Length; k++)
            {
                sum += kernel[k] * (raw[Math.Min(count - 1, Math.Abs(i - k))] + raw[Math.Min(count - 1, i + k)]);
            }

            table[i] = (float)(1 + sum);
        }

        return new LensProfile(table, (float)radius, (float)sigma);
    }

    /// <summary>The blur (sigma, pixels) at a depth below the layer's top (pixels).</summary>
    public static double SigmaAt(MatScale scale, double depth)
    {
        var look = scale.Recipe.Light;
        var away = Math.Abs((2 * depth / scale.LaidDepth) - 1);
        var defocus = look.DefocusPixels * Math.Max(0, away - look.SharpShare) / Math.Max(0.05, 1 - look.SharpShare);
        var blur = scale.Recipe.Camera.BlurPixels;
        return Math.Sqrt((blur * blur) + (defocus * defocus));
    }

    public float At(float distance, float radius)
    {
        var place = distance * _radius / radius / Step;
        var index = (int)place;
        return index >= _table.Length - 1 ? 1 : _table[index] + ((place - index) * (_table[index + 1] - _table[index]));
    }

    private static double Raw(double distance, double radius, LightLook look)
    {
        var v = distance / radius;
        if (v >= 1)
        {
            return 1 + (look.Halo * PortableMath.Exp(-(distance - radius) / 1.5));
        }

        if (v <= look.CoreWidth)
        {
            return look.Core;
        }

        var t = (v - look.CoreWidth) / (1 - look.CoreWidth);
        return look.Core + ((look.Rim - look.Core) * t * t * (3 - (2 * t)));
    }
}
