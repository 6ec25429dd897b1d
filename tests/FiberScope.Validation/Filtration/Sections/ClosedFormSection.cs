using FiberScope.Filtration.Cell;
using FiberScope.Filtration.Mechanisms;

namespace FiberScope.Validation.Filtration.Sections;

/// <summary>Each closed form by itself against the reference.</summary>
internal static class ClosedFormSection
{
    private sealed record Form(string Name, Func<ReferenceCase, double> Value);

    private static readonly Form[] DiffusionForms =
    [
        new("2.892 A^⅓ Pe^−⅔ (boundary layer)", c => Diffusion.BoundaryLayer(KuwabaraCell.WallFactor(c.Solidity), c.Peclet)),
        new("the same + 0.624/Pe", c => Diffusion.BoundaryLayer(KuwabaraCell.WallFactor(c.Solidity), c.Peclet) + Diffusion.SecondTerm(c.Peclet)),
        new("Lee and Liu 1.6 A^⅓ Pe^−⅔", c => Diffusion.LeeLiu(KuwabaraCell.WallFactor(c.Solidity), c.Peclet)),
        new("Hinds 2 Pe^−⅔", c => Diffusion.Hinds(c.Peclet)),
        new("fan 2.7 Pe^−⅔", c => Diffusion.Fan(c.Peclet)),
        new("estimate behind the tables", c => BoundaryLayerEstimate.DiffusionInterception(new KuwabaraFlow(c.Solidity, 0), c.Peclet, 0)),
    ];

    private static readonly Form[] InterceptionForms =
    [
        new("A R²/(1+R) (Hinds)", c => Interception.Textbook(KuwabaraCell.WallFactor(c.Solidity), c.Ratio)),
        new("0.6 A R²/(1+R) (Lee and Liu)", c => Interception.LeeLiu(KuwabaraCell.WallFactor(c.Solidity), c.Ratio)),
        new("Lee and Gieseke", c => Interception.LeeGieseke(c.Solidity, c.Ratio)),
        new("fan", c => Interception.Fan(FiberScope.Filtration.Drag.DragLaw.FanFactor(c.Solidity), c.Ratio, 0)),
    ];

    private static readonly Form[] ImpactionForms =
    [
        new("trajectory fit + exact interception", c => Exact(c) + Impaction.TrajectoryFit(c.Solidity, c.Ratio, c.Stokes)),
        new("Hinds J(R), held at 1 + R, + exact interception", c => Math.Min(Exact(c) + Impaction.Hinds(c.Solidity, c.Ratio, c.Stokes), 1 + c.Ratio)),
        new("interception alone", Exact),
    ];

    public static void Write(MarkdownText text, ReferenceGrid grid)
    {
        text.Heading(3, "Closed forms against the reference")
            .Paragraph($"Error in per cent by solidity: mean over the other inputs, and in brackets the smallest and the largest. Positive is too much collected. Solidity 0.01–0.3, Pe 0.1–1e6, R 0.01–2 where the particle fits in the cell, Stk 0.01–10, no slip.");
        Table(text, "diffusion, R = 0, Pe ≥ 10", DiffusionForms, grid.Diffusion.Where(c => c is { Ratio: 0, Knudsen: 0, Peclet: >= 10 }));
        Table(text, "diffusion, R = 0, Pe ≤ 1", DiffusionForms, grid.Diffusion.Where(c => c is { Ratio: 0, Knudsen: 0, Peclet: <= 1 }));
        Table(text, "interception", InterceptionForms, InterceptionCases());
        Table(text, "inertia with interception", ImpactionForms, grid.Inertia.Where(c => c.Knudsen == 0));
        Slip(text, grid);
        Maps(text, grid);
    }

    private static double Exact(ReferenceCase c) => KuwabaraCell.ExactInterception(c.Solidity, c.Ratio);

    private static IEnumerable<ReferenceCase> InterceptionCases(double knudsen = 0) =>
        from alpha in ReferenceGrid.Solidities
        let flow = new Reference.CellFlow(alpha, knudsen)
        from ratio in ReferenceGrid.Ratios
        where 1 + ratio < flow.Rim
        select new ReferenceCase(alpha, knudsen, double.PositiveInfinity, ratio, 0, flow.Interception(ratio));

