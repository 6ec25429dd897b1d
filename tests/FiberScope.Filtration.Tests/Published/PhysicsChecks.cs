using FiberScope.Fibres;
using FiberScope.Filtration.Drag;
using FiberScope.Filtration.Mechanisms;
using UnitsNet;
using static FiberScope.Filtration.Tests.Media;

namespace FiberScope.Filtration.Tests.Published;

/// <summary>Finds, by the name of a check, the calculation that must give its output.</summary>
internal static class PhysicsChecks
{
    /// <summary>Results of solving the cell numerically: closed forms only come near them, within the bounds of their own tests.</summary>
    public static readonly IReadOnlySet<string> NumericalReference = new HashSet<string>(StringComparer.Ordinal)
    {
        "cell_numeric_E_diffusion_interception", "cell_numeric_E_diffusion_fluxBC", "cell_numeric_E_inertia_interception",
        "cell_numeric_E_inertia_interception_gasstart", "cell_numeric_E_polarisation", "cell_numeric_E_slip", "analytic_low_Stk_slope",
    };

    public static readonly IReadOnlyDictionary<string, Func<PhysicsCheck, double>> Evaluators = new Dictionary<string, Func<PhysicsCheck, double>>(StringComparer.Ordinal)
    {
        ["air_viscosity_1.458e-6"] = c => State(c).Properties.Viscosity.NewtonSecondsPerMeterSquared,
        ["air_viscosity_20C_textbook"] = c => State(c).Properties.Viscosity.NewtonSecondsPerMeterSquared,
        ["mean_free_path_willeke"] = c => State(c).Properties.MeanFreePath.Meters * c["lambda0_m"] / 66.4e-9,
        ["mean_free_path_20C_textbook"] = c => State(c).Properties.MeanFreePath.Meters,
        ["mean_free_path_kim2005"] = c => AirProperties.MeanFreePathByKim(State(c)).Meters,
        ["ISA_lambda"] = c => StandardAtmosphere(c["h_m"]).Properties.MeanFreePath.Meters,
        ["moist_air_density_20C"] = c => new AirState(Temperature.FromDegreesCelsius(20), Pressure.FromPascals(c["p_Pa"]), c["RH_pct"] / 100).Properties.Density.KilogramsPerCubicMeter,
        ["Cc_kim_2005"] = c => SlipCorrection.Kim(2 * c["lambda_m"] / c["d_m"]),
        ["Cc_hinds_3.20"] = c => SlipCorrection.Hinds(2 * c["lambda_m"] / c["d_m"]),
        ["Cc_allen_raabe_1985_solid"] = c => SlipCorrection.AllenRaabe(2 * c["lambda_m"] / c["d_m"]),
        ["Cc_1um_Tan_course"] = c => SlipCorrection.AllenRaabe(2 * c["lambda_m"] / c["d_m"]),
        ["diffusion_coefficient"] = c => TextbookParticle(c).DiffusionCoefficient.SquareMetersPerSecond,
        ["D_hinds_table7.1"] = c => TextbookParticle(c).DiffusionCoefficient.SquareMetersPerSecond,
        ["settling_velocity"] = c => TextbookParticle(c).SettlingVelocity.MetersPerSecond,
        ["VTS_hinds_A11"] = c => TextbookParticle(c).SettlingVelocity.MetersPerSecond,
        ["boltzmann_mean_abs_charge"] = c => EquilibriumCharge.BoltzmannMean(Length.FromMeters(c["d_m"]), Temperature.FromKelvins(c["T_K"])),
        ["boltzmann_mean_abs_charge_hinds_15.4"] = c => EquilibriumCharge.BoltzmannMean(Length.FromMeters(c["d_m"]), Temperature.FromKelvins(293.15)),
        ["dimensionless_drag_davies_1952"] = c => DragLaw.Davies(c["alpha"]),
        ["dimensionless_drag_kuwabara"] = c => DragLaw.Kuwabara(c["alpha"]),
        ["dimensionless_drag_fan_kirsch_fuchs"] = c => DragLaw.Fan(c["alpha"]),
        ["dimensionless_drag_drummond_tahir_square_transverse"] = c => DragLaw.DrummondTahir(c["alpha"]),
        ["dimensionless_drag_spielman_goren_layered"] = c => BrinkmanMat.Layered(c["alpha"]),
        ["dimensionless_drag_spielman_goren_3D"] = c => BrinkmanMat.RandomInSpace(c["alpha"]),
        ["dimensionless_drag_happel_cell"] = c => DragLaw.Happel(c["alpha"]),
        ["dimensionless_drag_jackson_james"] = c => DragLaw.JacksonJames(c["alpha"]),
        ["Ku"] = c => KuwabaraCell.HydrodynamicFactor(c["alpha"]),
        ["E_R_kuwabara_exact"] = c => KuwabaraCell.ExactInterception(c["alpha"], c["R"]),
        ["slip_ratio_kuwabara_first_order"] = c => DragLaw.Kuwabara(c["alpha"], c["Kn_f"]) / DragLaw.Kuwabara(c["alpha"]),
        ["slip_ratio_fan"] = c => DragLaw.Fan(c["alpha"], c["Kn_f"]) / DragLaw.Fan(c["alpha"]),
        ["chain_minus_lnP_at_0.3um"] = c => Chains.MinusLogP(c, c["dp_m"]),
        ["chain_mpps"] = Chains.MostPenetratingMetres,
        ["dP_davies_fan_slip"] = c => MediaModel.PressureDropAt([Single(c)], At(c["U"]), Speed.FromMetersPerSecond(c["U"])).Pascals,
        ["dP_davies_hinds9.36"] = c => DragLaw.Davies(c["alpha"]) * c["mu"] * c["U"] * c["t_m"] / (c["df_m"] * c["df_m"]),
        ["hinds_example_E_D_hinds9.27"] = c => new TextbookExample(c).Diffusion,
        ["hinds_example_E_R_hinds9.21"] = c => new TextbookExample(c).Interception,
        ["hinds_example_E_DR_hinds9.28"] = c => new TextbookExample(c).Joint,
        ["hinds_example_E_I_hinds9.24"] = c => new TextbookExample(c).Impaction,
        ["hinds_example_E_sum"] = c => new TextbookExample(c).Sum,
        ["hinds_example_P_hinds_1-alpha"] = c => new TextbookExample(c).Penetration,
        ["mpps_lee_liu_1980"] = c => LeeLiuClosedForm.MostPenetratingSize(Length.FromMeters(c["df_m"]), new Solidity(c["alpha"]), Speed.FromMetersPerSecond(c["U"]), GivenAir(c)).Meters,
        ["Emin_lee_liu_1980"] = c => LeeLiuClosedForm.LeastEfficiency(Length.FromMeters(c["df_m"]), new Solidity(c["alpha"]), Speed.FromMetersPerSecond(c["U"]), GivenAir(c)),
        ["mpps_numeric_1.6_0.6"] = c => MediaModel.Forecast([Layer(c["df_m"], c["alpha"], 1e-3)], At(c["U"]), By(CorrelationSet.LeeLiu1982)).MostPenetratingSize!.Value.Meters,
        ["hatch_choate_MMD"] = c => HatchChoate.Median(Length.FromMeters(c["CMD_m"]), c["GSD"], 3).Meters,
        ["hatch_choate_qMD"] = c => HatchChoate.Median(Length.FromMeters(c["CMD_m"]), c["GSD"], c["q"]).Meters,
        ["fraction_below_100nm_count_NaCl"] = c => ShareBelow100Nanometres(c, 0),
        ["fraction_below_100nm_mass_NaCl"] = c => ShareBelow100Nanometres(c, 3),
        ["fraction_below_100nm_count_DOP"] = c => ShareBelow100Nanometres(c, 0),
        ["fraction_below_100nm_mass_DOP"] = c => ShareBelow100Nanometres(c, 3),
        ["fraction_below_100nm_count_exact_DOP"] = c => ShareBelow100Nanometres(c, 0),
        ["fraction_below_100nm_mass_exact_DOP"] = c => ShareBelow100Nanometres(c, 3),
        ["polydisperse_penetration_NaCl"] = Chains.OfAnAerosol,
        ["lognormal_moment_ratio"] = c => Chains.SquareRootMoment(c["CMD_m"], c["GSD"], c["weight_exponent"]),
        ["mie_Qsca"] = c => LightScattering.Efficiency(Math.PI * c["d_m"] / c["wavelength_m"], c["m"]),
        ["pinhole_flow_orifice"] = c => Hole(c, 1 / (c["Cd"] * c["Cd"]), 1e-12),
        ["pinhole_flow_combined"] = c => Hole(c, c["K"], c["mu"]),
        ["pinhole_flow_viscous"] = c => Hole(c, 1e-9, c["mu"]),
        ["bypass_mixing"] = c => Leakage.Total(c["P_media"], c["leak_fraction"]),
        ["face_velocity_32Lpm_100cm2"] = c => (VolumeFlow.FromLitersPerMinute(c["Q_Lpm"]) / Area.FromSquareCentimeters(c["A_cm2"])).MetersPerSecond,
        ["solidity_from_basis_weight"] = c => Solidity.FromWeighing(AreaDensity.FromKilogramsPerSquareMeter(c["W_kg_m2"]), Density.FromKilogramsPerCubicMeter(c["rho_f"]), Length.FromMeters(c["t_m"])).Fraction,
        ["specific_surface_to_df"] = c => EffectiveDiameter.FromSpecificSurface(ReciprocalLength.FromInverseMeters(c["S_per_fibre_volume_1/m"])).Meters,
        ["fibre_lognormal_mean_number_mean"] = c => HatchChoate.MeanOfPower(Length.FromMeters(c["CMD_m"]), c["GSD"], 1).Meters,
        ["fibre_lognormal_mean_harmonic_mean"] = c => HatchChoate.MeanOfPower(Length.FromMeters(c["CMD_m"]), c["GSD"], -1).Meters,
        ["polydisperse_fibre_minus_lnP"] = c => Chains.OfAFibreDistribution(c),
        ["iso16890_weights_ePM10"] = _ => throw new InvalidOperationException("A list: see its own test."),
    };

