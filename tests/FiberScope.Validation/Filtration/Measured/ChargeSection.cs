using FiberScope.Filtration;
using MathNet.Numerics;
using UnitsNet;

namespace FiberScope.Validation.Filtration.Measured;

/// <summary>The charge that the difference between charged and discharged penetration speaks of.</summary>
internal static class ChargeSection
{
    internal static readonly (string Charged, string Discharged)[] Pairs =
    [
        ("as received", "discharged (isopropanol)"), ("laundered", "laundered and discharged (isopropanol)"),
    ];

    /// <summary>Scatter of a penetration between like rows of the source.</summary>
    private const double RowScatter = 0.03;

    private const double LargestCharge = 2e-4;

    public static void Write(MarkdownText text, IReadOnlyList<MeasuredStack> stacks)
    {
        text.Heading(3, "Charge from the pair as received and discharged")
            .Paragraph($"The charge density at which the model adds to −ln P what was lost on discharging, at each size from 0.33 to 1.21 µm: the median over the sizes, and as uncertainty the larger of the spread between the sizes (as a standard deviation of the median) and a scatter of {RowScatter} in either penetration. One charge should serve every size, and did where the spread is small. Fibre permittivity 2.3, particle permittivity 6.1, particles at charge equilibrium (assumed); what is inferred hangs on that last assumption.")
            .Table(["medium", "layers", "pair", "`kirsch-stechkina-1978`, µC/m²", "`cell-mat`, µC/m²"], Rows(stacks));
    }

    private static IEnumerable<IReadOnlyList<string>> Rows(IReadOnlyList<MeasuredStack> stacks) =>
        from pair in Pairs
        from charged in stacks
        where charged.Treatment == pair.Charged
        let discharged = stacks.FirstOrDefault(s => s.Material == charged.Material && s.Layers == charged.Layers && s.Treatment == pair.Discharged)
        where discharged is not null
        select (IReadOnlyList<string>)
        [
            charged.Material, MarkdownText.Number(charged.Layers), $"{pair.Charged} / {pair.Discharged}",
            Text(Infer(charged, discharged, CorrelationSet.KirschStechkina1978)), Text(Infer(charged, discharged, CorrelationSet.CellMat)),
        ];

    private static string Text((double Charge, double Uncertainty, int Sizes) inferred) => inferred.Sizes < 3
        ? "no charge to be seen"
        : FormattableString.Invariant($"{1e6 * inferred.Charge:0.0} ± {1e6 * inferred.Uncertainty:0.0}");

    private static (double Charge, double Uncertainty, int Sizes) Infer(MeasuredStack charged, MeasuredStack discharged, CorrelationSet set)
    {
        var settings = UnfittedSection.Settings(set);
        var diameter = charged.EffectiveDiameter(settings);
        double[] Attenuation(double sigma) => [.. MediaModel.Forecast(charged.Build(diameter, l => l with { Charge = new FibreCharge(ElectricSurfaceChargeDensity.FromCoulombsPerSquareMeter(sigma)) }), charged.Point, settings).Curve.Select(c => -Math.Log(c.Penetration))];
        var nodes = Generate.LogSpaced(30, -7, Math.Log10(LargestCharge));
        var bare = Attenuation(0);
        var curves = nodes.Select(Attenuation).ToArray();
        var found = new List<(double Charge, double Uncertainty)>();
        for (var i = 0; i < charged.Micrometres.Length; i++)
        {
            var added = Math.Log(Math.Min(1, discharged.Penetration[i]) / charged.Penetration[i]);
            if (MeasuredStack.IsJudged(charged.Micrometres[i]) && added > 0)
            {
                var line = Interpolate.Linear([0, .. curves.Select(c => c[i] - bare[i])], [0, .. nodes]);
                var noise = RowScatter * Math.Sqrt(Math.Pow(1 / charged.Penetration[i], 2) + Math.Pow(1 / discharged.Penetration[i], 2));
                found.Add((line.Interpolate(added), 0.5 * (line.Interpolate(added + noise) - line.Interpolate(Math.Max(0, added - noise)))));
            }
        }

        if (found.Count < 3)
        {
            return (0, 0, found.Count);
        }

        var median = MathNet.Numerics.Statistics.Statistics.Median(found.Select(f => f.Charge));
        var spread = 1.253 * MathNet.Numerics.Statistics.Statistics.StandardDeviation(found.Select(f => f.Charge)) / Math.Sqrt(found.Count);
        return (median, Math.Max(spread, MathNet.Numerics.Statistics.Statistics.Median(found.Select(f => f.Uncertainty))), found.Count);
    }
}
