using FiberScope.Imaging.Edges;

namespace FiberScope.Imaging.Tests.Edges;

/// <summary>Fibres of one picture, fitted together: they share what they teach about blur and rims.</summary>
internal sealed class FibreGroup
{
    private const int Rows = 60;

    private FibreGroup(List<(CylinderLook Look, double Steepest, EdgeFit Fit)> fibres, PictureOptics optics) => (Fibres, Optics) = (fibres, optics);

    public List<(CylinderLook Look, double Steepest, EdgeFit Fit)> Fibres { get; }

    public PictureOptics Optics { get; }

    public static FibreGroup Of(IEnumerable<CylinderLook> looks, int seed)
    {
        var random = new Random(seed);
        var profiles = looks.Select(look => ProfileOf(new CylinderPicture(look, random))).ToList();
        var optics = PictureOptics.Vague(1.3);
        List<EdgeFit> fits = [];
        for (var round = 0; round < 4; round++)
        {
            fits = [.. profiles.Select(p => EdgeModel.Fit(p.View, optics))];
            optics = round == 3 ? optics : PictureOptics.Estimate([.. fits.Where(f => f.IsAccepted)], optics);
        }

        return new FibreGroup([.. profiles.Zip(fits, (p, f) => (p.Look, p.Right - p.Left, f))], optics);
    }

    /// <summary>Mean error of the accepted fits of a width; pixels.</summary>
    public double Bias(double width) => Fibres.Where(f => f.Look.Width == width && f.Fit.IsAccepted).Average(f => f.Fit.Width - width);

    /// <summary>Twice the standard error of <see cref="Bias"/>; pixels.</summary>
    public double BiasError(double width)
    {
        double[] errors = [.. Fibres.Where(f => f.Look.Width == width && f.Fit.IsAccepted).Select(f => f.Fit.Width - width)];
        var mean = errors.Average();
        return 2 * Math.Sqrt(errors.Sum(e => (e - mean) * (e - mean)) / (errors.Length - 1) / errors.Length);
    }

    /// <summary>The share of accepted fits whose true width lies within so many of their uncertainties.</summary>
    public double Coverage(double times) => Fibres.Where(f => f.Fit.IsAccepted).Average(f =>
        Math.Abs(f.Fit.Width - f.Look.Width) <= times * f.Fit.WidthUncertainty ? 1.0 : 0.0);

    private static Profile ProfileOf(CylinderPicture picture)
    {
        var look = picture.Look;
        var reach = (0.5 * look.Width) + (3 * look.Blur) + 3;
        double[] offsets = [.. Enumerable.Range(0, (int)(4 * reach)).Select(i => (0.5 * i) - reach)];
        var grey = picture.Mean(offsets, Rows);
        var (left, right) = (0.0, 0.0);
        var (climb, fall) = (0.0, 0.0);
        for (var i = 2; i < grey.Length - 2; i++)
        {
            var slope = grey[i + 1] - grey[i - 1] + (0.5 * (grey[i + 2] - grey[i - 2]));
            if (offsets[i] < 0 && slope > climb)
            {
                (climb, left) = (slope, offsets[i]);
            }

            if (offsets[i] > 0 && -slope > fall)
            {
                (fall, right) = (-slope, offsets[i]);
            }
        }

        return new Profile(look, offsets, grey, left, right);
    }

    private sealed record Profile(CylinderLook Look, double[] Offsets, double[] Grey, double Left, double Right)
    {
        public EdgeProfile View => new() { Offsets = Offsets, Grey = Grey, PixelNoise = Math.Sqrt(Look.Brightness / Look.Electrons), Length = Rows, Left = Left, Right = Right };
    }
}
