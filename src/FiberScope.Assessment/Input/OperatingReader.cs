using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Reads the keys that say how a medium is used: the same in swatch files and media files.</summary>
internal static class OperatingReader
{
    /// <summary>The operating point; null when no face velocity is told.</summary>
    public static OperatingPoint? Read(MapReader map)
    {
        var velocity = FaceVelocity(map);
        var air = Air(map.Map("air"));
        var density = map.Positive("particle_density", Kinds.Density);
        var particles = Particles(map);
        return velocity is null
            ? null
            : new OperatingPoint
            {
                FaceVelocity = velocity.Value,
                Air = air,
                ParticleDensity = density?.Value ?? Density.FromGramsPerCubicCentimeter(1),
                Particles = particles,
            };
    }

    private static Speed? FaceVelocity(MapReader map)
    {
        var velocity = map.Positive("face_velocity", Kinds.Speed);
        var flow = map.Positive("flow", Kinds.Flow);
        var area = map.Positive("area", Kinds.Area);
        if (map.Has("flow") != map.Has("area"))
        {
            map.Complain(map.Has("flow") ? "flow" : "area", "flow and area go together: face velocity = flow / area");
        }
        else if (map.Has("flow") && map.Has("face_velocity"))
        {
            map.Complain("face_velocity", "give either face_velocity, or flow with area");
        }

        return velocity?.Value ?? (flow is not null && area is not null ? flow.Value / area.Value : null);
    }

    private static AirState Air(MapReader? map)
    {
        var standard = AirState.Standard;
        if (map is null)
        {
            return standard;
        }

        var temperature = map.Quantity("temperature", Kinds.Temperature)?.Value ?? standard.Temperature;
        if (temperature.Kelvins is < 173.15 or > 573.15)
        {
            map.Complain("temperature", "must lie from -100 C to 300 C");
            temperature = standard.Temperature;
        }

        var pressure = map.Positive("pressure", Kinds.Pressure)?.Value ?? standard.Pressure;
        var humidity = map.Within("humidity", 0, 1) ?? standard.RelativeHumidity;
        map.RejectUnknownKeys();
        return new AirState(temperature, pressure, humidity);
    }

    private static ImmutableArray<Length> Particles(MapReader map)
    {
        var sizes = ImmutableArray.CreateBuilder<Length>();
        foreach (var item in map.Items("particles"))
        {
            Stated<Length>? stated = null;
            var complaint = item is YamlScalarNode { Value: { } text }
                ? QuantityText.Read(text, Kinds.Length, out stated)
                : "a list of particle diameters is wanted, such as [0.1 um, 0.3 um]";
            if (complaint is null && stated!.Value.Meters <= 0)
            {
                complaint = "a particle diameter must be above zero";
            }

            if (complaint is null)
            {
                sizes.Add(stated!.Value);
            }
            else
            {
                map.File.Report(item, "particles: " + complaint);
            }
        }

        return [.. sizes.OrderBy(s => s.Meters).Distinct()];
    }
}
