using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Mats;

/// <summary>The length-weighted law that fibre diameters are drawn from, in pixels: log-normal parts, each cut at ±2.8 sigma.</summary>
internal sealed class DiameterLaw
{
    private const double Cut = 2.8;
    private readonly (double Share, double Median, double Sigma)[] _parts;

    public DiameterLaw(MatRecipe mat, double pixelMetres)
    {
        var total = mat.Fibres.Sum(f => f.LengthShare);
        _parts = [.. mat.Fibres.Select(f => (f.LengthShare / total, f.MedianDiameter.Meters / pixelMetres, PortableMath.Log(f.GeometricStandardDeviation)))];
    }

    /// <summary>The mean of d^power over fibre length.</summary>
    public double Moment(int power) => _parts.Sum(p => p.Share * PortableMath.Exp(power * PortableMath.Log(p.Median)) * CutMoment(power * p.Sigma));

    public double Draw(SeededRandom random)
    {
        var pick = random.Next();
        var part = _parts[^1];
        foreach (var candidate in _parts)
        {
            if (pick < candidate.Share)
            {
                part = candidate;
                break;
            }

            pick -= candidate.Share;
        }

        double z;
        do
        {
            z = random.Normal();
        }
        while (Math.Abs(z) > Cut);
        return part.Median * PortableMath.Exp(part.Sigma * z);
    }

    // E[exp(a z)] for a standard normal z cut at ±Cut, by Simpson's rule.
    private static double CutMoment(double a)
    {
        const int steps = 400;
        double above = 0, below = 0;
        for (var i = 0; i <= steps; i++)
        {
            var z = Cut * ((2.0 * i / steps) - 1);
            var weight = (i is 0 or steps ? 1 : i % 2 == 1 ? 4 : 2) * PortableMath.Exp(-z * z / 2);
            above += weight * PortableMath.Exp(a * z);
            below += weight;
        }

        return above / below;
    }
}
