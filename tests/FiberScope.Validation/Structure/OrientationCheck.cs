using FiberScope.Imaging.Openness;
using FiberScope.Specimens;
using FiberScope.Validation.Imaging;

namespace FiberScope.Validation.Structure;

/// <summary>Orientation read against true, pooled over the fields of a family.</summary>
/// <param name="Family">The family.</param>
/// <param name="TrueDirection">Principal direction of the visible length; degrees.</param>
/// <param name="ReadDirection">The same as read; degrees.</param>
/// <param name="TrueOrder">Order parameter of the visible length.</param>
/// <param name="ReadOrder">The same as read.</param>
internal sealed record OrientationFigures(string Family, double TrueDirection, double ReadDirection, double TrueOrder, double ReadOrder);

/// <summary>Measures fields and pools their directions.</summary>
internal static class OrientationCheck
{
    public static OrientationFigures Of(SpecimenRecipe family, bool reporting, int fields)
    {
        var (truth, read) = (new List<(double, double)>(), new List<(double, double)>());
        for (var i = 0; i < fields; i++)
        {
            var specimen = SpecimenPicture.Of(family, reporting, i);
            truth.AddRange(specimen.Truth.Stations.Select(s => ((double)s.Direction, (double)s.Length)));
            read.AddRange(EdgeDirections.Of(SpecimenPicture.Micrograph(specimen)).Select((share, c) => ((c + 0.5) * Math.PI / EdgeDirections.Classes, share)));
        }

        var (real, found) = (TrueOrientation.Of(truth), TrueOrientation.Of(read));
        return new OrientationFigures(family.Name, real.PrincipalDirection.Degrees, found.PrincipalDirection.Degrees, real.Order, found.Order);
    }
}
