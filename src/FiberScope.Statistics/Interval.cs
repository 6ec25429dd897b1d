namespace FiberScope.Statistics;

/// <summary>A range on the number line, both ends included.</summary>
/// <remarks>The default value is the single point zero.</remarks>
public readonly record struct Interval
{
    /// <summary>Makes the interval from <paramref name="low"/> to <paramref name="high"/>.</summary>
    /// <exception cref="ArgumentOutOfRangeException">An end is NaN, or the ends are in the wrong order.</exception>
    public Interval(double low, double high)
    {
        if (!(low <= high))
        {
            throw new ArgumentOutOfRangeException(nameof(high), FormattableString.Invariant($"An interval runs upwards; was {low} to {high}."));
        }

        Low = low;
        High = high;
    }

    /// <summary>The lower end.</summary>
    public double Low { get; }

    /// <summary>The upper end; never below <see cref="Low"/>.</summary>
    public double High { get; }

    /// <summary>The distance between the ends; zero or above.</summary>
    public double Width => High - Low;

    /// <summary>Whether <paramref name="value"/> lies in the interval, its ends included.</summary>
    public bool Contains(double value) => value >= Low && value <= High;

    /// <summary>Both ends multiplied by a factor; the ends swap when it is negative.</summary>
    public Interval Scale(double factor) =>
        factor >= 0 ? new(Low * factor, High * factor) : new(High * factor, Low * factor);
}
