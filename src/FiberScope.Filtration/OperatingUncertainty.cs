using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>Standard uncertainties of the conditions of use; each zero unless given.</summary>
public sealed record OperatingUncertainty
{
    /// <summary>Relative standard uncertainty of the face velocity.</summary>
    public double FaceVelocity { get; init => field = Require.Within(value, 0, 1, nameof(FaceVelocity)); }

    /// <summary>Standard uncertainty of the temperature.</summary>
    public TemperatureDelta Temperature { get; init; } = TemperatureDelta.FromKelvins(0);

    /// <summary>Relative standard uncertainty of the absolute pressure.</summary>
    public double AirPressure { get; init => field = Require.Within(value, 0, 1, nameof(AirPressure)); }
}
