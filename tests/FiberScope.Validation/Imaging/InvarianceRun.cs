using FiberScope.Imaging;
using FiberScope.Imaging.Files;
using FiberScope.Specimens;
using OpenCvSharp;
using UnitsNet;

namespace FiberScope.Validation.Imaging;

/// <summary>How far the mean moves when a picture is turned, flipped, brightened or enlarged: nothing about the fibres has changed.</summary>
/// <param name="Picture">Which pictures.</param>
/// <param name="Change">What was done to them.</param>
/// <param name="MeanShift">Mean of the pictures' relative shifts.</param>
/// <param name="LargestShift">The largest relative shift of one picture, with its sign.</param>
/// <param name="PooledShift">The relative shift of all pictures together.</param>
internal sealed record InvarianceFigures(string Picture, string Change, double MeanShift, double LargestShift, double PooledShift);

/// <summary>Changes pictures and measures them again.</summary>
internal static class InvarianceRun
{
    private static readonly (string Name, Func<Mat, Mat> Apply, double Enlargement)[] Changes =
    [
        ("mirrored", m => m.Flip(FlipMode.Y), 1),
        ("turned by 90°", m => Turned(m, 90), 1),
        ("turned by 17°", m => Turned(m, 17), 1),
        ("contrast × 0.7", m => Linear(m, 0.7, 0), 1),
        ("brightness + 8 %", m => Linear(m, 1, 0.08), 1),
        ("gamma 0.7", m => Gamma(m, 0.7), 1),
        ("gamma 1.4", m => Gamma(m, 1.4), 1),
        ("enlarged twice", m => m.Resize(new Size(0, 0), 2, 2, InterpolationFlags.Cubic), 2),
    ];

    public static IReadOnlyList<InvarianceFigures> Virtual(int fields) =>
        Of("virtual", [.. new[] { "fine-melt-blown", "electrospun" }.SelectMany(name => Enumerable.Range(0, fields).Select(i => SpecimenPicture.Micrograph(SpecimenPicture.Of(SpecimenFamilies.Find(name)! with { WidthPixels = 800, HeightPixels = 640 }, reporting: true, i))))]);

    /// <summary>The real micrographs, where they are at hand; nothing otherwise.</summary>
    public static IReadOnlyList<InvarianceFigures> Real(int most)
    {
        var folder = RealFields();
        if (folder is null)
        {
            return [];
        }

        string[] names = ["view-01.png", "view-08.png", "view-02.png", "mat-clean-1142.tif", "view-10.png", "view-07.png"];
        var scale = new ScaleRequest { PixelSize = Length.FromMicrometers(1) };
        return Of("real", [.. names.Take(most).SelectMany(n => MicrographReader.Read(Path.Combine(folder, n), scale, ImagingMode.SecondaryElectron))]);
    }

    private static List<InvarianceFigures> Of(string kind, Micrograph[] pictures)
    {
        var plain = Array.ConvertAll(pictures, p => Mean(p, 1));
        var found = new List<InvarianceFigures>();
        foreach (var (name, apply, enlargement) in Changes)
        {
            var changed = Array.ConvertAll(pictures, p => Mean(Changed(p, apply, enlargement), enlargement));
            var shifts = changed.Select((c, i) => (c.Sum / c.Weight / (plain[i].Sum / plain[i].Weight)) - 1).ToArray();
            var pooled = (changed.Sum(c => c.Sum) / changed.Sum(c => c.Weight) / (plain.Sum(c => c.Sum) / plain.Sum(c => c.Weight))) - 1;
            found.Add(new InvarianceFigures(kind, name, shifts.Average(), shifts.MaxBy(Math.Abs), pooled));
        }

        return found;
    }

    // A disc about the middle of the field shows the same fibres however the picture is turned.
    private static (double Sum, double Weight) Mean(Micrograph picture, double enlargement)
    {
        var (x, y) = (picture.Width / 2.0, picture.UsableHeight / 2.0);
        var reach = 0.46 * Math.Min(picture.Width, picture.UsableHeight);
        var inside = FieldMeter.Measure(picture, new MeasurementSettings()).Readings
            .Where(r => ((r.X - x) * (r.X - x)) + ((r.Y - y) * (r.Y - y)) < reach * reach).ToArray();
        return (inside.Sum(r => r.Diameter * r.RepresentedLength) / enlargement, inside.Sum(r => r.RepresentedLength));
    }

    private static Micrograph Changed(Micrograph picture, Func<Mat, Mat> apply, double enlargement)
    {
        using var native = new ResourcesTracker();
        var usable = picture.Grey[..(picture.Width * picture.UsableHeight)].ToArray();
        var source = native.T(Mat.FromPixelData(picture.UsableHeight, picture.Width, MatType.CV_32FC1, usable));
        var changed = native.T(apply(source));
        var clipped = native.NewMat();
        changed.ConvertTo(clipped, MatType.CV_8UC1, 255);
        clipped.GetArray(out byte[] bytes);
        return new Micrograph(Array.ConvertAll(bytes, b => b / 255f), clipped.Width, clipped.Height, picture.PixelSize / enlargement, picture.Mode, picture.Source);
    }

    private static Mat Turned(Mat source, double degrees)
    {
        var middle = new Point2f((source.Width - 1) / 2f, (source.Height - 1) / 2f);
        using var turn = Cv2.GetRotationMatrix2D(middle, degrees, 1);
        return source.WarpAffine(turn, source.Size(), InterpolationFlags.Cubic, BorderTypes.Reflect101);
    }

    private static Mat Linear(Mat source, double factor, double offset)
    {
        var result = new Mat();
        source.ConvertTo(result, MatType.CV_32FC1, factor, offset);
        return result;
    }

    private static Mat Gamma(Mat source, double exponent)
    {
        var result = new Mat();
        Cv2.Pow(source, exponent, result);
        return result;
    }

    private static string? RealFields()
    {
        for (var folder = new DirectoryInfo(Repository.Root); folder is not null; folder = folder.Parent)
        {
            var candidate = Path.Combine(folder.FullName, "shared", "real-fields");
            if (Directory.Exists(candidate))
            {
                return candidate;
            }
        }

        return null;
    }
}
