using FiberScope.Statistics;

namespace FiberScope.Specimens;

/// <summary>A true length-weighted diameter distribution and its figures; pixels.</summary>
/// <param name="LengthPixels">The fibre length that it holds; pixels.</param>
/// <param name="Mean">Arithmetic mean.</param>
/// <param name="StandardDeviation">Standard deviation of the distribution itself.</param>
/// <param name="D10">The diameter below which a tenth of the length lies.</param>
/// <param name="D50">The median.</param>
/// <param name="D90">The diameter below which nine tenths lie.</param>
public sealed record TrueDiameters(double LengthPixels, double Mean, double StandardDeviation, double D10, double D50, double D90)
{
    /// <summary>The figures of diameters, each with the length that it stands for; all zero when there are none.</summary>
    public static TrueDiameters Of(ReadOnlySpan<double> diameters, ReadOnlySpan<double> lengths)
    {
        if (diameters.Length == 0)
        {
            return new TrueDiameters(0, 0, 0, 0, 0, 0);
        }

        var sample = new WeightedSample(diameters, lengths);
        return new(sample.TotalWeight, sample.Mean, sample.StandardDeviation, sample.Quantile(0.1), sample.Quantile(0.5), sample.Quantile(0.9));
    }
}
