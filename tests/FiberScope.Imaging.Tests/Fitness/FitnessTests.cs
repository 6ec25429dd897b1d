using FiberScope.Imaging.Files;
using FiberScope.Imaging.Fitness;
using OpenCvSharp;

namespace FiberScope.Imaging.Tests.Fitness;

/// <summary>Pictures whose blur, noise, charging and jitter are put in here, by OpenCV's own filters.</summary>
public sealed class FitnessTests
{
    private const int Width = 480;
    private const int Height = 400;

    [Theory]
    [InlineData(1.0)]
    [InlineData(1.8)]
    [InlineData(2.6)]
    [InlineData(4.0)]
    [InlineData(5.5)]
    public void The_blur_that_was_put_in_is_found(double sigma)
    {
        var focus = Check(Picture(sigma, 0.02), "focus");
        Assert.Equal(sigma, focus.Value, (0.25 * sigma) + 0.1);
        Assert.Equal((sigma < 3, sigma > 5), (focus.Passed && sigma < 3, !focus.Passed && sigma > 5));
    }

    [Fact]
    public void Noise_does_not_pass_for_sharpness()
    {
        var quiet = Check(Picture(5, 0.005), "focus").Value;
        Assert.Equal(quiet, Check(Picture(5, 0.1), "focus").Value, 0.25 * quiet);
    }

    [Theory]
    [InlineData(0.02, true)]
    [InlineData(0.12, true)]
    [InlineData(0.6, false)]
    public void Noise_that_buries_the_edges_is_unfit(double noise, bool fit) => Assert.Equal(fit, Check(Picture(1, noise), "noise").Passed);

    [Fact]
    public void Brightness_and_contrast_do_not_decide_focus_or_noise()
    {
        var plain = Picture(1.5, 0.03);
        var dim = Array.ConvertAll(plain, value => 0.2f + (0.3f * value));
        Assert.Equal(Check(plain, "focus").Value, Check(dim, "focus").Value, 0.02);
        Assert.Equal(Check(plain, "noise").Value, Check(dim, "noise").Value, 0.2);
    }

    [Fact]
    public void White_patches_are_saturation_and_white_specks_are_not()
    {
        var picture = Picture(1, 0.02);
        var random = new Random(3);
        var specks = Array.ConvertAll(picture, value => random.NextDouble() < 0.05 ? 1f : value);
        Assert.True(Check(specks, "saturation").Passed);
        Assert.False(Check(Array.ConvertAll(picture, value => Math.Min(1, value * 3)), "saturation").Passed);
    }

    [Theory]
    [InlineData(0, true)]
    [InlineData(0.01, true)]
    [InlineData(0.1, false)]
    public void Lines_that_jump_in_brightness_are_charging(double steps, bool fit)
    {
        var picture = Picture(1, 0.02);
        var random = new Random(4);
        for (var y = 0; y < Height; y++)
        {
            var lift = (float)(steps * ((2 * random.NextDouble()) - 1) * Math.Sqrt(3));
            for (var x = 0; x < Width; x++)
            {
                picture[(y * Width) + x] += lift;
            }
        }

        Assert.Equal(fit, Check(picture, "charging").Passed);
    }

    [Theory]
    [InlineData(0, true)]
    [InlineData(0.4, true)]
    [InlineData(2, false)]
    public void Lines_that_jump_sideways_are_drift(double jitter, bool fit)
    {
        var picture = Picture(1, 0.01);
        var moved = new float[picture.Length];
        var random = new Random(5);
        for (var y = 0; y < Height; y++)
        {
            var shift = jitter * ((2 * random.NextDouble()) - 1) * Math.Sqrt(3);
            for (var x = 0; x < Width; x++)
            {
                var from = Math.Clamp(x + shift, 0, Width - 1.001);
                var left = (int)from;
                var share = (float)(from - left);
                moved[(y * Width) + x] = ((1 - share) * picture[(y * Width) + left]) + (share * picture[(y * Width) + left + 1]);
            }
        }

        Assert.Equal(fit, Check(moved, "drift").Passed);
    }

