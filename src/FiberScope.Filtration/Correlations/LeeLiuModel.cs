using FiberScope.Filtration.Drag;
using FiberScope.Filtration.Mechanisms;
using FiberScope.Statistics;

namespace FiberScope.Filtration.Correlations;

/// <summary>Lee and Liu (1982), Aerosol Sci. Technol. 1(2), 147: coefficients fitted to measured polyester mats (from memory).</summary>
/// <remarks>
/// 1.6 A^⅓ Pe^−⅔ + 0.6 A R² / (1 + R), with 1 / (1 − α) in −ln P, and Davies' (1952) drag; no slip at the fibre, no inertia. Familiar and
/// careful: it collects about half of what the ideal cell does. Fitted range from memory: α 0.0086 to 0.151, particles 0.05 to 1.3 µm,
/// 1 to 30 cm/s; the fibres were 11 µm and coarser.
/// </remarks>
internal sealed class LeeLiuModel : SingleFibreModel
{
    public override CorrelationSet Set => CorrelationSet.LeeLiu1982;

    public override ApplicableRange Range { get; } = new(
        "Lee and Liu (1982)", new Interval(0.0086, 0.151), new Interval(1e-6, 20e-6), new Interval(0.05e-6, 1.3e-6), new Interval(0.01, 0.3), 0.1);

    public override bool CountsOpenVolumeOnly => true;

    public override double DragFactor(double solidity, double fibreKnudsen, double unevenness) => DragLaw.Davies(solidity) / unevenness;

    public override SingleFibre Fibre(double solidity, double fibreKnudsen, double unevenness) => new MatFibre(solidity, unevenness);

    private sealed class MatFibre(double solidity, double unevenness) : SingleFibre
    {
        /// <summary>A sharp bend: the published sum is left as it is until it nears all the air of the cell.</summary>
        private const double Sharpness = 8;

        private readonly double _wallFactor = KuwabaraCell.WallFactor(solidity);
        private readonly double _share = 1 / unevenness;

        public override MechanismEfficiencies Collect(in Encounter encounter) => new()
        {
            Diffusion = _share * Diffusion.LeeLiu(_wallFactor, encounter.Peclet),
            Interception = _share * Interception.LeeLiu(_wallFactor, encounter.Ratio),
        };

        public override double Limit(double efficiency) => Saturation.Limit(efficiency, solidity, Sharpness);
    }
}
