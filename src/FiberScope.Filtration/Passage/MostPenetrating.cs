namespace FiberScope.Filtration.Passage;

/// <summary>Finds the size that penetrates most.</summary>
internal static class MostPenetrating
{
    private const double SmallestMetres = 10e-9;
    private const double LargestMetres = 2e-6;
    private const int Scan = 48;
    private const double GoldenShare = 0.6180339887498949;

    /// <summary>
    /// The size with the lowest −ln P among those where it has a minimum inside 10 nm to 2 µm: a scan in ln d, so that of two
    /// minima the lower is found, then golden sections down to 10⁻⁶ of the size.
    /// </summary>
    /// <returns>The size in metres, or null when −ln P has no minimum inside.</returns>
    public static double? Size(Func<double, double> attenuation)
    {
        var step = Math.Log(LargestMetres / SmallestMetres) / Scan;
        double At(double logarithm) => attenuation(Math.Exp(logarithm));
        var values = Enumerable.Range(0, Scan + 1).Select(i => At(Math.Log(SmallestMetres) + (i * step))).ToArray();
        var best = -1;
        for (var i = 1; i < Scan; i++)
        {
            if (values[i] <= values[i - 1] && values[i] < values[i + 1] && (best < 0 || values[i] < values[best]))
            {
                best = i;
            }
        }

        return best < 0 ? null : Math.Exp(Golden(At, Math.Log(SmallestMetres) + ((best - 1) * step), Math.Log(SmallestMetres) + ((best + 1) * step)));
    }

    private static double Golden(Func<double, double> value, double low, double high)
    {
        var (left, right) = (high - (GoldenShare * (high - low)), low + (GoldenShare * (high - low)));
        var (atLeft, atRight) = (value(left), value(right));
        while (high - low > 1e-6)
        {
            if (atLeft < atRight)
            {
                (high, right, atRight) = (right, left, atLeft);
                left = high - (GoldenShare * (high - low));
                atLeft = value(left);
            }
            else
            {
                (low, left, atLeft) = (left, right, atRight);
                right = low + (GoldenShare * (high - low));
                atRight = value(right);
            }
        }

        return 0.5 * (low + high);
    }
}
