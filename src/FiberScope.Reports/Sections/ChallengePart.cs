using FiberScope.Assessment;
using FiberScope.Assessment.Input;
using FiberScope.Filtration;
using FiberScope.Reports.Html;

namespace FiberScope.Reports.Sections;

/// <summary>What passes of the aerosols and in the size bands that the swatch file asks for.</summary>
internal static class ChallengePart
{
    public static Markup Render(SwatchAssessment assessment)
    {
        var inward = assessment.Challenges.Any(c => c.TotalInwardLeakage is not null);
        string[] last = inward ? ["total inward leakage"] : [];
        var aerosols = new Table("figures", ["aerosol", "counted by", "face velocity", "penetration", "measured inputs, 95 %", "spread of the models", .. last]);
        foreach (var c in assessment.Challenges)
        {
            string[] total = inward ? [c.TotalInwardLeakage is { } leak ? Wording.Percent(leak) : "–"] : [];
            aerosols.Row([
                c.Discharged ? $"{c.Name}, medium discharged" : c.Name,
                Wording.Words(Words.Of(Words.AerosolBases, c.Aerosol.CountedBy)),
                Wording.Of(c.FaceVelocity),
                .. Figures(c.Result),
                .. total,
            ]);
        }

        var bands = new Table("figures", "particle size", "efficiency", "penetration", "measured inputs, 95 %", "spread of the models");
        foreach (var b in assessment.Bands)
        {
            bands.Row([$"{Wording.Particle(b.From)} to {Wording.Particle(b.To)}", Wording.Efficiency(b.Result.Penetration), .. Figures(b.Result)]);
        }

        var (first, second) = (aerosols.Finish(), bands.Finish());
        return first.IsEmpty && second.IsEmpty
            ? Markup.Empty
            : Markup.Of($"<h3>Against whole aerosols and size bands</h3>{first}{second}<p class=\"fine\">The curve is worked out first and then summed over the aerosol as its instrument sums it. Size bands are averaged evenly in the logarithm of size.</p>");
    }

    private static string[] Figures(ChallengeResult r) =>
        [Wording.Percent(r.Penetration), r.MeasurementBand is { } band ? Wording.Percent(band) : "–", Wording.Percent(r.ModelBand)];
}
