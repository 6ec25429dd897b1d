using UnitsNet;

namespace FiberScope.Filtration.Uncertainty;

/// <summary>Air as drawn: warmer by some kelvins, at a pressure changed by a factor.</summary>
internal static class DrawnAir
{
    public static AirProperties Of(AirState state, double kelvinsAbove, double logPressure) =>
        kelvinsAbove == 0 && logPressure == 0
            ? state.Properties
            : new AirState(
                Temperature.FromKelvins(state.Temperature.Kelvins + kelvinsAbove),
                Pressure.FromPascals(state.Pressure.Pascals * Math.Exp(logPressure)),
                state.RelativeHumidity).Properties;
}
