using System.Collections.Immutable;

namespace FiberScope.Statistics;

/// <summary>Numbers, each with a weight, and the figures that describe them.</summary>
/// <remarks>
/// Weights are shares of a population (such as lengths of fibre), not repeat counts: only their ratios matter. Immutable.
/// Sums run in ascending order of value, so that the order of the input changes no digit.
/// </remarks>
public sealed class WeightedSample
{
    private readonly ImmutableArray<double> _values;
    private readonly ImmutableArray<double> _weights;
    private readonly double[] _cumulative;

    /// <summary>Takes values and their weights, in any order.</summary>
    /// <param name="values">Finite numbers, at least one.</param>
    /// <param name="weights">As many weights, each above zero and finite.</param>
    /// <exception cref="ArgumentException">The lists differ in length, are empty, or hold a number that is not allowed.</exception>
    public WeightedSample(ReadOnlySpan<double> values, ReadOnlySpan<double> weights)
    {
        if (values.Length == 0 || values.Length != weights.Length)
        {
            throw new ArgumentException("Needs at least one value, and one weight for each.", nameof(values));
        }

        var (v, w) = (values.ToArray(), weights.ToArray());
        if (!Array.TrueForAll(v, double.IsFinite) || !Array.TrueForAll(w, x => x > 0 && double.IsFinite(x)))
        {
            throw new ArgumentException("Values must be finite, weights above zero and finite.", nameof(weights));
        }

        // Equal values must meet in one order whatever the input's, hence the second key.
        var order = Enumerable.Range(0, v.Length).OrderBy(i => v[i]).ThenBy(i => w[i]).ToArray();
        _values = [.. order.Select(i => v[i])];
        _weights = [.. order.Select(i => w[i])];
        _cumulative = new double[v.Length];
        var sum = 0.0;
        for (var i = 0; i < v.Length; i++)
        {
            sum += _weights[i];
            _cumulative[i] = sum;
        }

        TotalWeight = sum;
        Mean = Average(x => x);
        StandardDeviation = Math.Sqrt(Average(x => (x - Mean) * (x - Mean)));
    }

    /// <summary>Values that each count the same.</summary>
    /// <exception cref="ArgumentException">There are no values, or one is not finite.</exception>
    public static WeightedSample Even(ReadOnlySpan<double> values)
    {
        var ones = new double[values.Length];
        Array.Fill(ones, 1.0);
        return new WeightedSample(values, ones);
    }

    /// <summary>The values, ascending.</summary>
    public ImmutableArray<double> Values => _values;

    /// <summary>The weight of each of <see cref="Values"/>.</summary>
    public ImmutableArray<double> Weights => _weights;

    /// <summary>The sum of the weights; above zero.</summary>
    public double TotalWeight { get; }

    /// <summary>The weighted arithmetic mean, Σ w x / Σ w.</summary>
    public double Mean { get; }

    /// <summary>The standard deviation of the weighted values about their mean, √(Σ w (x − mean)² / Σ w): no n − 1.</summary>
    public double StandardDeviation { get; }

    /// <summary>The geometric mean, exp(Σ w ln x / Σ w); the values must be above zero.</summary>
    /// <exception cref="InvalidOperationException">A value is zero or negative.</exception>
    public double GeometricMean => Math.Exp(MeanLogarithm);

    /// <summary>The geometric standard deviation, exp of the standard deviation of ln x; dimensionless, 1 or above.</summary>
    /// <exception cref="InvalidOperationException">A value is zero or negative.</exception>
    public double GeometricStandardDeviation
    {
        get
        {
            var mean = MeanLogarithm;
            return Math.Exp(Math.Sqrt(Average(x => (Math.Log(x) - mean) * (Math.Log(x) - mean))));
        }
    }

    /// <summary>The number of equally weighted independent values that would tell as much, (Σ w)² / Σ w²; from 1 to the count.</summary>
    /// <remarks>Source: Kish (1965), Survey Sampling, section 8.2 (from memory).</remarks>
    public double EffectiveCount => TotalWeight * TotalWeight / _weights.Sum(w => w * w);

    private double MeanLogarithm => _values[0] > 0
        ? Average(Math.Log)
        : throw new InvalidOperationException("A geometric mean needs values above zero.");

    /// <summary>The weighted mean of a function of the values.</summary>
    public double Average(Func<double, double> function)
    {
        var sum = 0.0;
        for (var i = 0; i < _values.Length; i++)
        {
            sum += _weights[i] * function(_values[i]);
        }

        return sum / TotalWeight;
    }

    /// <summary>The value below which the share <paramref name="probability"/> of the weight lies.</summary>
    /// <param name="probability">The share; dimensionless, 0 to 1.</param>
    /// <returns>A number between the smallest and the largest value.</returns>
    /// <remarks>
    /// Each value stands at the middle of its own weight, with straight lines between: for equal weights this is
    /// definition 5 (Hazen) of Hyndman and Fan (1996), The American Statistician 50(4), 361–365.
    /// </remarks>
    /// <exception cref="ArgumentOutOfRangeException">The share is not in [0, 1].</exception>
    public double Quantile(double probability)
    {
        var target = Require.Within(probability, 0, 1) * TotalWeight;
        var above = Array.BinarySearch(_cumulative, target);
        above = Math.Min(above < 0 ? ~above : above, _values.Length - 1);
        if (target > Middle(above))
        {
            above++;
        }

        if (above == 0 || above == _values.Length)
        {
            return above == 0 ? _values[0] : _values[^1];
        }

        var (low, high) = (Middle(above - 1), Middle(above));
        return _values[above - 1] + ((_values[above] - _values[above - 1]) * (target - low) / (high - low));
    }

    /// <summary>The share of the weight at or below <paramref name="value"/>; dimensionless, 0 to 1.</summary>
    public double ShareAtOrBelow(double value)
    {
        var (low, high) = (0, _values.Length);
        while (low < high)
        {
            var middle = (low + high) / 2;
            (low, high) = _values[middle] <= value ? (middle + 1, high) : (low, middle);
        }

        return low == 0 ? 0 : _cumulative[low - 1] / TotalWeight;
    }

    private double Middle(int index) => _cumulative[index] - (_weights[index] / 2);
}
