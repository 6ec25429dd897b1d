using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Edges;

/// <summary>Takes the edge bias off the fibres of one picture: all of them teach blur and rims, each by what it can tell.</summary>
internal static class WidthCorrection
{
    /// <summary>Fibres asked for the picture's usual blur and rims; more would not change them.</summary>
    private const int MostTeachers = 240;

    /// <summary>What the rim law itself leaves open, as shares of blur and width: found on other laws (see the tests of the edge model).</summary>
    private const double LawByBlur = 0.08, LawByWidth = 0.004;

    /// <summary>Share of the rows' scatter that a running median over four widths keeps: rows are alike over a third of a width.</summary>
    private const double KeptScatter = 0.6;

    /// <summary>The corrections of ribbons, in their order, and what the picture's edges are usually like.</summary>
    public static (List<Correction> Corrections, PictureOptics Optics) Of(IReadOnlyList<Ribbon> ribbons, GreyNoise noise)
    {
        RibbonProfile?[] profiles = [.. ribbons.Select(r => RibbonProfile.Of(r, noise))];
        var optics = Learn(ribbons, [.. profiles.OfType<RibbonProfile>()]);
        var corrections = new List<Correction>(profiles.Length);
        foreach (var profile in profiles)
        {
            corrections.Add(profile is null ? default : Correct(profile, EdgeModel.Fit(profile.View, optics)));
        }

        // A fibre whose own profile could not be fitted takes the usual excess.
        var usual = Series.Median([.. corrections.Where(c => c.IsFitted).Select(c => c.Excess)]);
        return ([.. corrections.Select(c => c.IsFitted ? c : new Correction(usual, optics.Blur, optics.Blur, false))], optics);
    }

    private static Correction Correct(RibbonProfile profile, EdgeFit fit) => !fit.IsAccepted ? default : new Correction(
        profile.Width - fit.Width,
        Math.Sqrt(Square(fit.WidthUncertainty) + Square(LawByBlur * fit.Blur) + Square(LawByWidth * fit.Width) + Square(KeptScatter * profile.Scatter)),
        fit.Blur,
        true);

    private static PictureOptics Learn(IReadOnlyList<Ribbon> ribbons, RibbonProfile[] profiles)
    {
        if (profiles.Length == 0)
        {
            return PictureOptics.Vague(1);
        }

        // Contrast over slope counts the rim as contrast and so reads the blur too large: a start only.
        var optics = PictureOptics.Vague(Math.Clamp(0.85 * Series.Median([.. ribbons.Select(r => StripLook.Blur(r.Strip))]), 0.5, 6));
        var stride = Math.Max(1, profiles.Length / MostTeachers);
        for (var round = 0; round < 3; round++)
        {
            var fits = new List<EdgeFit>();
            for (var i = 0; i < profiles.Length; i += stride)
            {
                fits.Add(EdgeModel.Fit(profiles[i].View, optics));
            }

            optics = PictureOptics.Estimate([.. fits.Where(f => f.IsAccepted)], optics);
        }

        return optics;
    }

    private static double Square(double value) => value * value;
}
