using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Turns the text of a calibration file into a <see cref="CalibrationFile"/>, gathering every problem on the way.</summary>
internal sealed class CalibrationFileReader(MapReader map, string folder)
{
    public static CalibrationFile Read(InputText file, string folder)
    {
        var map = new MapReader(file, file.Root);
        var calibration = new CalibrationFileReader(map, folder).Read();
        map.RejectUnknownKeys();
        file.ThrowIfProblems();
        return calibration;
    }

    private CalibrationFile Read()
    {
        if (!map.Has("grade"))
        {
            map.File.Report(map.Line, "grade is missing; name the grade, such as 'grade: FM-25'");
        }

        var grade = map.Text("grade") ?? "";
        var correlations = map.Choice("correlations", Words.Correlations);
        var common = OperatingReader.Read(map);
        var items = map.Items("rolls");
        if (items.Count == 0)
        {
            map.File.Report(map.Line, "rolls is missing or empty; list the rolls with their structure and rig results, at least three");
        }

        ImmutableArray<CalibrationRoll> rolls = [.. items.Select((item, i) => Roll(item, i, common)).OfType<CalibrationRoll>()];
        foreach (var twice in rolls.GroupBy(r => r.Name, StringComparer.Ordinal).Where(g => g.Skip(1).Any()))
        {
            map.Complain("rolls", $"there are two rolls '{twice.Key}'; give each its own name");
        }

        return new CalibrationFile { Name = map.File.Name, Grade = grade, Rolls = rolls, Correlations = correlations };
    }

    private CalibrationRoll? Roll(YamlNode item, int index, OperatingPoint? common)
    {
        if (map.AsMap(item, "rolls") is not { } inner)
        {
            return null;
        }

        var name = inner.Text("roll") ?? FormattableString.Invariant($"roll {index + 1}");
        var point = OperatingReader.Read(inner) ?? common;
        if (point is null && !inner.Has("face_velocity") && !map.Has("face_velocity") && !inner.Has("flow") && !map.Has("flow"))
        {
            inner.File.Report(inner.Line, $"{name}: face_velocity is missing, here and at the top of the file");
        }

        var layers = new MediaFileReader(inner, folder).Layers();
        var (pressure, penetrations) = Measured(inner, name);
        inner.RejectUnknownKeys();
        return point is null || layers.IsEmpty ? null : new CalibrationRoll(name, layers, point with { Particles = [], Uncertainty = null }, pressure, penetrations);
    }

    private static (Pressure? PressureDrop, ImmutableArray<RigPenetration> Penetrations) Measured(MapReader roll, string name)
    {
        Pressure? pressure = null;
        var penetrations = ImmutableArray.CreateBuilder<RigPenetration>();
        foreach (var item in roll.Items("measured"))
        {
            if (roll.AsMap(item, "measured") is not { } inner)
            {
                continue;
            }

            if (inner.Has("pressure_drop"))
            {
                if (pressure is not null)
                {
                    inner.Complain("pressure_drop", "is told twice for this roll; give one, at the roll's face velocity");
                }

                pressure = inner.Positive("pressure_drop", Kinds.Pressure)?.Value;
            }

            if (Penetration(inner) is { } penetration)
            {
                penetrations.Add(penetration);
            }

            inner.RejectUnknownKeys();
        }

        if (!roll.Has("measured"))
        {
            roll.File.Report(roll.Line, $"{name}: measured is missing; add what the rig showed, such as 'measured: [{{pressure_drop: 41 Pa}}, {{particle: 0.3 um, penetration: 12 %}}]'");
        }

        return (pressure, penetrations.ToImmutable());
    }

    private static RigPenetration? Penetration(MapReader map)
    {
        var particle = map.Positive("particle", Kinds.Length)?.Value;
        var penetration = map.Within("penetration", 0, 1);
        var discharged = map.Choice("discharged", Words.YesOrNo) ?? false;
        if (map.Has("particle") != map.Has("penetration") || (!map.Has("penetration") && !map.Has("pressure_drop")))
        {
            map.File.Report(map.Line, "measured: give pressure_drop, or particle with penetration, such as {particle: 0.3 um, penetration: 12 %}");
        }
        else if (map.Has("discharged") && !map.Has("penetration"))
        {
            map.Complain("discharged", "belongs to a penetration");
        }

        if (penetration is 0)
        {
            map.Complain("penetration", "must be above zero; leave out what the rig could not count");
        }

        return particle is { } size && penetration is > 0 ? new RigPenetration(size, penetration.Value, discharged) : null;
    }
}
