using FiberScope.Imaging.Tracing;

namespace FiberScope.Imaging.Selection;

/// <summary>What a length of each stretch counts for, against a length of the others.</summary>
/// <remarks>
/// Neighbouring readings of one fibre are alike, and a fibre that lies on top is read in long stretches while those below show in short
/// pieces: a long stretch tells less per length than a short one. Each counts with a power of its length, between its length itself (as
/// if every reading were another fibre) and one (as if every stretch were); the power is ours, from virtual specimens made for development.
/// All of a picture's stretches together count for their whole length.
/// </remarks>
internal static class StretchShares
{
    private const double Power = 0.75;

    public static double[] Of(IReadOnlyList<Ribbon> ribbons)
    {
        double[] lengths = [.. ribbons.Select(r => Math.Max(1, r.Accepted.Count(a => a)) * r.Strip.Step)];
        var whole = lengths.Sum() / lengths.Sum(l => Math.Pow(l, Power));
        return [.. lengths.Select(l => whole * Math.Pow(l, Power - 1))];
    }
}
