using System.Runtime.CompilerServices;

namespace FiberScope.Statistics;

/// <summary>Checks of arguments that return what they checked, so that a property can check in its accessor.</summary>
/// <remarks>Every check fails for NaN.</remarks>
public static class Require
{
    /// <summary>Returns <paramref name="value"/> when it lies strictly between the two limits.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The value is not in (<paramref name="low"/>, <paramref name="high"/>), or is NaN.</exception>
    public static double Inside(double value, double low, double high, [CallerArgumentExpression(nameof(value))] string? name = null) =>
        value > low && value < high ? value : throw Outside(name, value, FormattableString.Invariant($"between {low} and {high}, both excluded"));

    /// <summary>Returns <paramref name="value"/> when it lies between the two limits or on one of them.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The value is not in [<paramref name="low"/>, <paramref name="high"/>], or is NaN.</exception>
    public static double Within(double value, double low, double high, [CallerArgumentExpression(nameof(value))] string? name = null) =>
        value >= low && value <= high ? value : throw Outside(name, value, FormattableString.Invariant($"from {low} to {high}"));

    /// <summary>Returns <paramref name="value"/> when it is above zero and finite.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The value is zero, negative, infinite or NaN.</exception>
    public static double Positive(double value, [CallerArgumentExpression(nameof(value))] string? name = null) =>
        value > 0 && double.IsFinite(value) ? value : throw Outside(name, value, "above zero and finite");

    /// <summary>Returns <paramref name="value"/> when it is zero or above and finite.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The value is negative, infinite or NaN.</exception>
    public static double NotNegative(double value, [CallerArgumentExpression(nameof(value))] string? name = null) =>
        value >= 0 && double.IsFinite(value) ? value : throw Outside(name, value, "zero or above and finite");

    /// <summary>Returns <paramref name="value"/> when it is finite.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The value is infinite or NaN.</exception>
    public static double Finite(double value, [CallerArgumentExpression(nameof(value))] string? name = null) =>
        double.IsFinite(value) ? value : throw Outside(name, value, "finite");

    private static ArgumentOutOfRangeException Outside(string? name, double value, string wanted) =>
        new(name, FormattableString.Invariant($"Must be {wanted}; was {value}."));
}
