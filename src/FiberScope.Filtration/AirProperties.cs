using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The properties of air that particles and fibres feel.</summary>
/// <remarks>
/// Made from an <see cref="AirState"/>, or given outright to repeat a published calculation with its own constants.
/// </remarks>
public sealed record AirProperties
{
    /// <summary>Sutherland's constant of air, K; US Standard Atmosphere 1976 (from memory).</summary>
    private const double SutherlandKelvins = 110.4;

    /// <summary>β in μ = β T^1.5 / (T + S), kg m⁻¹ s⁻¹ K^−½; US Standard Atmosphere 1976 (from memory).</summary>
    private const double SutherlandCoefficient = 1.458e-6;

    /// <summary>The mean free path at 293.15 K and 101 325 Pa, m; Willeke (1976), from memory.</summary>
    private const double ReferenceMeanFreePathMetres = 66.4e-9;

    /// <summary>The constant of Willeke's temperature correction, K; from memory.</summary>
    private const double WillekeKelvins = 110;

    private const double ReferenceKelvins = 293.15;
    private const double ReferencePascals = 101_325;

    /// <summary>Specific gas constants of dry air and of water vapour, J kg⁻¹ K⁻¹; common handbook values.</summary>
    private const double DryAirGasConstant = 287.05;
    private const double VapourGasConstant = 461.5;

    /// <summary>Takes the properties as they are.</summary>
    /// <param name="temperature">Temperature; above absolute zero.</param>
    /// <param name="viscosity">Dynamic viscosity; above zero.</param>
    /// <param name="meanFreePath">Mean free path of the molecules; above zero.</param>
    /// <param name="density">Density; above zero.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument is out of its range.</exception>
    public AirProperties(Temperature temperature, DynamicViscosity viscosity, Length meanFreePath, Density density)
    {
        Kelvins = Require.Positive(temperature.Kelvins, nameof(temperature));
        PascalSeconds = Require.Positive(viscosity.NewtonSecondsPerMeterSquared, nameof(viscosity));
        MeanFreePathMetres = Require.Positive(meanFreePath.Meters, nameof(meanFreePath));
        KilogramsPerCubicMetre = Require.Positive(density.KilogramsPerCubicMeter, nameof(density));
    }

    /// <summary>Temperature.</summary>
    public Temperature Temperature => Temperature.FromKelvins(Kelvins);

    /// <summary>Dynamic viscosity.</summary>
    public DynamicViscosity Viscosity => DynamicViscosity.FromNewtonSecondsPerMeterSquared(PascalSeconds);

    /// <summary>Mean free path of the air's molecules.</summary>
    public Length MeanFreePath => Length.FromMeters(MeanFreePathMetres);

    /// <summary>Density.</summary>
    public Density Density => Density.FromKilogramsPerCubicMeter(KilogramsPerCubicMetre);

    internal double Kelvins { get; }

    internal double PascalSeconds { get; }

    internal double MeanFreePathMetres { get; }

    internal double KilogramsPerCubicMetre { get; }

    /// <summary>Mean free path by Kim et al. (2005) and ISO 15900: 67.30 nm (T/296.15)² (p₀/p) (296.15 + 110.4)/(T + 110.4) (from memory).</summary>
    /// <remarks>Belongs with <see cref="SlipCorrection.Kim"/>; within 0.1 % of the one that the forecast uses.</remarks>
    public static Length MeanFreePathByKim(AirState state)
    {
        const double Reference = 296.15;
        var ratio = state.Temperature.Kelvins / Reference;
        return Length.FromNanometers(67.30 * ratio * ratio * (ReferencePascals / state.Pressure.Pascals) * (Reference + SutherlandKelvins) / (state.Temperature.Kelvins + SutherlandKelvins));
    }

    /// <summary>The properties of air in a state.</summary>
    /// <remarks>
    /// Viscosity by Sutherland's law, 1.458·10⁻⁶ T^1.5 / (T + 110.4), the same at 0.1 to 10 atm; mean free path
    /// λ = 66.4 nm (T/T₀)(p₀/p)(1 + 110/T₀)/(1 + 110/T), Willeke (1976); density as a mixture of ideal gases with the
    /// vapour pressure of Alduchov and Eskridge (1996), 610.94 exp(17.625 t / (t + 243.04)) Pa (constants from memory).
    /// Humidity changes viscosity by less than 1 % and is left out of it.
    /// </remarks>
    public static AirProperties Of(AirState state)
    {
        var kelvins = state.Temperature.Kelvins;
        var pascals = state.Pressure.Pascals;
        var viscosity = SutherlandCoefficient * Math.Pow(kelvins, 1.5) / (kelvins + SutherlandKelvins);
        var meanFreePath = ReferenceMeanFreePathMetres * (kelvins / ReferenceKelvins) * (ReferencePascals / pascals)
            * (1 + (WillekeKelvins / ReferenceKelvins)) / (1 + (WillekeKelvins / kelvins));
        var celsius = state.Temperature.DegreesCelsius;
        var saturation = 610.94 * Math.Exp(17.625 * celsius / (celsius + 243.04));
        var vapour = Math.Min(state.RelativeHumidity * saturation, pascals);
        var density = ((pascals - vapour) / (DryAirGasConstant * kelvins)) + (vapour / (VapourGasConstant * kelvins));
        return new AirProperties(
            state.Temperature,
            DynamicViscosity.FromNewtonSecondsPerMeterSquared(viscosity),
            Length.FromMeters(meanFreePath),
            Density.FromKilogramsPerCubicMeter(density));
    }
}
