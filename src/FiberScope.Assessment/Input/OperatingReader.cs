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
        var (air, known) = Air(map.Map("air"));
        var density = map.Positive("particle_density", Kinds.Density);
        var particles = Particles(map);
        var direction = map.Choice("flow_direction", Words.FlowDirections);
        var charging = map.Choice("particle_charge", Words.ParticleCharges);
        var permittivity = map.Within("particle_permittivity", 1, 1e6);
        var leak = map.Map("edge_leak") is { } gap ? Leak(gap, RequestReader.MediaArea(map)) : null;
        if (velocity is null)
        {
            return null;
        }

        var uncertainty = known with { FaceVelocity = velocity.RelativeUncertainty ?? 0 };
        var point = new OperatingPoint
        {
            FaceVelocity = velocity.Value,
            Air = air,
            ParticleDensity = density?.Value ?? Density.FromGramsPerCubicCentimeter(1),
            Particles = particles,
            Direction = direction ?? FlowDirection.Horizontal,
            Charging = charging ?? ParticleCharging.Equilibrium,
            Leak = leak,
            Uncertainty = uncertainty == new OperatingUncertainty() ? null : uncertainty,
        };
        return permittivity is { } told ? point with { ParticlePermittivity = told } : point;
    }

    private static Stated<Speed>? FaceVelocity(MapReader map)
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

        if (velocity is not null || flow is null || area is null)
        {
            return velocity;
        }

        var (f, a) = (flow.RelativeUncertainty ?? 0, area.RelativeUncertainty ?? 0);
        return new Stated<Speed>(flow.Value / area.Value, Math.Min(1, Math.Sqrt((f * f) + (a * a))));
    }

    private static (AirState State, OperatingUncertainty Uncertainty) Air(MapReader? map)
    {
        var standard = AirState.Standard;
        if (map is null)
        {
            return (standard, new OperatingUncertainty());
        }

        var (temperature, difference) = (standard.Temperature, TemperatureDelta.Zero);
        if (map.Text("temperature") is { } text)
        {
            if (QuantityText.ReadTemperature(text, out var read, out difference) is { } complaint)
            {
                map.Complain("temperature", complaint);
            }
            else if (read.Kelvins is < 173.15 or > 573.15)
            {
                map.Complain("temperature", "must lie from -100 C to 300 C");
            }
            else
            {
                temperature = read;
            }
        }

        var pressure = map.Positive("pressure", Kinds.Pressure);
        var humidity = map.Within("humidity", 0, 1) ?? standard.RelativeHumidity;
        map.RejectUnknownKeys();
        return (
            new AirState(temperature, pressure?.Value ?? standard.Pressure, humidity),
            new OperatingUncertainty { Temperature = difference, AirPressure = pressure?.RelativeUncertainty ?? 0 });
    }

    private static EdgeLeak? Leak(MapReader map, Area? mediaArea)
    {
        var gap = map.Positive("gap", Kinds.Length)?.Value;
        var length = map.Positive("length", Kinds.Length)?.Value;
        var depth = map.Positive("depth", Kinds.Length)?.Value;
        map.RejectUnknownKeys();
        if (!map.Has("gap") || !map.Has("length") || !map.Has("depth"))
        {
            map.File.Report(map.Line, "edge_leak: needs gap, length and depth of the slit, such as {gap: 0.05 mm, length: 60 cm, depth: 10 mm}");
        }
        else if (mediaArea is null)
        {
            map.File.Report(map.Line, "edge_leak: needs the area of medium that it goes past; add media_area, such as 'media_area: 150 cm2'");
        }

        return gap is { } g && length is { } l && depth is { } d && mediaArea is { } area ? new EdgeLeak(g, l, d, area) : null;
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
