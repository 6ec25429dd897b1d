using FiberScope.Assessment;
using FiberScope.Fibres;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>The solidity of each layer by every route at hand.</summary>
internal sealed class SoliditySection : IReportSection
{
    /// <inheritdoc/>
    public string Anchor => "solidity";

    /// <inheritdoc/>
    public string Heading => "Solidity";

    /// <inheritdoc/>
    public Markup Render(SwatchAssessment assessment)
    {
        var table = new Table("text", "layer and route", "solidity", "95 % interval", "how");
        foreach (var layer in assessment.Layers)
        {
            var name = assessment.Layers.Length > 1 ? layer.Name + ", " : "";
            if (layer.Solidity is not { } finding)
            {
                table.Row($"{name}not known", "–", "–", "Give basis weight, polymer and thickness, a cross-section, or a measured pressure drop.");
                continue;
            }

            foreach (var route in finding.Routes)
            {
                Row(table, name + Wording.Of(route.Route), route, "");
            }

            if (finding.Routes.Length > 1)
            {
                var agreement = finding.AgreementProbability < 0.05
                    ? $"The routes disagree (a disagreement this large has a probability by chance of {Wording.Probability(finding.AgreementProbability)}); the interval is widened."
                    : $"The routes agree (a disagreement this large has a probability by chance of {Wording.Probability(finding.AgreementProbability)}).";
                Row(table, name + "combined", finding.Combined with { Explanation = agreement }, "total");
            }
        }

        return Markup.Of($"{table.Finish()}<p class=\"fine\">Solidity is fibre volume over mat volume, without a unit. {Weights(assessment)}</p>");
    }

    private static void Row(Table table, string name, SolidityEstimate estimate, string style) => table.Row(
        style,
        [
            Markup.Of($"{name}"),
            Markup.Of($"{Wording.Number(estimate.Value.Fraction)}"),
            Markup.Of($"{Wording.Number(estimate.Interval95.Low)} to {Wording.Number(estimate.Interval95.High)}"),
            Markup.Of($"{estimate.Explanation}"),
        ]);

    private static string Weights(SwatchAssessment assessment) => string.Join(" ", assessment.Layers.Select(layer =>
    {
        string[] told =
        [
            .. layer.BasisWeight is { } weight ? [$"basis weight {Wording.Of(weight)}"] : Array.Empty<string>(),
            .. layer.Thickness is { } thickness ? [$"thickness {Wording.Thickness(thickness)}"] : Array.Empty<string>(),
            .. layer.PolymerName is { } polymer ? [layer.FibreDensity is { } density ? $"{polymer}, {Wording.Of(density)}" : polymer] : Array.Empty<string>(),
        ];
        var name = layer.Name.Length > 0 ? $"{layer.Name}: " : "As told: ";
        return told.Length == 0 ? "" : $"{name}{string.Join(", ", told)}.";
    }));
}
