using System.Collections.Immutable;

namespace FiberScope.Statistics;

/// <summary>The mixture of two log-normal parts that makes a weighted sample most likely.</summary>
/// <remarks>
/// Expectation–maximisation on ln x, from several starts. Source: Dempster, Laird and Rubin (1977), J. R. Stat. Soc. B 39, 1–38.
/// The likelihood of a mixture is unbounded where one part shrinks to a point, so each spread is kept above a fiftieth of the
/// whole sample's.
/// </remarks>
internal static class TwoPartMixture
{
    private const int Bins = 400;
    private const int Iterations = 400;
    private const double NarrowestShare = 0.02;

    private static readonly double[] StartingSplits = [0.1, 0.25, 0.5, 0.75, 0.9];

    public static ImmutableArray<ShapePart> Fit(WeightedSample sample)
    {
        var (x, w) = Histogram(sample);
        var floor = NarrowestShare * Math.Log(sample.GeometricStandardDeviation);
        var best = StartingSplits
            .Select(split => Climb(x, w, Start(x, w, split, floor), floor))
            .MaxBy(fit => fit.Likelihood);
        return
        [
            .. new[] { new ShapePart(best.P, Math.Exp(best.M1), Math.Exp(best.S1)), new ShapePart(1 - best.P, Math.Exp(best.M2), Math.Exp(best.S2)) }
                .OrderBy(part => part.Location),
        ];
    }

    private static (double[] Centres, double[] Weights) Histogram(WeightedSample sample)
    {
        var (low, high) = (Math.Log(sample.Values[0]), Math.Log(sample.Values[^1]));
        var (sum, weight) = (new double[Bins], new double[Bins]);
        for (var i = 0; i < sample.Values.Length; i++)
        {
            var logarithm = Math.Log(sample.Values[i]);
            var bin = Math.Min(Bins - 1, (int)((logarithm - low) / (high - low) * Bins));
            sum[bin] += sample.Weights[i] * logarithm;
            weight[bin] += sample.Weights[i];
        }

        var filled = Enumerable.Range(0, Bins).Where(i => weight[i] > 0).ToArray();
        return ([.. filled.Select(i => sum[i] / weight[i])], [.. filled.Select(i => weight[i] / sample.TotalWeight)]);
    }

    private static Parameters Start(double[] x, double[] w, double split, double floor)
    {
        double below = 0;
        var cut = 0;
        while (cut < x.Length - 1 && below + w[cut] <= split)
        {
            below += w[cut++];
        }

        cut = Math.Clamp(cut, 1, x.Length - 1);
        var (p, m1, s1) = Moments(x, w, 0, cut, floor);
        var (q, m2, s2) = Moments(x, w, cut, x.Length, floor);
        return new Parameters(p / (p + q), m1, s1, m2, s2, double.NegativeInfinity);
    }

    private static (double Weight, double Mean, double Spread) Moments(double[] x, double[] w, int from, int to, double floor)
    {
        double n = 0, sum = 0, squares = 0;
        for (var i = from; i < to; i++)
        {
            n += w[i];
            sum += w[i] * x[i];
            squares += w[i] * x[i] * x[i];
        }

        return (n, sum / n, Math.Max(floor, Math.Sqrt(Math.Max(0, (squares / n) - (sum / n * (sum / n))))));
    }

    private static Parameters Climb(double[] x, double[] w, Parameters start, double floor)
    {
        var now = start;
        for (var iteration = 0; iteration < Iterations; iteration++)
        {
            var next = Step(x, w, now, floor);
            if (next.Likelihood - now.Likelihood < 1e-10)
            {
                return next;
            }

            now = next;
        }

        return now;
    }

    /// <summary>One round of expectation and maximisation; the likelihood is that of the parameters that went in.</summary>
    private static Parameters Step(double[] x, double[] w, Parameters now, double floor)
    {
        double likelihood = 0, n1 = 0, sum1 = 0, squares1 = 0, n2 = 0, sum2 = 0, squares2 = 0;
        for (var i = 0; i < x.Length; i++)
        {
            var a = now.P * Gauss(x[i], now.M1, now.S1);
            var b = (1 - now.P) * Gauss(x[i], now.M2, now.S2);
            var both = Math.Max(a + b, 1e-300);
            likelihood += w[i] * Math.Log(both);
            var (first, second) = (w[i] * a / both, w[i] * b / both);
            n1 += first;
            sum1 += first * x[i];
            squares1 += first * x[i] * x[i];
            n2 += second;
            sum2 += second * x[i];
            squares2 += second * x[i] * x[i];
        }

        if (n1 < 1e-6 || n2 < 1e-6)
        {
            return now with { Likelihood = likelihood };
        }

        double Spread(double n, double sum, double squares) => Math.Max(floor, Math.Sqrt(Math.Max(0, (squares / n) - (sum / n * (sum / n)))));
        return new Parameters(n1 / (n1 + n2), sum1 / n1, Spread(n1, sum1, squares1), sum2 / n2, Spread(n2, sum2, squares2), likelihood);
    }

    private static double Gauss(double x, double mean, double spread)
    {
        var z = (x - mean) / spread;
        return Math.Exp(-0.5 * z * z) / (spread * 2.5066282746310002);
    }

    private readonly record struct Parameters(double P, double M1, double S1, double M2, double S2, double Likelihood);
}
