using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The state of the air that is filtered.</summary>
public sealed record AirState
{
    /// <summary>Standard laboratory air: 20 °C, 101.325 kPa, dry.</summary>
    public static AirState Standard { get; } = new(Temperature.FromDegreesCelsius(20), Pressure.FromPascals(101_325), 0);

    /// <summary>Makes a state.</summary>
    /// <param name="temperature">Temperature; above absolute zero.</param>
    /// <param name="pressure">Absolute pressure; above zero.</param>
    /// <param name="relativeHumidity">Relative humidity; dimensionless, 0 to 1.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public AirState(Temperature temperature, Pressure pressure, double relativeHumidity)
    {
        Require.Positive(temperature.Kelvins, nameof(temperature));
        Require.Positive(pressure.Pascals, nameof(pressure));
        Temperature = temperature;
        Pressure = pressure;
        RelativeHumidity = Require.Within(relativeHumidity, 0, 1);
    }

    /// <summary>Temperature.</summary>
    public Temperature Temperature { get; }

    /// <summary>Absolute pressure.</summary>
    public Pressure Pressure { get; }

    /// <summary>Relative humidity; dimensionless, 0 to 1.</summary>
    public double RelativeHumidity { get; }

    /// <summary>Viscosity, mean free path and density in this state.</summary>
    public AirProperties Properties => AirProperties.Of(this);
}
