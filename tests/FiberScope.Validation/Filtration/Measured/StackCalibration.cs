using FiberScope.Filtration;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.Optimization;
using UnitsNet;

namespace FiberScope.Validation.Filtration.Measured;

/// <summary>What single layers of a material teach together: how uneven it is, and its charge as received and laundered.</summary>
/// <param name="Set">The correlation set.</param>
/// <param name="Variation">Coefficient of variation of the local basis weight.</param>
/// <param name="OpenArea">Share of the area in holes.</param>
/// <param name="Charge">Charge density by treatment, C/m².</param>
/// <remarks>
/// The variation is held to what webs of this kind have (up to 0.4; common practice, no source): left free, the counting
/// noise of the largest sizes drives it to any bound. For the same reason only sizes below 2 µm are fitted, and what a row
/// shows above 1 counts as its own noise and lowers its weight.
/// </remarks>
internal sealed record StackCalibration(CorrelationSet Set, double Variation, double OpenArea, IReadOnlyDictionary<string, double> Charge)
{
    /// <summary>Through-holes of a point-bonded web; an assumption, as only what they let through is fitted.</summary>
    private const double HoleMetres = 2e-4;

    private const double LargestVariation = 0.4;
    private const double LargestOpenArea = 0.01;
    private const double LargestCharge = 6e-5;
    private const double LargestFittedMicrometres = 2;

    /// <summary>Scatter of a penetration between like rows of the source.</summary>
    private const double RowScatter = 0.04;

    /// <summary>Fits all single-layer rows of one material together.</summary>
    public static StackCalibration Fit(IReadOnlyList<MeasuredStack> single, CorrelationSet set)
    {
        var charged = single.Where(s => !s.IsDischarged).Select(s => s.Treatment).Distinct(StringComparer.Ordinal).ToList();
        StackCalibration From(Vector<double> x) => new(
            set,
            LargestVariation * Share(x[0]),
            LargestOpenArea * Share(x[1]),
            charged.Select((t, i) => (t, LargestCharge * Share(x[2 + i]))).ToDictionary(p => p.t, p => p.Item2, StringComparer.Ordinal));
        double Misfit(Vector<double> x) => single.AsParallel().AsOrdered().Select(s => From(x).Misfit(s)).ToArray().Sum();
        var best = new[] { -2.0, 1 }.Select(start =>
        {
            var first = Vector<double>.Build.Dense(2 + charged.Count, i => i == 0 ? start : -2);
            var result = NelderMeadSimplex.Minimum(ObjectiveFunction.Value(Misfit), first, 1e-2, 250);
            return (result.FunctionInfoAtMinimum.Value, Point: result.MinimizingPoint);
        }).MinBy(r => r.Value);
        return From(best.Point);
    }

    /// <summary>Penetration of a stack by this calibration; its diameter from its own pressure drop.</summary>
    public IReadOnlyList<double> Penetration(MeasuredStack stack)
    {
        var settings = UnfittedSection.Settings(Set);
        MediaLayer With(MediaLayer layer) => layer with
        {
            BasisWeightVariation = Variation,
            Holes = [new Pinholes(Length.FromMeters(HoleMetres), OpenArea)],
            Charge = Charge.TryGetValue(stack.Treatment, out var sigma) ? new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(sigma)) : null,
        };
        var diameter = stack.EffectiveDiameter(settings, With);
        return [.. MediaModel.Forecast(stack.Build(diameter, With), stack.Point, settings).Curve.Select(c => c.Penetration)];
    }

    private double Misfit(MeasuredStack stack)
    {
        var excess = stack.Penetration.Average(p => Math.Pow(Math.Max(0, p - 1), 2));
        var variance = (RowScatter * RowScatter) + excess;
        return Penetration(stack).Zip(stack.Penetration, stack.Micrometres).Where(p => p.Third < LargestFittedMicrometres)
            .Sum(p => Math.Log(1 + (Math.Pow(p.First - Math.Min(p.Second, 1), 2) / (2 * variance))));
    }

    private static double Share(double x) => 1 / (1 + Math.Exp(-x));
}
