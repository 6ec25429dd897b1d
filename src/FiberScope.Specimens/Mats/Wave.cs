using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Mats;

/// <summary>One sine of a smooth random function along a fibre.</summary>
internal readonly record struct Wave(double Amplitude, double WaveNumber, double Phase)
{
    /// <summary>Four sines of wave lengths about <paramref name="length"/> whose sum has the given root mean square on average.</summary>
    public static Wave[] Several(SeededRandom random, double rootMeanSquare, double length)
    {
        const int count = 4;
        var waves = new Wave[count];
        for (var i = 0; i < count; i++)
        {
            var amplitude = rootMeanSquare * Math.Sqrt(2.0 / count) * random.Between(0.6, 1.4);
            waves[i] = new(amplitude, 2 * Math.PI / (length * random.Between(0.6, 2)), 2 * Math.PI * random.Next());
        }

        return waves;
    }

    public static double Sum(Wave[] waves, double s)
    {
        var sum = 0.0;
        foreach (var wave in waves)
        {
            sum += wave.Amplitude * PortableMath.SinCos((wave.WaveNumber * s) + wave.Phase).Sin;
        }

        return sum;
    }
}
