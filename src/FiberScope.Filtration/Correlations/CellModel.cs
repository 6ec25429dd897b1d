using FiberScope.Filtration.Cell;
using FiberScope.Filtration.Drag;
using FiberScope.Statistics;

namespace FiberScope.Filtration.Correlations;

/// <summary>The numerical solution of the Kuwabara cell with slip, as it stands or as uneven as Davies' law says real mats are.</summary>
/// <remarks>
/// As it stands it is an even array of parallel fibres across the flow: nothing is fitted to media, and drag and efficiency of
/// a mat of known fibre diameters come out too high together. Divided, both alike, by the cell's drag over Davies' law it is
/// tied to real pads, as the fan model is by its ε. No (1 − α) in −ln P: the cell's speed is the face velocity.
/// </remarks>
/// <param name="realMat">Whether the cell's unevenness is that of real mats.</param>
internal sealed class CellModel(bool realMat) : SingleFibreModel
{
    public override CorrelationSet Set => realMat ? CorrelationSet.CellMat : CorrelationSet.Cell;

    public override ApplicableRange Range { get; } = new(
        realMat ? "the cell solution tied to Davies' law" : "the cell solution",
        new Interval(0.005, 0.3), new Interval(0.2e-6, 50e-6), new Interval(0.01e-6, 10e-6), new Interval(0.005, 5), 0.25);

    public override bool CountsOpenVolumeOnly => false;

    public override double DragFactor(double solidity, double fibreKnudsen, double unevenness) =>
        new KuwabaraFlow(solidity, fibreKnudsen).PressureDropFactor / Unevenness(solidity, unevenness);

    public override SingleFibre Fibre(double solidity, double fibreKnudsen, double unevenness) =>
        new CellFibre(new CellSolution(solidity, fibreKnudsen), Unevenness(solidity, unevenness));

    private double Unevenness(double solidity, double further) => realMat
        ? further * new KuwabaraFlow(solidity, 0).PressureDropFactor / DragLaw.Davies(solidity)
        : further;

    private sealed class CellFibre(CellSolution cell, double unevenness) : SingleFibre
    {
        private readonly double _share = 1 / unevenness;

        public override MechanismEfficiencies Collect(in Encounter encounter)
        {
            var (peclet, ratio, stokes) = (encounter.Peclet, encounter.Ratio, encounter.Stokes);
            var total = cell.Efficiency(peclet, ratio, stokes);
            var withoutInertia = cell.DiffusionInterception(peclet, ratio);

            // Weak inertia takes away a little of what diffusion and interception bring; it has no share of its own then.
            var kept = withoutInertia > 0 ? Math.Min(1, total / withoutInertia) : 1;
            var interception = cell.Flow.Interception(ratio);
            var diffusion = Math.Min(cell.DiffusionInterception(peclet, 0), withoutInertia - interception);
            return new MechanismEfficiencies
            {
                Diffusion = _share * kept * diffusion,
                Interception = _share * kept * interception,
                DiffusionInterception = _share * kept * (withoutInertia - interception - diffusion),
                Impaction = Math.Max(0, total - withoutInertia),
            };
        }

        public override double Limit(double efficiency) => Math.Min(efficiency, cell.Flow.Rim);
    }
}
