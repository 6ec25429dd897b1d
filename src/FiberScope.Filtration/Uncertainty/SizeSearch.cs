namespace FiberScope.Filtration.Uncertainty;

/// <summary>Finds the most-penetrating size of a draw on a fixed grid of sizes.</summary>
internal sealed class SizeSearch
{
    private const double SmallestMetres = 10e-9;
    private const double LargestMetres = 2e-6;
    private const int OwnSizes = 40;
    private const int EnoughSizes = 25;

    private readonly int _first;
    private readonly double[] _logarithms;

    private SizeSearch(int first, double[] metres)
    {
        _first = first;
        _logarithms = Array.ConvertAll(metres, Math.Log);
    }

    /// <summary>A search over the curve's own sizes where they cover 10 nm to 2 µm well enough, else over a grid beside them.</summary>
    public static SizeSearch For(double[] curveMetres)
    {
        var inside = Array.FindAll(curveMetres, d => d >= SmallestMetres * 0.999 && d <= LargestMetres);
        return inside.Length >= EnoughSizes && inside[0] < 1.3 * SmallestMetres && inside[^1] > LargestMetres / 1.3
            ? new SizeSearch(Array.IndexOf(curveMetres, inside[0]), inside)
            : new SizeSearch(curveMetres.Length, Grid());
    }

    /// <summary>The curve's sizes and, after them, what the search needs beside.</summary>
    public double[] AllMetres(double[] curveMetres) =>
        _first < curveMetres.Length ? curveMetres : [.. curveMetres, .. Grid()];

    /// <summary>The size (m) with the least −ln P inside the range, by a parabola over its neighbours, and that −ln P.</summary>
    /// <returns>No size when −ln P has no minimum inside; then the least −ln P of the range.</returns>
    public (double? Metres, double Attenuation) Find(double[] attenuations)
    {
        var best = -1;
        for (var i = 1; i < _logarithms.Length - 1; i++)
        {
            var a = attenuations[_first + i];
            if (a <= attenuations[_first + i - 1] && a < attenuations[_first + i + 1] && (best < 0 || a < attenuations[_first + best]))
            {
                best = i;
            }
        }

        if (best < 0)
        {
            return (null, Math.Min(attenuations[_first], attenuations[_first + _logarithms.Length - 1]));
        }

        var (below, middle, above) = (attenuations[_first + best - 1], attenuations[_first + best], attenuations[_first + best + 1]);
        var curvature = below - (2 * middle) + above;
        var shift = curvature > 0 ? Math.Clamp(0.5 * (below - above) / curvature, -1, 1) : 0;
        var step = 0.5 * (_logarithms[best + 1] - _logarithms[best - 1]);
        return (Math.Exp(_logarithms[best] + (shift * step)), middle - (0.25 * (below - above) * shift));
    }

    private static double[] Grid() =>
        [.. Enumerable.Range(0, OwnSizes).Select(i => SmallestMetres * Math.Pow(LargestMetres / SmallestMetres, (double)i / (OwnSizes - 1)))];
}
