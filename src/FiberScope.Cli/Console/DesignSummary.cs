using FiberScope.Assessment;
using FiberScope.Assessment.Designing;
using FiberScope.Assessment.Input;
using FiberScope.Filtration;

namespace FiberScope.Cli.Console;

/// <summary>A design on one screen.</summary>
internal static class DesignSummary
{
    public static void Print(TextWriter output, DesignFinding finding)
    {
        var best = finding.Candidates[0];
        output.WriteLine(finding.IsMet ? "Best structure that meets every target:" : "No structure in the ranges meets every target. The nearest miss:");
        output.WriteLine("  " + Values(finding, best));
        output.WriteLine("  " + Figures(best));
        foreach (var line in Targets(finding, best))
        {
            output.WriteLine("  " + line);
        }

        if (finding.Surer is { } surer)
        {
            output.WriteLine("A surer choice:");
            output.WriteLine("  " + Values(finding, surer));
            output.WriteLine("  " + Figures(surer));
            foreach (var line in Targets(finding, surer))
            {
                output.WriteLine("  " + line);
            }
        }

        if (finding.Candidates.Length > 1)
        {
            output.WriteLine(finding.IsMet ? "Next best:" : "Other misses:");
            foreach (var other in finding.Candidates.Skip(1))
            {
                output.WriteLine($"  {(other.MeetsTargets || !finding.IsMet ? "" : "misses a target: ")}{Values(finding, other)}; {Figures(other)}");
            }
        }

        foreach (var caveat in finding.Caveats)
        {
            output.WriteLine("Note: " + caveat.Message);
        }

        output.WriteLine(Cautions.All[0]);
    }

    private static string Values(DesignFinding finding, DesignCandidate c) => string.Join(", ", finding.Design.Variables.Zip(c.Values, (v, value) =>
    {
        var scale = DesignScale.Of(v.Kind);
        var layer = finding.Design.Start.Layers.Length > 1 ? $" of {finding.Design.Start.Layers[v.Layer].Name}" : "";
        var name = Words.Of(Words.DesignKinds, v.Kind).Replace('_', ' ');
        return FormattableString.Invariant($"{name}{layer} {scale.In(value):G3}{(scale.Unit.Length > 0 ? " " : "")}{scale.Unit}");
    }));

    private static string Figures(DesignCandidate c)
    {
        var aerosol = c.AerosolPenetration is { } passes ? $", of the aerosol {ForecastText.Percent(passes)}" : "";
        var mpps = c.MostPenetratingSize is { } size ? FormattableString.Invariant($" at {size.Micrometers:G2} µm") : "";
        return FormattableString.Invariant($"penetration {ForecastText.Percent(c.PenetrationAtMostPenetratingSize)}{mpps}{aerosol}, {c.PressureDrop.Pascals:G3} Pa, quality factor {c.QualityFactorPerPascal:G3} 1/Pa, {c.BasisWeight.GramsPerSquareMeter:G3} g/m², {c.Thickness.Micrometers:G3} µm");
    }

    private static IEnumerable<string> Targets(DesignFinding finding, DesignCandidate best) =>
        best.Probabilities.Select(p => $"{(p.Key == "aerosol-penetration" ? finding.Design.AerosolName : DesignTargetNames.Of(p.Key).Replace('_', ' '))}: met with a probability of {ForecastText.Chance(p.Value)}");
}
