using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>Turns the medians and means of a log-normal aerosol into each other; Hatch and Choate (1929).</summary>
public static class HatchChoate
{
    /// <summary>The median diameter weighted by d^q: CMD exp(q ln²GSD); q = 1 length, 2 surface, 3 mass.</summary>
    /// <param name="countMedian">CMD; above zero.</param>
    /// <param name="geometricStandardDeviation">GSD; dimensionless, 1 or above.</param>
    /// <param name="exponent">q; dimensionless.</param>
    public static Length Median(Length countMedian, double geometricStandardDeviation, double exponent) =>
        countMedian * Math.Exp(exponent * LogSquare(geometricStandardDeviation));

    /// <summary>The count median of an aerosol whose median weighted by d^q is known.</summary>
    public static Length CountMedian(Length weightedMedian, double geometricStandardDeviation, double exponent) =>
        weightedMedian * Math.Exp(-exponent * LogSquare(geometricStandardDeviation));

    /// <summary>The diameter of the particle of mean d^q: CMD exp(½ q ln²GSD).</summary>
    public static Length MeanOfPower(Length countMedian, double geometricStandardDeviation, double exponent) =>
        countMedian * Math.Exp(0.5 * exponent * LogSquare(geometricStandardDeviation));

    private static double LogSquare(double geometricStandardDeviation)
    {
        var sigma = Math.Log(Require.Within(geometricStandardDeviation, 1, 20));
        return sigma * sigma;
    }
}
