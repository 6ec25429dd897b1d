using FiberScope.Filtration.Cell;
using FiberScope.Filtration.Drag;

namespace FiberScope.Validation.Filtration.Sections;

/// <summary>Which set the evidence speaks for as the default.</summary>
internal static class DefaultSection
{
    private static readonly double[] Solidities = [0.01, 0.03, 0.05, 0.1, 0.2, 0.3];

    public static void Write(MarkdownText text)
    {
        double Ratio(double solidity) => new KuwabaraFlow(solidity, 0).PressureDropFactor / DragLaw.Davies(solidity);
        text.Heading(3, "Which set should be the default")
            .Table(["solidity", .. Solidities.Select(a => MarkdownText.Number(a))],
            [
                ["drag of the cell over Davies' law for real pads (1952)", .. Solidities.Select(a => MarkdownText.Number(Ratio(a), "0.00"))],
            ])
            .Paragraph($"`cell` is the exact answer for an even array of parallel fibres, and no closed form follows that answer over the whole range. Real pads are not even: at a known fibre diameter their pressure drop, as Davies measured it, is {Ratio(0.05):0.0} to {Ratio(0.01):0.0} times lower than the cell's, and what they collect is lower with it. `cell-mat` divides drag and non-inertial efficiency alike by that ratio (table), as the fan model does with its ε; nothing in it is fitted to the media above.")
            .Paragraph($"On the measured media `cell-mat`, with the diameter that Davies' law gives, has next to no bias and errors as small as those of `lee-liu-1982`, the other sets' being larger; it keeps Davies' pressure drop for a structure of known diameters. The evidence leans to `cell-mat` over `kirsch-stechkina-1978`, which lets 0.035 too few through. It is no proof: `cell-mat` was added after the errors of the other sets on these 77 points (two materials) had been seen, so the same points cannot confirm it, and the default stays until other materials have. The case is stronger above a fibre Knudsen number of 0.1, where the published slip factors are far off. `cell` itself is for comparison with theory, and for a diameter found by its own drag.")
            .Paragraph($"Misses, written down: `hinds-1999` fails the measured media, because its impaction sets in too early; every set with impaction lets too few particles above 2.5 µm through, by a factor of two and more in −ln P, and `lee-liu-1982`, which has none, comes closest there. The trajectory fit behind the impaction of `kirsch-stechkina-1978` holds for R from 0.1 to 1; for R below 0.03 it gives far too much at the onset of impaction (map above). First-order slip is itself only qualitative above a Knudsen number of 0.25.");
    }
}
