using System.Collections.Immutable;
using UnitsNet;

namespace FiberScope.Filtration.Passage;

/// <summary>Where a medium lets most through.</summary>
/// <param name="Metres">The most-penetrating size; null when there is none inside its range.</param>
/// <param name="WhereMetres">The most-penetrating size, or where there is none the curve's worst.</param>
/// <param name="Attenuation">−ln P there.</param>
internal readonly record struct Worst(double? Metres, double WhereMetres, double Attenuation)
{
    public static Worst Of(MediumModel medium, ImmutableArray<Length> curve)
    {
        var metres = MostPenetrating.Size(medium.Attenuation);
        var where = metres ?? curve.MinBy(p => medium.Attenuation(p.Meters)).Meters;
        return new Worst(metres, where, medium.Attenuation(where));
    }
}
