using FiberScope.Fibres;
using UnitsNet;

namespace FiberScope.Reports.Html;

/// <summary>The unit and the number of decimals in which one layer's diameters are written, so that a table lines up.</summary>
internal sealed record DiameterScale
{
    private readonly double _metres;
    private readonly int _decimals;

    private DiameterScale(string unit, double metres, int decimals) => (Unit, _metres, _decimals) = (unit, metres, decimals);

    /// <summary>The unit as written after a number.</summary>
    public string Unit { get; }

    /// <summary>
    /// The scale for a survey: nanometres when the mean is below half a micrometre, and as many decimals as give the interval of
    /// the mean two digits.
    /// </summary>
    public static DiameterScale For(DiameterSurvey survey)
    {
        var (unit, metres) = survey.LengthWeighted.Mean.Micrometers < 0.5 ? ("nm", 1e-9) : ("µm", 1e-6);
        var half = (survey.MeanInterval95.High - survey.MeanInterval95.Low).Meters / metres / 2;
        var decimals = half > 0 ? (int)Math.Clamp(1 - Math.Floor(Math.Log10(half)), 0, 4) : 3;
        return new DiameterScale(unit, metres, decimals);
    }

    /// <summary>The number alone.</summary>
    public string Number(Length length) => Wording.Fixed(In(length), _decimals);

    /// <summary>The number and its unit.</summary>
    public string Text(Length length) => $"{Number(length)} {Unit}";

    /// <summary>An interval with its unit: <c>1.71 to 1.93 µm</c>.</summary>
    public string Text(LengthInterval interval) => $"{Number(interval.Low)} to {Number(interval.High)} {Unit}";

    /// <summary>The number of units in a length.</summary>
    public double In(Length length) => length.Meters / _metres;

    /// <summary>The length of a number of units.</summary>
    public Length Of(double number) => Length.FromMeters(number * _metres);
}
