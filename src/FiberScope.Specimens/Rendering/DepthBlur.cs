using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>Blur that grows with the distance from the focal plane: the picture is cut into slices of depth, each with its own blur.</summary>
/// <remarks>
/// A slice covers what lies below it by its own blurred cover, so that a sharp fibre keeps its sharp edge in front of a blurred ground.
/// </remarks>
internal sealed class DepthBlur
{
    // Lower ends of the slices, in mean depths below the top.
    private static readonly float[] Ends = [0.3f, 0.7f, 1.2f, 2f, float.MaxValue];
    private static readonly float[] Middles = [0.12f, 0.5f, 0.95f, 1.55f, 2.7f];

    private readonly float[][] _light, _cover;
    private readonly double[] _sigma;
    private readonly int _width, _height;

    public DepthBlur(CameraRecipe camera, int width, int height)
    {
        (_width, _height) = (width, height);
        var slices = camera.DefocusPixels > 0 ? Ends.Length : 1;
        _sigma = new double[slices];
        _light = new float[slices][];
        _cover = new float[slices][];
        for (var k = 0; k < slices; k++)
        {
            var defocus = slices == 1 ? 0 : camera.DefocusPixels * (Middles[k] - camera.FocusDepth);
            _sigma[k] = Math.Sqrt((camera.BlurPixels * camera.BlurPixels) + (defocus * defocus));
            _light[k] = new float[width * height];
            _cover[k] = new float[width * height];
        }
    }

    /// <summary>Adds a share of a pixel's light.</summary>
    public void Add(int pixel, float depth, float light, float share)
    {
        var k = 0;
        while (k < _light.Length - 1 && depth > Ends[k])
        {
            k++;
        }

        _light[k][pixel] += light * share;
        _cover[k][pixel] += share;
    }

    /// <summary>The blur of a slice at a depth given in mean depths below the top; sigma in pixels.</summary>
    public double SigmaAt(double depth)
    {
        var k = 0;
        while (k < _sigma.Length - 1 && depth > Ends[k])
        {
            k++;
        }

        return _sigma[k];
    }

    /// <summary>The blurred picture, from the deepest slice up.</summary>
    public float[] Compose()
    {
        var result = new float[_width * _height];
        var below = new float[result.Length];
        for (var k = _light.Length - 1; k >= 0; k--)
        {
            var under = (float[])below.Clone();
            for (var i = 0; i < below.Length; i++)
            {
                below[i] += _cover[k][i];
            }

            Smoothing.Gaussian(_light[k], _width, _height, _sigma[k]);
            if (k == _light.Length - 1)
            {
                Smoothing.Gaussian(_cover[k], _width, _height, _sigma[k]);
                Divide(result, _light[k], _cover[k]);
                continue;
            }

            var all = (float[])below.Clone();
            Smoothing.Gaussian(under, _width, _height, _sigma[k]);
            Smoothing.Gaussian(all, _width, _height, _sigma[k]);
            for (var i = 0; i < result.Length; i++)
            {
                result[i] = all[i] > 1e-4f ? (_light[k][i] + (under[i] * result[i])) / all[i] : result[i];
            }
        }

        return result;
    }

    private static void Divide(float[] result, float[] light, float[] cover)
    {
        for (var i = 0; i < result.Length; i++)
        {
            result[i] = cover[i] > 1e-4f ? light[i] / cover[i] : 0;
        }
    }
}
