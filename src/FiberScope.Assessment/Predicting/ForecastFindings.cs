using FiberScope.Conformity;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Predicting;

/// <summary>What a forecast says about the characteristics that a grade may limit.</summary>
internal sealed class ForecastFindings(MediaForecast forecast, Func<Length, CurvePoint> at, Func<Pressure, Speed> permeability)
{
    private const double NormalWidth95 = 2 * 1.959964;

    public ObservedValue? Observed(Limit limit)
    {
        var c = limit.Characteristic;
        if (c == Characteristic.PenetrationAtMpps)
        {
            return Penetration(Worst());
        }

        if (c == Characteristic.PenetrationAtSize && limit.Particle is { } particle)
        {
            return Penetration(at(particle));
        }

        return c == Characteristic.PressureDrop ? PressureDrop()
            : c == Characteristic.MostPenetratingSize && forecast.MostPenetratingSize is { } size ? Plain(size)
            : c == Characteristic.QualityFactor ? Plain(Compressibility.FromInversePascals(forecast.QualityFactorPerPascal))
            : c == Characteristic.AirPermeability && limit.TestPressure is { } pressure ? Permeability(pressure)
            : null;
    }

    private CurvePoint Worst() => forecast.MostPenetratingSize is { } size ? at(size) : forecast.Curve.MaxBy(p => p.Penetration)!;

    private static ObservedValue Penetration(CurvePoint point)
    {
        var relative = point.MeasurementBand is { Low: > 0 } band ? Math.Log(band.High / band.Low) / NormalWidth95 : 0;
        return new ObservedValue(Ratio.FromDecimalFractions(point.Penetration), Ratio.FromDecimalFractions(point.Penetration * relative))
        {
            Scale = point.Penetration > 0 ? UncertaintyScale.Logarithmic : UncertaintyScale.Linear,
            ModelBand = (Ratio.FromDecimalFractions(point.ModelBand.Low), Ratio.FromDecimalFractions(point.ModelBand.High)),
        };
    }

    private ObservedValue PressureDrop() => Plain(forecast.PressureDrop) with
    {
        ModelBand = forecast.PressureDropModelBandPascals is { } band ? (Pressure.FromPascals(band.Low), Pressure.FromPascals(band.High)) : null,
    };

    /// <summary>Velocity at a pressure drop falls as the drag rises, so the band of the pressure drop turns over.</summary>
    private ObservedValue Permeability(Pressure pressure)
    {
        var velocity = permeability(pressure);
        var central = forecast.PressureDrop.Pascals;
        return Plain(velocity) with
        {
            ModelBand = forecast.PressureDropModelBandPascals is { } band ? (velocity * (central / band.High), velocity * (central / band.Low)) : null,
        };
    }

    private static ObservedValue Plain(IQuantity value) => new(value, Quantity.From(0, value.Unit));
}
