using System.Collections.Immutable;
using FiberScope.Filtration.Classes;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>A published standard's own test aerosol and flow.</summary>
public sealed record TestAerosol
{
    /// <summary>Its stable name, such as <c>cfr84-salt</c>.</summary>
    public required string Id { get; init; }

    /// <summary>The aerosol.</summary>
    public required ChallengeAerosol Aerosol { get; init; }

    /// <summary>The flow through the whole product; null where the standard names none.</summary>
    public required VolumeFlow? Flow { get; init; }

    /// <summary>The area tested; null where it is the product's own.</summary>
    public required Area? Area { get; init; }

    /// <summary>Whether the medium counts as discharged, because the aerosol or a treatment takes the charge off.</summary>
    public required bool Discharged { get; init; }

    /// <summary>Where the figures are from and how far to trust them.</summary>
    public required string Provenance { get; init; }

    /// <summary>All in the table of classes.</summary>
    public static ImmutableArray<TestAerosol> Published { get; } = [.. ClassTable.Published.Tests.Where(t => t.Kind == "aerosol").Select(Of)];

    internal static ChallengeAerosol AerosolOf(ClassTest test) =>
        new(Length.FromNanometers(test.CountMedianNanometres), test.Gsd, test.CountedBy)
        {
            ParticleDensity = Density.FromKilogramsPerCubicMeter(test.Density),
            ParticlePermittivity = test.Permittivity,
            RefractiveIndex = test.RefractiveIndex,
        };

    private static TestAerosol Of(ClassTest test) => new()
    {
        Id = test.Id,
        Aerosol = AerosolOf(test),
        Flow = test.LitresPerMinute is { } flow ? VolumeFlow.FromLitersPerMinute(flow) : null,
        Area = test.SquareCentimetres is { } area ? UnitsNet.Area.FromSquareCentimeters(area) : null,
        Discharged = test.Discharged,
        Provenance = test.Provenance,
    };
}
