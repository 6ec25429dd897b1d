namespace FiberScope.Imaging.Edges;

/// <summary>What is known of a picture's edges before one fibre is looked at: usual values and how they differ from fibre to fibre.</summary>
/// <param name="Blur">Probe, focus and pixel blur together, as the sigma of a Gaussian; pixels.</param>
/// <param name="BlurSpread">Standard deviation of its logarithm from fibre to fibre.</param>
/// <param name="Rim">Strength e of the rim law against the brightness of the flat inside; dimensionless.</param>
/// <param name="RimSpread">Standard deviation of it from fibre to fibre.</param>
/// <param name="Dome">How much darker the flanks are than the middle before the rims, against the inside; dimensionless.</param>
/// <param name="DomeSpread">Standard deviation of it from fibre to fibre.</param>
internal sealed record PictureOptics(double Blur, double BlurSpread, double Rim, double RimSpread, double Dome, double DomeSpread)
{
    private const int Enough = 6;

    /// <summary>Before anything was seen: moderate rims, hardly trusted.</summary>
    public static PictureOptics Vague(double blur) => new(blur, 0.4, 0.35, 0.4, 0.05, 0.12);

    /// <summary>Learns the usual values from fits that were made with <paramref name="before"/>.</summary>
    /// <remarks>
    /// What the earlier assumption put into each fit is taken out again (precisions of independent pieces of evidence add, so they can
    /// be subtracted), so that fibres which tell nothing have no say.
    /// </remarks>
    public static PictureOptics Estimate(IReadOnlyList<EdgeFit> fits, PictureOptics before)
    {
        var (blur, blurSpread) = Usual(fits, f => (Math.Log(f.Blur), f.LogBlurUncertainty), Math.Log(before.Blur), before.BlurSpread);
        var (rim, rimSpread) = Usual(fits, f => (f.Rim, f.RimUncertainty), before.Rim, before.RimSpread);
        var (dome, domeSpread) = Usual(fits, f => (f.Dome, f.DomeUncertainty), before.Dome, before.DomeSpread);
        return new PictureOptics(Math.Exp(blur), Math.Clamp(blurSpread, 0.07, 0.4), Math.Clamp(rim, 0, 3), Math.Clamp(rimSpread, 0.05, 0.4), Math.Clamp(dome, -0.2, 0.6), Math.Clamp(domeSpread, 0.03, 0.15));
    }

    /// <summary>The evidence of fits made under an assumption, without that assumption: value and variance; infinite when there is none.</summary>
    public static (double Value, double Variance) Evidence(double value, double uncertainty, double assumed, double spread)
    {
        var precision = (1 / (uncertainty * uncertainty)) - (1 / (spread * spread));
        return precision * spread * spread < 0.3
            ? (assumed, double.PositiveInfinity)
            : (((value / (uncertainty * uncertainty)) - (assumed / (spread * spread))) / precision, 1 / precision);
    }

    private static (double Middle, double Spread) Usual(IReadOnlyList<EdgeFit> fits, Func<EdgeFit, (double Value, double Uncertainty)> take, double assumed, double spread)
    {
        var evidence = fits.Select(f => (Of: take(f), f.Length)).Select(e => (E: Evidence(e.Of.Value, e.Of.Uncertainty, assumed, spread), e.Length))
            .Where(e => double.IsFinite(e.E.Variance)).Select(e => (e.E.Value, e.E.Variance, e.Length)).ToArray();
        if (evidence.Length < Enough)
        {
            return (assumed, spread);
        }

        var between = 0.02;
        var middle = assumed;
        for (var round = 0; round < 4; round++)
        {
            middle = WeightedMedian(evidence, e => e.Value, between);
            var off = WeightedMedian(evidence, e => Math.Abs(e.Value - middle), between) * 1.4826;
            var own = WeightedMedian(evidence, e => Math.Sqrt(e.Variance), between);
            between = Math.Max(2.5e-4, (off * off) - (own * own));
        }

        return (middle, Math.Sqrt(between + (between / evidence.Length)));
    }

    private static double WeightedMedian((double Value, double Variance, double Length)[] evidence, Func<(double Value, double Variance, double Length), double> of, double between)
    {
        var sorted = evidence.Select(e => (Value: of(e), Weight: Math.Min(e.Length, 200) / (e.Variance + between))).OrderBy(e => e.Value).ToArray();
        var half = 0.5 * sorted.Sum(e => e.Weight);
        var sum = 0.0;
        foreach (var (value, weight) in sorted)
        {
            sum += weight;
            if (sum >= half)
            {
                return value;
            }
        }

        return sorted[^1].Value;
    }
}
