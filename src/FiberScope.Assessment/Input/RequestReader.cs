using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>Reads what a file asks of a forecast beside the curve: the same keys in swatch files and media files.</summary>
internal static class RequestReader
{
    /// <summary>The keys that ask for something.</summary>
    public static readonly ImmutableArray<string> Keys = ["challenge", "size_bands", "mask", "charge_from"];

    /// <summary>Relative standard uncertainty of a penetration that was told without one. Common practice, no source.</summary>
    private const double UsualUncertainty = 0.05;

    private static readonly string[] OwnKeys = ["count_median", "mass_median", "gsd", "by"];

    /// <summary>The request; problems are reported to the file.</summary>
    public static ForecastRequest Read(MapReader map)
    {
        var area = MediaArea(map);
        if (map.Has("charge_from"))
        {
            map.RejectTold(["charge"], "charge_from");
        }

        return new ForecastRequest
        {
            MediaArea = area,
            Challenges = Challenges(map, area),
            Bands = Bands(map),
            Mask = map.Map("mask") is { } mask ? Mask(mask) : null,
            ChargePair = map.Map("charge_from") is { } pair ? Pair(pair) : null,
        };
    }

    /// <summary>The area of medium in the product: told as such, or behind the flow that gives the face velocity.</summary>
    public static Area? MediaArea(MapReader map) =>
        (map.Positive("media_area", Kinds.Area) ?? (map.Has("flow") ? map.Positive("area", Kinds.Area) : null))?.Value;

    /// <summary>One aerosol, told by its name in the table of standards or by its own figures; null when wrong.</summary>
    public static NamedAerosol? Aerosol(MapReader map, Area? mediaArea)
    {
        var name = map.Text("name");
        var discharged = map.Choice("discharged", Words.YesOrNo);
        if (!map.Has("standard"))
        {
            return Own(map) is { } own ? new NamedAerosol(name ?? Describe(own), own, null, discharged ?? false) : null;
        }

        foreach (var key in OwnKeys.Where(map.Has))
        {
            map.Complain(key, "belongs to an aerosol of your own; delete it, or delete 'standard'");
        }

        var id = map.Text("standard");
        if (TestAerosol.Published.FirstOrDefault(t => t.Id == id) is not { } known)
        {
            if (id is not null)
            {
                map.Complain("standard", $"'{id}' is not one of {string.Join(", ", TestAerosol.Published.Select(t => t.Id))}");
            }

            return null;
        }

        var velocity = known.Flow is { } flow && (known.Area ?? mediaArea) is { } area ? flow / area : (Speed?)null;
        return new NamedAerosol(name ?? known.Id, known.Aerosol, velocity, discharged ?? known.Discharged);
    }

    private static ImmutableArray<NamedAerosol> Challenges(MapReader map, Area? mediaArea)
    {
        var aerosols = ImmutableArray.CreateBuilder<NamedAerosol>();
        foreach (var item in map.Items("challenge"))
        {
            if (map.AsMap(item, "challenge") is not { } inner)
            {
                continue;
            }

            if (Aerosol(inner, mediaArea) is { } aerosol)
            {
                aerosols.Add(aerosol);
            }

            inner.RejectUnknownKeys();
        }

        return aerosols.ToImmutable();
    }

    private static ChallengeAerosol? Own(MapReader map)
    {
        var byCount = map.Positive("count_median", Kinds.Length)?.Value;
        var byMass = map.Positive("mass_median", Kinds.Length)?.Value;
        var gsd = map.Within("gsd", 1, 20);
        var by = map.Choice("by", Words.AerosolBases);
        var density = map.Positive("density", Kinds.Density)?.Value;
        var permittivity = map.Within("permittivity", 1, 1e6);
        var index = map.Inside("refractive_index", 1, 10);
        if (map.Has("count_median") == map.Has("mass_median") || !map.Has("gsd") || !map.Has("by"))
        {
            map.File.Report(map.Line, "challenge: give count_median or mass_median, gsd, and by: count, mass or scattered-light, such as {count_median: 75 nm, gsd: 1.86, by: mass}; or the aerosol of a standard, such as {standard: cfr84-salt}");
        }

        if (gsd is not { } spread || by is not { } basis || (byCount ?? byMass) is not { } told)
        {
            return null;
        }

        // The mass median is the median weighted by the cube of the diameter.
        var salt = new ChallengeAerosol(byCount ?? HatchChoate.CountMedian(told, spread, 3), spread, basis);
        return salt with
        {
            ParticleDensity = density ?? salt.ParticleDensity,
            ParticlePermittivity = permittivity ?? salt.ParticlePermittivity,
            RefractiveIndex = index ?? salt.RefractiveIndex,
        };
    }

    private static string Describe(ChallengeAerosol a) =>
        FormattableString.Invariant($"count median {a.CountMedian.Nanometers:G3} nm, GSD {a.GeometricStandardDeviation:G3}, by {Words.Of(Words.AerosolBases, a.CountedBy)}");

    private static ImmutableArray<SizeBand> Bands(MapReader map)
    {
        var bands = ImmutableArray.CreateBuilder<SizeBand>();
        foreach (var item in map.Items("size_bands"))
        {
            if (map.AsMap(item, "size_bands") is not { } inner)
            {
                continue;
            }

            var from = inner.Positive("from", Kinds.Length)?.Value;
            var to = inner.Positive("to", Kinds.Length)?.Value;
            inner.RejectUnknownKeys();
            if (!inner.Has("from") || !inner.Has("to"))
            {
                inner.File.Report(inner.Line, "size_bands: each needs from and to, such as {from: 0.3 um, to: 1 um}");
            }
            else if (from is { } low && to is { } high)
            {
                if (low >= high)
                {
                    inner.Complain("from", "must be below 'to'");
                }
                else
                {
                    bands.Add(new SizeBand(low, high));
                }
            }
        }

        return bands.ToImmutable();
    }

    private static MaskLeak? Mask(MapReader map)
    {
        var seal = map.Within("seal_leak", 0, 1);
        var valve = map.Within("valve_leak", 0, 1);
        map.RejectUnknownKeys();
        if (!map.Has("seal_leak"))
        {
            map.File.Report(map.Line, "mask: needs seal_leak, the share of the inhaled air that comes past the face seal, such as 'seal_leak: 2 %'");
            return null;
        }

        if (seal + (valve ?? 0) > 1)
        {
            map.Complain("seal_leak", "seal and valve together let in more than all the air");
            return null;
        }

        return seal is null ? null : new MaskLeak(seal.Value, valve ?? 0);
    }

    private static ChargePair? Pair(MapReader map)
    {
        var particle = map.Positive("particle", Kinds.Length)?.Value;
        var received = map.InsideStated("as_received", 0, 1);
        var discharged = map.InsideStated("discharged", 0, 1);
        map.RejectUnknownKeys();
        if (!map.Has("particle") || !map.Has("as_received") || !map.Has("discharged"))
        {
            map.File.Report(map.Line, "charge_from: needs two penetrations at the face velocity of the file, such as {particle: 0.3 um, as_received: 2.2 %, discharged: 48 %}");
        }

        var uncertainty = Math.Max(received?.RelativeUncertainty ?? 0, discharged?.RelativeUncertainty ?? 0);
        return particle is { } size && received is not null && discharged is not null
            ? new ChargePair(size, received.Value, discharged.Value, uncertainty > 0 ? uncertainty : UsualUncertainty)
            : null;
    }
}