    internal static AirState AirAt(double kelvins, double pascals = 101_325) => new(Temperature.FromKelvins(kelvins), Pressure.FromPascals(pascals), 0);

    internal static AirProperties GivenAir(PhysicsCheck c) => new(
        Temperature.FromKelvins(c.Or("T_K", 293.15)),
        DynamicViscosity.FromNewtonSecondsPerMeterSquared(c.Or("mu", 1.81e-5)),
        Length.FromMeters(c.Or("lambda_m", 66e-9)),
        Density.FromKilogramsPerCubicMeter(c.Or("rho", 1.2)));

    internal static MediaLayer Single(PhysicsCheck c) => Layer(c["df_m"], c["alpha"], c["t_m"]);

    private static AirState State(PhysicsCheck c) => AirAt(c["T_K"], c.Or("p_Pa", 101_325));

    private static Particle TextbookParticle(PhysicsCheck c) => new(
        Length.FromMeters(c["d_m"]),
        Density.FromKilogramsPerCubicMeter(c.Or("rho", 1000)),
        new AirProperties(Temperature.FromKelvins(c.Or("T_K", 293.15)), DynamicViscosity.FromNewtonSecondsPerMeterSquared(c.Or("mu", 1.81e-5)), Length.FromNanometers(66), Density.FromKilogramsPerCubicMeter(1.2)),
        SlipCorrection.Hinds);

