using OpenCvSharp;

namespace FiberScope.Imaging.Fitness;

/// <summary>How sharp the sharpest edges of a picture are, and how far they stand out of its noise.</summary>
/// <param name="BlurPixels">Sigma of the Gaussian that explains how the edges' response falls towards fine scales; pixels.</param>
/// <param name="ContrastToNoise">Contrast of the strongest edges over the standard deviation of a pixel's noise.</param>
/// <remarks>
/// <para>Edges are met with Gaussian derivatives of several widths s, averaged along the edge and scaled so that a sharp step of height A
/// answers A at every s. A step blurred by b answers A s / √(s² + b²) (the convolution of two Gaussians), so the fall of the
/// answer towards small s gives b, whatever the edges' heights. Thin fibres answer less at large s, which reads as sharp: they are.</para>
/// <para>The noise's own answer is taken off in quadrature. Noise: J. Immerkær, Fast noise variance estimation, Computer Vision and Image
/// Understanding 64 (1996) 300-302, with the median of the mask's answers in place of their mean, so that fibres do not count as noise.</para>
/// </remarks>
internal sealed record Sharpness(double BlurPixels, double ContrastToNoise)
{
    private const int Directions = 8;

    /// <summary>Sigma along the edge; pixels.</summary>
    private const double Along = 4;

    /// <summary>The share of pixels below the answer that counts as the strongest edges'.</summary>
    private const double Quantile = 0.993;

    /// <summary>Pictures are looked at in their middle, this many pixels square at most.</summary>
    private const int LargestSide = 1024;

    /// <summary>The widths s of the derivatives; pixels.</summary>
    private static readonly double[] Widths = [1.2, 2.5, 5, 9];

    /// <summary>Looks at the middle of a picture.</summary>
    public static Sharpness Of(Micrograph micrograph)
    {
        using var whole = Mat.FromPixelData(micrograph.Height, micrograph.Width, MatType.CV_32FC1, micrograph.Grey.ToArray());
        var (width, height) = (Math.Min(LargestSide, micrograph.Width), Math.Min(LargestSide, micrograph.UsableHeight));
        using var middle = new Mat(whole, new Rect((micrograph.Width - width) / 2, (micrograph.UsableHeight - height) / 2, width, height));
        var noise = Math.Max(Noise(middle), 1e-5);
        using var half = new Mat();
        Cv2.Resize(middle, half, new Size(Math.Max(1, width / 2), Math.Max(1, height / 2)), interpolation: InterpolationFlags.Area);

        // Wide derivatives see nothing that half the pixels do not show; the mean of four pixels halves their noise.
        var answers = Widths.Select(s => s > 2 ? Answer(half, s / 2, Along / 2, noise / 2) : Answer(middle, s, Along, noise)).ToArray();
        var contrast = answers.Max();
        return new Sharpness(contrast < noise / 4 ? Widths[^1] : Blur(answers), contrast / noise);
    }

    /// <summary>The standard deviation of a pixel's noise.</summary>
    internal static double Noise(Mat picture)
    {
        using var kernel = Mat.FromPixelData(3, 3, MatType.CV_32FC1, new float[] { 1, -2, 1, -2, 4, -2, 1, -2, 1 });
        using var answer = new Mat();
        Cv2.Filter2D(picture, answer, MatType.CV_32FC1, kernel);
        answer.GetArray(out float[] values);
        for (var i = 0; i < values.Length; i++)
        {
            values[i] = Math.Abs(values[i]);
        }

        // The mask's own gain is 6; 0.6745 is the median of a standard normal's absolute value.
        return OrderStatistic(values, 0.5) / 6 / 0.6745;
    }

    /// <summary>From the two finest widths, whose answers fall most: the geometric mean of what each alone would say.</summary>
    private static double Blur(double[] answers)
    {
        var height = answers.Max();
        return Math.Sqrt(Alone(0) * Alone(1));

        double Alone(int i) => Widths[i] * Math.Sqrt(Math.Pow(height / Math.Max(answers[i], 1e-3 * height), 2) - 1);
    }

    /// <summary>The answer that only the strongest edges exceed, the noise's share taken off.</summary>
    private static double Answer(Mat picture, double s, double length, double noise)
    {
        using var strongest = new Mat();
        var noiseGain = 0.0;
        for (var i = 0; i < Directions; i++)
        {
            var weights = Kernel(s, length, Math.PI * i / Directions, out var side, out noiseGain);
            using var kernel = Mat.FromPixelData(side, side, MatType.CV_32FC1, weights);
            using var answer = new Mat();
            Cv2.Filter2D(picture, answer, MatType.CV_32FC1, kernel, borderType: BorderTypes.Reflect101);
            using Mat size = Cv2.Abs(answer);
            if (i == 0)
            {
                size.CopyTo(strongest);
            }
            else
            {
                Cv2.Max(strongest, size, strongest);
            }
        }

        strongest.GetArray(out float[] values);
        var value = OrderStatistic(values, Quantile);

        // The largest of several directions' noise stands about twice its standard deviation high at that quantile above its mean.
        var floor = 2 * noiseGain * noise;
        return Math.Sqrt(Math.Max(0, (value * value) - (floor * floor)));
    }

    private static float[] Kernel(double s, double length, double direction, out int side, out double noiseGain)
    {
        var reach = (int)Math.Ceiling(2.5 * Math.Max(s, length));
        side = (2 * reach) + 1;
        var weights = new float[side * side];
        var (cos, sin) = (Math.Cos(direction), Math.Sin(direction));
        double sum = 0, squares = 0;
        for (var y = -reach; y <= reach; y++)
        {
            for (var x = -reach; x <= reach; x++)
            {
                var across = (x * cos) + (y * sin);
                var along = (y * cos) - (x * sin);
                var weight = across * Math.Exp(-(across * across / (2 * s * s)) - (along * along / (2 * length * length)));
                weights[((y + reach) * side) + x + reach] = (float)weight;
                sum += Math.Abs(weight);
                squares += weight * weight;
            }
        }

        // A unit step answers with half the sum of the weights' sizes.
        for (var i = 0; i < weights.Length; i++)
        {
            weights[i] *= (float)(2 / sum);
        }

        noiseGain = 2 * Math.Sqrt(squares) / sum;
        return weights;
    }

    /// <summary>The value below which a share lies, by every third value: sorting them all would cost more than it tells.</summary>
    private static double OrderStatistic(float[] values, double share)
    {
        var some = new float[(values.Length + 2) / 3];
        for (var i = 0; i < some.Length; i++)
        {
            some[i] = values[3 * i];
        }

        Array.Sort(some);
        return some[(int)(share * (some.Length - 1))];
    }
}
