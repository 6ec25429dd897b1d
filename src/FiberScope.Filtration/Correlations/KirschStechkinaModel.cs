using FiberScope.Filtration.Drag;
using FiberScope.Filtration.Mechanisms;
using FiberScope.Statistics;

namespace FiberScope.Filtration.Correlations;

/// <summary>The fan model with an inhomogeneity factor ε that divides drag and non-inertial efficiency alike.</summary>
/// <remarks>
/// Kirsch and Stechkina (1978), in Shaw (ed.), Fundamentals of Aerosol Science, ch. 4 (from memory); that ε ties efficiency to
/// resistance: Kirsch, Stechkina and Fuchs (1973). Without a measured pressure drop ε is the one that turns the fan model's drag into
/// Davies' law for real pads. No (1 − α) in −ln P: the speed of the fan model is the face velocity.
/// </remarks>
internal sealed class KirschStechkinaModel : SingleFibreModel
{
    public override CorrelationSet Set => CorrelationSet.KirschStechkina1978;

    public override ApplicableRange Range { get; } = new(
        "Kirsch and Stechkina (1978)", new Interval(0.01, 0.3), new Interval(0.1e-6, 30e-6), new Interval(0.01e-6, 10e-6), new Interval(0.005, 2), 1);

    public override bool CountsOpenVolumeOnly => false;

    /// <summary>ε of a mat that obeys Davies' law: fan drag over Davies' drag, both without slip.</summary>
    public static double DaviesInhomogeneity(double solidity) => DragLaw.Fan(solidity) / DragLaw.Davies(solidity);

    public override double DragFactor(double solidity, double fibreKnudsen, double unevenness) =>
        DragLaw.Fan(solidity, fibreKnudsen) / (DaviesInhomogeneity(solidity) * unevenness);

    public override SingleFibre Fibre(double solidity, double fibreKnudsen, double unevenness) =>
        new FanFibre(solidity, fibreKnudsen, DaviesInhomogeneity(solidity) * unevenness);

    private sealed class FanFibre(double solidity, double fibreKnudsen, double inhomogeneity) : SingleFibre
    {
        private const double Sharpness = 2.1;

        private readonly double _fanFactor = DragLaw.FanFactor(solidity, fibreKnudsen);
        private readonly double _share = 1 / inhomogeneity;

        public override MechanismEfficiencies Collect(in Encounter encounter)
        {
            var pe = encounter.Peclet;
            var diffusion = (Diffusion.Fan(pe) * Diffusion.FanSlip(_fanFactor, pe, fibreKnudsen)) + Diffusion.SecondTerm(pe);
            return new MechanismEfficiencies
            {
                Diffusion = _share * diffusion,
                Interception = _share * Interception.Fan(_fanFactor, encounter.Ratio, fibreKnudsen),
                DiffusionInterception = _share * Diffusion.WithInterception(1 / _fanFactor, pe, encounter.Ratio),
                Impaction = Impaction.TrajectoryFit(solidity, encounter.Ratio, encounter.Stokes),
            };
        }

        public override double Limit(double efficiency) => Saturation.Limit(efficiency, solidity, Sharpness);
    }
}
