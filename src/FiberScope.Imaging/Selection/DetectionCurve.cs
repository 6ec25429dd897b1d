namespace FiberScope.Imaging.Selection;

/// <summary>How likely a fibre of a width is read, against one that is wide enough to be missed only when it is hidden.</summary>
/// <param name="HalfWay">The width at which half are read; pixels.</param>
/// <param name="Steepness">How fast the share climbs with the logarithm of the width.</param>
internal sealed record DetectionCurve(double HalfWay, double Steepness)
{
    /// <summary>A correction beyond this factor rests on too few readings to be believed.</summary>
    public const double LargestFactor = 1.3;

    /// <summary>Every width is read alike.</summary>
    public static DetectionCurve Even { get; } = new(1e-3, 4);

    /// <summary>The share read at a width in pixels; in (0, 1], never below 1 / <see cref="LargestFactor"/>.</summary>
    public double Share(double widthPixels) =>
        Math.Max(1 / LargestFactor, 1 / (1 + Math.Pow(HalfWay / Math.Max(0.1, widthPixels), Steepness)));

    /// <summary>
    /// The curve that explains best how many of a picture's fibres are read again when they are made thinner by a factor.
    /// </summary>
    /// <remarks>
    /// What can be read thin can also be read wide, so the share read again is P(w / s) / P(w), occlusion and brightness of the
    /// picture's own fibres included.
    /// </remarks>
    public static DetectionCurve Fit(IReadOnlyList<RereadClass> classes, double shrink)
    {
        if (classes.Sum(c => c.Fibres) < 20)
        {
            return Even;
        }

        var (best, least) = (Even, Misfit(Even, classes, shrink));
        for (var halfWay = 1.0; halfWay < 16; halfWay *= 1.06)
        {
            foreach (var steepness in (double[])[1.5, 2, 2.5, 3, 4, 5, 6, 8])
            {
                var curve = new DetectionCurve(halfWay, steepness);
                if (Misfit(curve, classes, shrink) is var misfit && misfit < least)
                {
                    (best, least) = (curve, misfit);
                }
            }
        }

        return best;
    }

    private static double Misfit(DetectionCurve curve, IReadOnlyList<RereadClass> classes, double shrink)
    {
        // Even a wide fibre is not read again everywhere; that common share is fitted along.
        double top = 0, bottom = 0;
        foreach (var c in classes)
        {
            var ratio = curve.Share(c.Width) / curve.Share(c.Width * shrink);
            top += c.Fibres * ratio * c.Share;
            bottom += c.Fibres * ratio * ratio;
        }

        var common = Math.Min(1, top / Math.Max(1e-9, bottom));
        return classes.Sum(c => c.Fibres * Math.Pow(c.Share - (common * curve.Share(c.Width) / curve.Share(c.Width * shrink)), 2));
    }
}

/// <summary>Fibres of about one width in a shrunken copy, and how much of their length was read again.</summary>
/// <param name="Width">Their width in the copy; pixels.</param>
/// <param name="Share">The share of their length that was read again; 0 to 1.</param>
/// <param name="Fibres">How many fibres the share rests on.</param>
internal readonly record struct RereadClass(double Width, double Share, int Fibres);
