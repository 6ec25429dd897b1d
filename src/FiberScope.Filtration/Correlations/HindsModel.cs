using FiberScope.Filtration.Drag;
using FiberScope.Filtration.Mechanisms;
using FiberScope.Statistics;

namespace FiberScope.Filtration.Correlations;

/// <summary>The textbook set: Hinds (1999), Aerosol Technology, 2nd ed., eqs. 9.21–9.36 (from memory).</summary>
/// <remarks>
/// 2 Pe^−⅔ + A R² / (1 + R) + 1.24 R^⅔ (Ku Pe)^−½ + Stk J / (2 Ku²), with 1 / (1 − α) in −ln P, and Davies' (1952) drag; no slip at the
/// fibre. Impaction is capped where it would collect more than what touches the fibre, 1 + R − E_R.
/// </remarks>
internal sealed class HindsModel : SingleFibreModel
{
    public override CorrelationSet Set => CorrelationSet.Hinds1999;

    public override ApplicableRange Range { get; } = new(
        "Hinds (1999), chapter 9", new Interval(0.0035, 0.2), new Interval(0.5e-6, 50e-6), new Interval(0.01e-6, 10e-6), new Interval(0.005, 2), 0.25);

    public override bool CountsOpenVolumeOnly => true;

    public override double DragFactor(double solidity, double fibreKnudsen, double unevenness) => DragLaw.Davies(solidity) / unevenness;

    public override SingleFibre Fibre(double solidity, double fibreKnudsen, double unevenness) => new TextbookFibre(solidity, unevenness);

    private sealed class TextbookFibre(double solidity, double unevenness) : SingleFibre
    {
        /// <summary>A sharp bend: the published sum is left as it is until it nears all the air of the cell.</summary>
        private const double Sharpness = 8;

        private readonly double _wallFactor = KuwabaraCell.WallFactor(solidity);
        private readonly double _inverseKuwabara = 1 / KuwabaraCell.HydrodynamicFactor(solidity);
        private readonly double _share = 1 / unevenness;

        public override MechanismEfficiencies Collect(in Encounter encounter)
        {
            var interception = Interception.Textbook(_wallFactor, encounter.Ratio);
            var room = Math.Max(0, 1 + encounter.Ratio - interception);
            return new MechanismEfficiencies
            {
                Diffusion = _share * Diffusion.Hinds(encounter.Peclet),
                Interception = _share * interception,
                DiffusionInterception = _share * Diffusion.WithInterception(_inverseKuwabara, encounter.Peclet, encounter.Ratio),
                Impaction = Math.Clamp(Impaction.Hinds(solidity, encounter.Ratio, encounter.Stokes), 0, room),
            };
        }

        public override double Limit(double efficiency) => Saturation.Limit(efficiency, solidity, Sharpness);
    }
}
