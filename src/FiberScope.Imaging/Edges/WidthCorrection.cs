using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Edges;

/// <summary>What the edge model says of one traced fibre.</summary>
/// <param name="Excess">How much wider the steepest points read the fibre than it is; pixels.</param>
/// <param name="Uncertainty">Standard uncertainty of the corrected width, what the model leaves open included; pixels.</param>
/// <param name="Blur">The fibre's own blur; pixels.</param>
internal readonly record struct Correction(double Excess, double Uncertainty, double Blur);

/// <summary>Takes the edge bias off the fibres of one picture: wide fibres teach blur and rims, thin ones borrow them.</summary>
internal sealed class WidthCorrection
{
    /// <summary>A fibre this many blurs wide shows its blur and its rims apart.</summary>
    private const double TellingWidth = 8;

    /// <summary>What the rim law itself leaves open, as a share of the blur: measured on other laws (tests of the edge model).</summary>
    private const double LawUncertainty = 0.1;

    /// <summary>The share of pixel noise left after sampling between four pixels, mean over all places: the variance keeps (2/3)².</summary>
    private const double BilinearShare = 2.0 / 3;

    private readonly List<FibreProfile?> _profiles;

    private WidthCorrection(List<FibreProfile?> profiles) => _profiles = profiles;

    /// <summary>The picture's usual blur and rims.</summary>
    public EdgePriors Priors { get; private set; } = EdgePriors.Vague(1);

    public static (List<Correction> Corrections, EdgePriors Priors) Of(IReadOnlyList<Ribbon> ribbons, GreyNoise noise)
    {
        var correction = new WidthCorrection([.. ribbons.Select(r => ProfileOf(r, noise))]);
        correction.Learn(ribbons);
        return (correction.Apply(), correction.Priors);
    }

    /// <summary>The mean grey across a ribbon over its accepted rows, each centred and stretched to the usual width.</summary>
    private static FibreProfile? ProfileOf(Ribbon ribbon, GreyNoise noise)
    {
        const int MostRows = 160;
        var strip = ribbon.Strip;
        int[] rows = [.. Enumerable.Range(0, strip.Rows).Where(r => ribbon.Accepted[r])];
        if (rows.Length < 5)
        {
            return null;
        }

        var stride = Math.Max(1, rows.Length / MostRows);
        var width = Series.Median([.. rows.Select(r => strip.Left.Offset[r] + strip.Right.Offset[r])]);
        var step = Math.Max(0.25, width / 48);
        var reach = (int)(((0.5 * width) + Math.Min(8, Math.Max(3.5, 0.4 * width))) / step);
        var values = new double[(2 * reach) + 1];

        // Rows are laid on the fibre's smooth course: laid on their own noisy edges they would fake a sharper edge at the wrong place.
        double[] offsets = [.. Enumerable.Range(0, strip.Rows).Select(r => 0.5 * (strip.Right.Offset[r] - strip.Left.Offset[r]))];
        var centres = Runs.Median(offsets, ribbon.Accepted, 4 * width / strip.Step);
        var used = 0;
        for (var i = 0; i < rows.Length; i += stride, used++)
        {
            var r = rows[i];
            var centre = centres[r];
            var stretch = Math.Clamp(ribbon.Widths[r] / width, 0.9, 1.1);
            for (var c = -reach; c <= reach; c++)
            {
                values[c + reach] += Raw(strip, r, centre + (c * step * stretch));
            }
        }

        for (var c = 0; c < values.Length; c++)
        {
            values[c] /= used;
        }

        return new FibreProfile(values, -reach * step, step, BilinearShare * noise.At(values[reach]) / Math.Sqrt(used), -0.5 * width, 0.5 * width);
    }

    private static double Raw(RibbonStrip strip, int row, double offset)
    {
        var place = Math.Clamp((offset / strip.ColumnStep) + strip.Reach, 0, strip.Columns - 1.001);
        var column = (int)place;
        var at = (row * strip.Columns) + column;
        return strip.Values[at] + ((place - column) * (strip.Values[at + 1] - strip.Values[at]));
    }

    private void Learn(IReadOnlyList<Ribbon> ribbons)
    {
        if (ribbons.Count == 0)
        {
            return;
        }

        // Contrast over slope counts the rim as contrast and so reads the blur too large: a start only.
        var rough = Math.Clamp(0.8 * Series.Median([.. ribbons.Select(r => StripLook.Blur(r.Strip))]), 0.5, 3);
        var model = new EdgeModel(EdgePriors.Vague(rough));
        var fits = new List<(EdgeFit Fit, double Length)>();
        foreach (var (ribbon, profile) in ribbons.Zip(_profiles).OrderByDescending(p => p.First.Width).Take(150))
        {
            if (profile is not null && model.Fit(profile) is { } fit && fit.Width > 5 * fit.Blur)
            {
                fits.Add((fit, ribbon.Accepted.Count(a => a) * ribbon.Strip.Step));
            }
        }

        var telling = fits.Where(f => f.Fit.Width > TellingWidth * f.Fit.Blur).ToList();
        var taught = telling.Count >= 8 ? telling : fits;

        // A profile that the model fits badly is not one fibre's: it teaches nothing.
        taught = [.. taught.OrderBy(f => f.Fit.Residual).Take(Math.Max(8, taught.Count * 2 / 3))];
        if (taught.Count < 3)
        {
            Priors = EdgePriors.Vague(rough) with { BlurSpread = 0.25, RimSpread = 0.3 };
            return;
        }

        double[] blurs = [.. taught.Select(f => Math.Log(f.Fit.Blur))];
        double[] domes = [.. taught.Select(f => f.Fit.Dome)];
        double[] rims = [.. taught.Select(f => f.Fit.Rim)];
        Priors = new EdgePriors(
            Math.Exp(Series.Median(blurs)), Math.Clamp(MedianDeviation(blurs), 0.08, 0.3), Math.Clamp(Series.Median(rims), 0, 3), Math.Clamp(MedianDeviation(rims), 0.05, 0.4),
            Math.Clamp(Series.Median(domes), -0.2, 0.6), Math.Clamp(MedianDeviation(domes), 0.04, 0.2));
    }

    private List<Correction> Apply()
    {
        var model = new EdgeModel(Priors);
        var corrections = new List<Correction>(_profiles.Count);
        foreach (var profile in _profiles)
        {
            corrections.Add(profile is not null && model.Fit(profile) is { } fit
                ? new Correction(profile.Width - fit.Width, Math.Sqrt(Math.Pow(fit.WidthUncertainty, 2) + Math.Pow(LawUncertainty * fit.Blur, 2)), fit.Blur)
                : new Correction(double.NaN, double.NaN, Priors.Blur));
        }

        // A fibre whose own profile could not be fitted takes the usual excess.
        var usual = Series.Median([.. corrections.Where(c => double.IsFinite(c.Excess)).Select(c => c.Excess)]);
        return [.. corrections.Select(c => double.IsFinite(c.Excess) ? c : new Correction(usual, Priors.Blur, Priors.Blur))];
    }

    private static double MedianDeviation(double[] values)
    {
        var middle = Series.Median(values);
        return 1.4826 * Series.Median([.. values.Select(v => Math.Abs(v - middle))]);
    }
}
