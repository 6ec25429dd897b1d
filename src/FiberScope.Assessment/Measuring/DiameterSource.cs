using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Imaging;

namespace FiberScope.Assessment.Measuring;

/// <summary>Chooses the kind of picture that gives a layer's diameters where it has several kinds.</summary>
/// <remarks>
/// The lengths that readings stand for cannot be added up across kinds: a mat seen from above shows length per area, a section the
/// number of fibres that it cuts.
/// </remarks>
internal static class DiameterSource
{
    private static readonly ImmutableArray<ImagingMode> Preferred = [ImagingMode.SecondaryElectron, ImagingMode.Transmitted, ImagingMode.CrossSection];

    /// <summary>The fields of a layer; those of a kind that gives no diameters here are left out, with the reason.</summary>
    public static ImmutableArray<FieldFinding> Choose(IEnumerable<FieldFinding> fields)
    {
        ImmutableArray<FieldFinding> all = [.. fields];
        var kinds = all.Where(f => f.IsIncluded).Select(Mode).Distinct().OrderBy(m => Preferred.IndexOf(m)).ToArray();
        return kinds.Length <= 1 ? all : [.. all.Select(f => f.IsIncluded && Mode(f) != kinds[0] ? f with { LeftOutBecause = Reason(Mode(f), kinds[0]) } : f)];
    }

    private static ImagingMode Mode(FieldFinding field) => field.Measurement.Micrograph.Mode;

    private static string Reason(ImagingMode own, ImagingMode chosen) =>
        $"its diameters are not mixed with those of the {Words.Of(Words.ImagingModes, chosen)} fields; as a {Words.Of(Words.ImagingModes, own)} field it tells solidity only";
}
