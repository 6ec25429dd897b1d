using FiberScope.Imaging.Openness;
using OpenCvSharp;
using Length = UnitsNet.Length;

namespace FiberScope.Imaging.Tests;

/// <summary>Openings of known size, drawn here.</summary>
public sealed class OpennessTests
{
    [Fact]
    public void A_square_opening_holds_the_circle_that_its_side_is_wide()
    {
        // Bars 10 px wide every 50 px both ways leave squares of 40 px.
        var found = Look(picture =>
        {
            for (var at = 0; at < 600; at += 50)
            {
                Cv2.Rectangle(picture, new Rect(at, 0, 10, 500), new Scalar(0.8), -1);
                Cv2.Rectangle(picture, new Rect(0, at, 600, 10), new Scalar(0.8), -1);
            }
        });
        Assert.NotEmpty(found.Diameters);
        Assert.Equal(40, found.Diameters[0], 1.5);
        Assert.Equal(40, found.Diameters[found.Diameters.Length / 2], 1.5);
        Assert.Equal(0.64, found.OpenShare, 0.02);
    }

    [Fact]
    public void One_large_hole_is_the_largest_opening()
    {
        var found = Look(picture =>
        {
            for (var at = 0; at < 600; at += 20)
            {
                Cv2.Rectangle(picture, new Rect(at, 0, 8, 500), new Scalar(0.8), -1);
            }

            Cv2.Circle(picture, 300, 250, 60, new Scalar(0.1), -1);
        });
        Assert.Equal(120, found.Diameters[0], 12.0);
        Assert.All(found.Diameters.Skip(1), d => Assert.InRange(d, 0, 60));
    }

    [Fact]
    public void Windows_tell_the_cover_that_was_drawn()
    {
        var found = Look(picture => Cv2.Rectangle(picture, new Rect(0, 0, 304, 500), new Scalar(0.8), -1));
        var windows = found.Cover[0];
        Assert.Equal(16, windows.Side);
        Assert.Equal(1, windows.Shares[0], 0.01);
        Assert.Equal(0, windows.Shares[^1], 0.01);
        Assert.Equal(0.5, windows.Shares.Average(), 0.03);
    }

    private static FieldOpenness Look(Action<Mat> draw)
    {
        using var picture = new Mat(500, 600, MatType.CV_32FC1, new Scalar(0.1));
        draw(picture);
        picture.GetArray(out float[] grey);
        var field = new Micrograph(grey, 600, 500, Length.FromNanometers(100), ImagingMode.SecondaryElectron, new MicrographSource("drawn", string.Empty, 0, 8, "test"));
        return FieldOpenness.Of(field, 8)!;
    }
}
