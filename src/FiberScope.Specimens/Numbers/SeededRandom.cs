using System.Numerics;

namespace FiberScope.Specimens.Numbers;

/// <summary>Random numbers that are the same on every machine: xoshiro256** seeded by SplitMix64.</summary>
/// <remarks>
/// Blackman, D., Vigna, S. (2021), Scrambled linear pseudorandom number generators, ACM Trans. Math. Softw. 47(4) (constants from memory).
/// Each use has its own stream, so that a longer draw in one place does not move the numbers of another.
/// </remarks>
internal sealed class SeededRandom
{
    private ulong _a, _b, _c, _d;
    private double _spare = double.NaN;

    public SeededRandom(ulong seed, ulong stream)
    {
        unchecked
        {
            var state = seed + (Scramble(stream + 0x9E3779B97F4A7C15UL) | 1UL);
            _a = Scramble(state += 0x9E3779B97F4A7C15UL);
            _b = Scramble(state += 0x9E3779B97F4A7C15UL);
            _c = Scramble(state += 0x9E3779B97F4A7C15UL);
            _d = Scramble(state + 0x9E3779B97F4A7C15UL);
        }
    }

    /// <summary>A number in [0, 1) with 53 random bits.</summary>
    public double Next()
    {
        unchecked
        {
            var result = BitOperations.RotateLeft(_b * 5, 7) * 9;
            var t = _b << 17;
            _c ^= _a;
            _d ^= _b;
            _b ^= _c;
            _a ^= _d;
            _c ^= t;
            _d = BitOperations.RotateLeft(_d, 45);
            return (result >> 11) * (1.0 / (1UL << 53));
        }
    }

    public double Between(double low, double high) => low + ((high - low) * Next());

    /// <summary>An integer in [0, count).</summary>
    public int Below(int count) => (int)(Next() * count);

    /// <summary>A standard normal number (Marsaglia's polar method).</summary>
    public double Normal()
    {
        if (!double.IsNaN(_spare))
        {
            var kept = _spare;
            _spare = double.NaN;
            return kept;
        }

        while (true)
        {
            double u = (2 * Next()) - 1, v = (2 * Next()) - 1;
            var s = (u * u) + (v * v);
            if (s is > 0 and < 1)
            {
                var factor = Math.Sqrt(-2 * PortableMath.Log(s) / s);
                _spare = v * factor;
                return u * factor;
            }
        }
    }

    /// <summary>A Poisson number: by inversion up to a mean of 60, above it a rounded normal number.</summary>
    public int Poisson(double mean)
    {
        if (mean <= 0)
        {
            return 0;
        }

        if (mean > 60)
        {
            return Math.Max(0, (int)Math.Floor(mean + (Math.Sqrt(mean) * Normal()) + 0.5));
        }

        double p = PortableMath.Exp(-mean), u = Next();
        var k = 0;
        while (u > p && k < 400)
        {
            u -= p;
            k++;
            p *= mean / k;
        }

        return k;
    }

    private static ulong Scramble(ulong z)
    {
        unchecked
        {
            z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9UL;
            z = (z ^ (z >> 27)) * 0x94D049BB133111EBUL;
            return z ^ (z >> 31);
        }
    }
}