    private static void Table(MarkdownText text, string name, Form[] forms, IEnumerable<ReferenceCase> cases)
    {
        var all = cases.ToList();
        text.Table([name, .. ReferenceGrid.Solidities.Select(a => "α " + MarkdownText.Number(a))], forms.Select(form => (IReadOnlyList<string>)
        [
            form.Name, .. ReferenceGrid.Solidities.Select(a => Cell([.. all.Where(c => c.Solidity == a).Select(c => (form.Value(c) / c.Efficiency) - 1)])),
        ]));
    }

    private static string Cell(double[] errors) =>
        errors.Length == 0 ? "–" : $"{MarkdownText.Signed(errors.Average())} ({MarkdownText.Signed(errors.Min())} … {MarkdownText.Signed(errors.Max())})";

    private static void Slip(MarkdownText text, ReferenceGrid grid)
    {
        Form[] diffusion =
        [
            new("first-order factor on the boundary layer + 0.624/Pe", c => (Diffusion.BoundaryLayer(KuwabaraCell.WallFactor(c.Solidity), c.Peclet) * Diffusion.FirstOrderSlip(KuwabaraCell.WallFactor(c.Solidity), c.Peclet, c.Knudsen)) + Diffusion.SecondTerm(c.Peclet)),
            new("estimate behind the tables", c => BoundaryLayerEstimate.DiffusionInterception(new KuwabaraFlow(c.Solidity, c.Knudsen), c.Peclet, 0)),
        ];
        Form[] interception =
        [
            new("first-order factor on exact interception", c => Exact(c) * Interception.FirstOrderSlip(c.Ratio, c.Knudsen)),
            new("fan with its own slip", c => Interception.Fan(FiberScope.Filtration.Drag.DragLaw.FanFactor(c.Solidity, c.Knudsen), c.Ratio, c.Knudsen)),
        ];
        foreach (var knudsen in ReferenceGrid.Knudsens.Where(k => k > 0))
        {
            var kn = MarkdownText.Number(knudsen);
            Table(text, $"slip at Kn {kn}: diffusion, R = 0, Pe ≥ 10", diffusion, grid.Diffusion.Where(c => c.Knudsen == knudsen && c is { Ratio: 0, Peclet: >= 10 }));
            Table(text, $"slip at Kn {kn}: interception", interception, InterceptionCases(knudsen));
        }
    }

    private static void Maps(MarkdownText text, ReferenceGrid grid)
    {
        Map(text, grid.Diffusion.Where(c => c is { Ratio: 0, Knudsen: 0 }), DiffusionForms[1], "form-diffusion", "Boundary layer + 0.624/Pe, R = 0: error, %", ReferenceGrid.Peclets, c => c.Peclet, "Peclet number");
        Map(text, grid.Inertia.Where(c => c is { Knudsen: 0, Ratio: 0.1 }), ImpactionForms[0], "form-impaction-fit", "Trajectory fit, R = 0.1: error, %", ReferenceGrid.Stokeses, c => c.Stokes, "Stokes number");
        Map(text, grid.Inertia.Where(c => c is { Knudsen: 0, Ratio: 0.1 }), ImpactionForms[1], "form-impaction-hinds", "Hinds J(R), R = 0.1: error, %", ReferenceGrid.Stokeses, c => c.Stokes, "Stokes number");
    }

    private static void Map(MarkdownText text, IEnumerable<ReferenceCase> cases, Form form, string file, string title, double[] columns, Func<ReferenceCase, double> column, string label)
    {
        var all = cases.ToList();
        var errors = new double[ReferenceGrid.Solidities.Length, columns.Length];
        for (var i = 0; i < ReferenceGrid.Solidities.Length; i++)
        {
            for (var j = 0; j < columns.Length; j++)
            {
                var found = all.FirstOrDefault(c => c.Solidity == ReferenceGrid.Solidities[i] && column(c) == columns[j]);
                errors[i, j] = found is null ? double.NaN : (form.Value(found) / found.Efficiency) - 1;
            }
        }

        text.Picture(Figures.Save(Figures.ErrorMap(title, columns, ReferenceGrid.Solidities, errors, (label, "solidity")), file), title);
    }
}
