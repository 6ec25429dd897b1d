using FiberScope.Filtration;
using FiberScope.Filtration.Correlations;

namespace FiberScope.Validation.Filtration.Sections;

/// <summary>The correlation sets, whole, against the reference: where they part from an even cell, shown and not tuned away.</summary>
internal static class SetSection
{
    private const double MapSolidity = 0.1;

    /// <summary>Stands for no diffusion; infinity itself would make 0 · ∞ in forms with slip.</summary>
    private const double NoDiffusion = 1e15;

    private static readonly (CorrelationSet Set, string Word)[] Sets =
    [
        (CorrelationSet.KirschStechkina1978, "kirsch-stechkina-1978"), (CorrelationSet.LeeLiu1982, "lee-liu-1982"),
        (CorrelationSet.Hinds1999, "hinds-1999"), (CorrelationSet.Cell, "cell"), (CorrelationSet.CellMat, "cell-mat"),
    ];

    public static void Write(MarkdownText text, ReferenceGrid grid)
    {
        text.Heading(3, "The correlation sets against the reference")
            .Paragraph($"Error in per cent of what a fibre takes out of the air (with the set's own 1/(1 − α) where it has one, and with the unevenness that it takes real mats to have). A published set is not wrong where it leaves the cell: its coefficients stand for real, uneven mats. Mean, and in brackets smallest and largest.");
        Table(text, "diffusion + interception, Pe 10–1e5, R ≤ 1, no slip", grid.Diffusion.Where(c => c is { Knudsen: 0, Peclet: >= 10 and <= 1e5, Ratio: <= 1 }));
        Table(text, "diffusion + interception, Pe ≤ 1", grid.Diffusion.Where(c => c is { Knudsen: 0, Peclet: <= 1, Ratio: <= 1 }));
        Table(text, "diffusion + interception, Kn 1, Pe 10–1e5", grid.Diffusion.Where(c => c is { Knudsen: 1, Peclet: >= 10 and <= 1e5, Ratio: <= 1 }));
        Table(text, "inertia + interception, Stk ≤ 0.1, no slip", grid.Inertia.Where(c => c is { Knudsen: 0, Stokes: <= 0.1, Ratio: <= 1 }));
        Table(text, "inertia + interception, Stk ≥ 0.3, no slip", grid.Inertia.Where(c => c is { Knudsen: 0, Stokes: >= 0.3, Ratio: <= 1 }));
        foreach (var (set, word) in Sets.Where(s => s.Set < CorrelationSet.Cell))
        {
            Map(text, set, $"set-{word}-diffusion", $"{word}, α 0.1, no inertia: error, %", ReferenceGrid.Peclets, "Peclet number", (pe, r) => grid.Diffusion.FirstOrDefault(c => c.Solidity == MapSolidity && c.Knudsen == 0 && c.Peclet == pe && c.Ratio == r));
            Map(text, set, $"set-{word}-inertia", $"{word}, α 0.1, no diffusion: error, %", ReferenceGrid.Stokeses, "Stokes number", (stk, r) => grid.Inertia.FirstOrDefault(c => c.Solidity == MapSolidity && c.Knudsen == 0 && c.Stokes == stk && c.Ratio == r));
        }
    }

    private static double Error(CorrelationSet set, ReferenceCase c)
    {
        var model = SingleFibreModel.Of(set);
        var fibre = model.Fibre(c.Solidity, c.Knudsen, 1);
        var encounter = new Encounter(Math.Min(c.Peclet, NoDiffusion), c.Ratio, c.Stokes);
        var efficiency = fibre.Limit(fibre.Collect(encounter).Total) / (model.CountsOpenVolumeOnly ? 1 - c.Solidity : 1);
        return (efficiency / c.Efficiency) - 1;
    }

    private static void Table(MarkdownText text, string name, IEnumerable<ReferenceCase> cases)
    {
        var all = cases.ToList();
        text.Table([name, .. ReferenceGrid.Solidities.Select(a => "α " + MarkdownText.Number(a))], Sets.Select(s => (IReadOnlyList<string>)
        [
            $"`{s.Word}`", .. ReferenceGrid.Solidities.Select(a =>
            {
                var errors = all.Where(c => c.Solidity == a).Select(c => Error(s.Set, c)).ToArray();
                return $"{MarkdownText.Signed(errors.Average())} ({MarkdownText.Signed(errors.Min())} … {MarkdownText.Signed(errors.Max())})";
            }),
        ]));
    }

    private static void Map(MarkdownText text, CorrelationSet set, string file, string title, double[] columns, string label, Func<double, double, ReferenceCase?> find)
    {
        var errors = new double[ReferenceGrid.Ratios.Length, columns.Length];
        for (var i = 0; i < ReferenceGrid.Ratios.Length; i++)
        {
            for (var j = 0; j < columns.Length; j++)
            {
                errors[i, j] = find(columns[j], ReferenceGrid.Ratios[i]) is { } found ? Error(set, found) : double.NaN;
            }
        }

        text.Picture(Figures.Save(Figures.ErrorMap(title, columns, ReferenceGrid.Ratios, errors, (label, "R = dp / df")), file), title);
    }
}
