using FiberScope.Conformity;
using FiberScope.Filtration;
using FiberScope.Statistics;
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

        var open = forecast.Uncertainty;
        return c == Characteristic.PressureDrop ? PressureDrop()
            : c == Characteristic.MostPenetratingSize && forecast.MostPenetratingSize is { } size ? MostPenetratingSize(size)
            : c == Characteristic.QualityFactor ? Factor(Compressibility.FromInversePascals(forecast.QualityFactorPerPascal), open is null ? 0 : Relative(open.QualityFactorPerPascal))
            : c == Characteristic.AirPermeability && limit.TestPressure is { } pressure ? Permeability(pressure)
            : null;
    }

    private CurvePoint Worst() => forecast.MostPenetratingSize is { } size ? at(size) : forecast.Curve.MaxBy(p => p.Penetration)!;

    private static ObservedValue Penetration(CurvePoint point)
    {
        var value = Ratio.FromDecimalFractions(point.Penetration);
        return Factor(value, point.MeasurementBand is { } band ? Relative(band) : 0) with
        {
            Scale = point.Penetration > 0 ? UncertaintyScale.Logarithmic : UncertaintyScale.Linear,
            ModelBand = (Ratio.FromDecimalFractions(point.ModelBand.Low), Ratio.FromDecimalFractions(point.ModelBand.High)),
        };
    }

    private ObservedValue PressureDrop() => Factor(forecast.PressureDrop, DropUncertainty) with
    {
        ModelBand = forecast.PressureDropModelBandPascals is { } band ? (Pressure.FromPascals(band.Low), Pressure.FromPascals(band.High)) : null,
    };

    private ObservedValue MostPenetratingSize(Length size)
    {
        var open = forecast.Uncertainty?.MostPenetratingSize;
        return Factor(size, open is { } band ? Relative(new Interval(band.Low.Meters, band.High.Meters)) : 0) with
        {
            ModelBand = forecast.MostPenetratingSizeModelBand is { } models ? (models.Low, models.High) : null,
        };
    }

    /// <summary>Velocity at a pressure drop falls as the drag rises, so the band of the pressure drop turns over.</summary>
    private ObservedValue Permeability(Pressure pressure)
    {
        var velocity = permeability(pressure);
        var central = forecast.PressureDrop.Pascals;
        return Factor(velocity, DropUncertainty) with
        {
            ModelBand = forecast.PressureDropModelBandPascals is { Low: > 0 } band ? (velocity * (central / band.High), velocity * (central / band.Low)) : null,
        };
    }

    private double DropUncertainty => forecast.Uncertainty is { } open ? Relative(open.PressureDropPascals) : 0;

    /// <summary>The relative standard uncertainty that a 95 % interval of factors stands for.</summary>
    private static double Relative(Interval interval) => interval.Low > 0 ? Math.Log(interval.High / interval.Low) / NormalWidth95 : 0;

    private static ObservedValue Factor(IQuantity value, double relative) =>
        new(value, Quantity.From((double)value.Value * relative, value.Unit)) { Scale = UncertaintyScale.Logarithmic };
}