    /// <summary>International Standard Atmosphere below 11 km: 288.15 K − 6.5 K/km, pressure to the power 5.2559.</summary>
    private static AirState StandardAtmosphere(double altitude)
    {
        var kelvins = 288.15 - (0.0065 * altitude);
        return AirAt(kelvins, 101_325 * Math.Pow(kelvins / 288.15, 5.25588));
    }

    private static double ShareBelow100Nanometres(PhysicsCheck c, double exponent)
    {
        var median = HatchChoate.Median(Length.FromMeters(c["CMD_m"]), c["GSD"], exponent);
        return MathNet.Numerics.Distributions.Normal.CDF(0, 1, Math.Log(100e-9 / median.Meters) / Math.Log(c["GSD"]));
    }

    private static double Hole(PhysicsCheck c, double lossFactor, double viscosity) => Pinholes.Flow(
        Length.FromMeters(c["D_m"]),
        Length.FromMeters(c.Or("L_m", 0)),
        Pressure.FromPascals(c["dP_Pa"]),
        new AirProperties(Temperature.FromKelvins(293.15), DynamicViscosity.FromNewtonSecondsPerMeterSquared(viscosity), Length.FromNanometers(66), Density.FromKilogramsPerCubicMeter(c.Or("rho", 1.2))),
        lossFactor).CubicMetersPerSecond;
}