    [Fact]
    public void Thin_fibres_and_large_defects_are_told_when_they_are_known()
    {
        var micrograph = Of(Picture(1, 0.02));
        PixelReading[] thin = [new(10, 10, 0, 2.1, 0.2, 5, 0), new(20, 10, 0, 2.4, 0.2, 5, 0)];
        var evidence = new FieldEvidence { Readings = [.. thin], Defects = [new DefectRegion(DefectKind.Film, 0.7 * Width * Height, [])] };
        var fitness = FitnessMeter.Check(micrograph, evidence, new FitnessSettings());
        Assert.Equal(["resolution", "usable-share"], fitness.Checks.Where(check => !check.Passed).Select(check => check.Name));
        Assert.All(fitness.Checks, check => Assert.EndsWith(".", check.Advice, StringComparison.Ordinal));
        Assert.False(fitness.IsFit);
    }

    [Fact]
    public void Of_the_real_fields_the_one_out_of_focus_is_unfit_and_the_others_are_fit()
    {
        var files = RealFields.Files("view-*").Concat(RealFields.Files("mat-clean-1142*")).ToArray();
        Assert.SkipWhen(files.Length == 0, "No folder of real micrographs here.");
        foreach (var file in files)
        {
            var micrograph = MicrographReader.Read(file, new ScaleRequest { PixelSize = UnitsNet.Length.FromMicrometers(1) }, ImagingMode.SecondaryElectron)[0];
            var unfit = string.Join(' ', FitnessMeter.Check(micrograph, FieldEvidence.None, new FitnessSettings()).Checks.Where(check => !check.Passed).Select(check => check.Name));
            Assert.Equal((Path.GetFileName(file), file.Contains("view-04", StringComparison.Ordinal) ? "focus" : string.Empty), (Path.GetFileName(file), unfit));
        }
    }

    private static FitnessCheck Check(float[] picture, string name) =>
        FitnessMeter.Check(Of(picture), FieldEvidence.None, new FitnessSettings()).Checks.Single(check => check.Name == name);

    private static Micrograph Of(float[] picture) =>
        new(picture, Width, Height, UnitsNet.Length.FromMicrometers(1), ImagingMode.SecondaryElectron, new MicrographSource("made", string.Empty, 0, 8, "made"));

    /// <summary>Bright ribbons of 14 to 24 pixels on a dark ground, blurred and noised.</summary>
    private static float[] Picture(double sigma, double noise)
    {
        using var drawn = new Mat(4 * Height, 4 * Width, MatType.CV_32FC1, new Scalar(0.2));
        var random = new Random(7);
        for (var i = 0; i < 16; i++)
        {
            var (x, y, angle) = (random.Next(4 * Width), random.Next(4 * Height), random.NextDouble() * Math.PI);
            var (dx, dy) = ((int)(3000 * Math.Cos(angle)), (int)(3000 * Math.Sin(angle)));
            Cv2.Line(drawn, new Point(x - dx, y - dy), new Point(x + dx, y + dy), new Scalar(0.45 + (0.25 * random.NextDouble())), 56 + random.Next(40));
        }

        using var small = new Mat();
        Cv2.Resize(drawn, small, new Size(Width, Height), interpolation: InterpolationFlags.Area);
        using var blurred = small.GaussianBlur(new Size(0, 0), sigma);
        blurred.GetArray(out float[] picture);
        for (var i = 0; i < picture.Length; i++)
        {
            // A sum of twelve uniform numbers is normal enough.
            var sum = -6.0;
            for (var k = 0; k < 12; k++)
            {
                sum += random.NextDouble();
            }

            picture[i] = Math.Clamp(picture[i] + (float)(noise * sum), 0, 1);
        }

        return picture;
    }
}
