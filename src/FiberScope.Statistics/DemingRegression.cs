namespace FiberScope.Statistics;

/// <summary>A straight line y = intercept + slope · x through points with errors in both directions.</summary>
/// <remarks>
/// Slope = (s_yy − δ s_xx + √((s_yy − δ s_xx)² + 4 δ s_xy²)) / (2 s_xy), with δ the ratio of the error variances, y over x.
/// Standard errors by the jackknife. Source: Deming (1943), Statistical Adjustment of Data; Linnet (1993), Clinical Chemistry
/// 39(3), 424–432 (from memory).
/// </remarks>
/// <param name="Slope">The slope.</param>
/// <param name="Intercept">The intercept, in the unit of y.</param>
/// <param name="SlopeInterval95">The 95 % interval of the slope.</param>
/// <param name="InterceptInterval95">The 95 % interval of the intercept.</param>
public sealed record DemingRegression(double Slope, double Intercept, Interval SlopeInterval95, Interval InterceptInterval95)
{
    /// <summary>Fits the line.</summary>
    /// <param name="x">One method's values, at least three.</param>
    /// <param name="y">The other method's values for the same things.</param>
    /// <param name="errorVarianceRatio">δ, the error variance of y over that of x; above zero. 1 is orthogonal regression.</param>
    /// <exception cref="ArgumentException">There are fewer than three pairs, the lists differ in length, or x and y do not vary together.</exception>
    public static DemingRegression Fit(ReadOnlySpan<double> x, ReadOnlySpan<double> y, double errorVarianceRatio = 1)
    {
        Require.Positive(errorVarianceRatio);
        if (x.Length < 3 || x.Length != y.Length)
        {
            throw new ArgumentException("Needs at least three pairs.", nameof(x));
        }

        var n = x.Length;
        var (slope, intercept) = Line(x, y, errorVarianceRatio, leftOut: -1);
        double slopeSum = 0, slopeSquares = 0, interceptSum = 0, interceptSquares = 0;
        for (var i = 0; i < n; i++)
        {
            var (b, a) = Line(x, y, errorVarianceRatio, i);
            var (pseudoSlope, pseudoIntercept) = ((n * slope) - ((n - 1) * b), (n * intercept) - ((n - 1) * a));
            slopeSum += pseudoSlope;
            slopeSquares += pseudoSlope * pseudoSlope;
            interceptSum += pseudoIntercept;
            interceptSquares += pseudoIntercept * pseudoIntercept;
        }

        var t = ClusteredMean.StudentFactor95(n - 2);
        double Half(double sum, double squares) => t * Math.Sqrt(Math.Max(0, squares - (sum * sum / n)) / (n - 1) / n);
        var (slopeHalf, interceptHalf) = (Half(slopeSum, slopeSquares), Half(interceptSum, interceptSquares));
        return new DemingRegression(
            slope, intercept, new Interval(slope - slopeHalf, slope + slopeHalf), new Interval(intercept - interceptHalf, intercept + interceptHalf));
    }

    private static (double Slope, double Intercept) Line(ReadOnlySpan<double> x, ReadOnlySpan<double> y, double delta, int leftOut)
    {
        double n = 0, sumX = 0, sumY = 0, sxx = 0, syy = 0, sxy = 0;
        for (var i = 0; i < x.Length; i++)
        {
            if (i != leftOut)
            {
                n++;
                sumX += x[i];
                sumY += y[i];
            }
        }

        var (meanX, meanY) = (sumX / n, sumY / n);
        for (var i = 0; i < x.Length; i++)
        {
            if (i != leftOut)
            {
                sxx += (x[i] - meanX) * (x[i] - meanX);
                syy += (y[i] - meanY) * (y[i] - meanY);
                sxy += (x[i] - meanX) * (y[i] - meanY);
            }
        }

        if (sxy == 0)
        {
            throw new ArgumentException("The two lists do not vary together: no line can be fitted.", nameof(y));
        }

        var lead = syy - (delta * sxx);
        var slope = (lead + Math.Sqrt((lead * lead) + (4 * delta * sxy * sxy))) / (2 * sxy);
        return (slope, meanY - (slope * meanX));
    }
}
