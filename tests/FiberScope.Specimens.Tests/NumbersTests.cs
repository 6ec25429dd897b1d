using CsCheck;
using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Tests;

/// <summary>The portable functions against the runtime's own, and the random numbers against the moments of their laws.</summary>
public sealed class NumbersTests
{
    [Fact]
    public void Portable_exponential_and_logarithm_agree_with_the_runtime() =>
        Gen.Double[-60, 60].Sample(x =>
            Math.Abs(PortableMath.Exp(x) - Math.Exp(x)) <= 1e-13 * Math.Exp(x) && Math.Abs(PortableMath.Log(Math.Exp(x)) - x) <= 1e-13 * Math.Max(1, Math.Abs(x)));

    [Fact]
    public void Portable_sine_and_cosine_agree_with_the_runtime() =>
        Gen.Double[-1000, 1000].Sample(x =>
            Math.Abs(PortableMath.SinCos(x).Sin - Math.Sin(x)) < 1e-12 && Math.Abs(PortableMath.SinCos(x).Cos - Math.Cos(x)) < 1e-12);

    [Theory]
    [InlineData(0.3)]
    [InlineData(7.0)]
    [InlineData(45.0)]
    [InlineData(300.0)]
    public void Poisson_numbers_have_the_mean_and_variance_of_their_law(double mean)
    {
        const int count = 40_000;
        var random = new SeededRandom(11, 1);
        var draws = Enumerable.Range(0, count).Select(_ => (double)random.Poisson(mean)).ToArray();
        var average = draws.Average();
        var variance = draws.Average(d => (d - average) * (d - average));
        Assert.InRange(average, mean - (5 * Math.Sqrt(mean / count)), mean + (5 * Math.Sqrt(mean / count)));
        Assert.InRange(variance / mean, 0.95, 1.05);
    }

    [Fact]
    public void Streams_of_one_seed_are_different_numbers()
    {
        var (first, second) = (new SeededRandom(5, 1), new SeededRandom(5, 2));
        Assert.NotEqual(first.Next(), second.Next());
    }
}
