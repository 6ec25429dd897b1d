namespace FiberScope.Filtration.Passage;

/// <summary>Penetrations of parallel streams averaged on −ln P, without losing the smallest to rounding.</summary>
internal static class Mixing
{
    /// <summary>−ln Σ s exp(−A).</summary>
    public static double Attenuation(ReadOnlySpan<double> shares, ReadOnlySpan<double> attenuations)
    {
        var least = double.PositiveInfinity;
        foreach (var a in attenuations)
        {
            least = Math.Min(least, a);
        }

        var sum = 0.0;
        for (var i = 0; i < shares.Length; i++)
        {
            sum += shares[i] * Math.Exp(least - attenuations[i]);
        }

        return least - Math.Log(sum);
    }

    /// <summary>−ln P of a mat beside a leak that passes everything.</summary>
    public static double WithLeak(double attenuation, double leakShare) =>
        leakShare <= 0 ? attenuation : -Math.Log(((1 - leakShare) * Math.Exp(-attenuation)) + leakShare);
}
