namespace FiberScope.Specimens.Numbers;

/// <summary>Elementary functions made of +, −, ×, ÷ and √ only, which every machine rounds alike.</summary>
/// <remarks>
/// The runtime's own <c>Math.Exp</c> and its kin may differ in the last bit from one system to the next, and one bit is enough to
/// change a specimen's bytes. Argument reduction and power series; relative error below 1e-14 over the ranges used here.
/// </remarks>
internal static class PortableMath
{
    private const double LogTwoHigh = 0.693147180369123816490, LogTwoLow = 1.90821492927058770002e-10;
    private const double HalfPiHigh = 1.57079632673412561417, HalfPiLow = 6.07710050650619224932e-11;

    private static readonly double[] Reciprocals = [.. Enumerable.Range(0, 24).Select(i => i == 0 ? 0 : 1.0 / i)];

    public static double Exp(double x)
    {
        if (x < -700)
        {
            return 0;
        }

        var k = Math.Floor((x / (LogTwoHigh + LogTwoLow)) + 0.5);
        var r = x - (k * LogTwoHigh) - (k * LogTwoLow);
        var sum = 1.0;
        for (var i = 13; i >= 1; i--)
        {
            sum = 1 + (r * sum * Reciprocals[i]);
        }

        return sum * BitConverter.Int64BitsToDouble(((long)k + 1023) << 52);
    }

    /// <summary>Natural logarithm; x must be a normal number above zero.</summary>
    public static double Log(double x)
    {
        var bits = BitConverter.DoubleToInt64Bits(x);
        var exponent = (int)(bits >> 52) - 1023;
        var mantissa = BitConverter.Int64BitsToDouble((bits & 0xFFFFFFFFFFFFFL) | (1023L << 52));
        if (mantissa > 1.4142135623730951)
        {
            mantissa *= 0.5;
            exponent++;
        }

        var s = (mantissa - 1) / (mantissa + 1);
        var square = s * s;
        var sum = 0.0;
        for (var i = 23; i >= 1; i -= 2)
        {
            sum = (sum * square) + Reciprocals[i];
        }

        return (2 * s * sum) + (exponent * LogTwoLow) + (exponent * LogTwoHigh);
    }

    public static double Pow(double x, double power) => x <= 0 ? 0 : Exp(power * Log(x));

    public static (double Sin, double Cos) SinCos(double x)
    {
        var k = Math.Floor((x / (HalfPiHigh + HalfPiLow)) + 0.5);
        var r = x - (k * HalfPiHigh) - (k * HalfPiLow);
        var square = r * r;
        double sin = 1, cos = 1;
        for (var i = 16; i >= 2; i -= 2)
        {
            sin = 1 - (square * sin * (Reciprocals[i] * Reciprocals[i + 1]));
            cos = 1 - (square * cos * (Reciprocals[i] * Reciprocals[i - 1]));
        }

        sin *= r;
        return ((long)k & 3) switch
        {
            0 => (sin, cos),
            1 => (cos, -sin),
            2 => (-sin, -cos),
            _ => (-cos, sin),
        };
    }
}
