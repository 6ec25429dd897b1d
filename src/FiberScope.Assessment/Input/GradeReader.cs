using System.Collections.Immutable;
using FiberScope.Conformity;
using FiberScope.Filtration;
using FiberScope.Statistics;
using UnitsNet;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>Turns the text of a grade file into a <see cref="Grade"/>, gathering every problem on the way.</summary>
public static class GradeReader
{
    private const double HighestRisk = 0.5;

    /// <summary>Reads and checks a grade file.</summary>
    /// <exception cref="InputException">The file cannot be read or something in it is wrong; every problem is listed.</exception>
    public static Grade Read(string path) => Read(InputText.FromFile(path), Path.GetDirectoryName(Path.GetFullPath(path))!, null).Grade;

    /// <summary>Reads and checks the text of a grade file.</summary>
    /// <param name="text">The YAML text.</param>
    /// <param name="name">The name to use in messages.</param>
    /// <exception cref="InputException">Something in the text is wrong; every problem is listed.</exception>
    public static Grade Parse(string text, string name) => Read(new InputText(name, text), Directory.GetCurrentDirectory(), null).Grade;

    /// <summary>The grade, and the calibration that it names.</summary>
    /// <param name="file">The text.</param>
    /// <param name="folder">The folder that relative paths start from.</param>
    /// <param name="correlations">The correlations that a swatch file asks for.</param>
    internal static (Grade Grade, CalibrationKey? Calibration) Read(InputText file, string folder, CorrelationSet? correlations)
    {
        var map = new MapReader(file, file.Root);
        var name = map.Text("grade");
        if (!map.Has("grade"))
        {
            file.Report(1, "grade is missing; name the grade, such as 'grade: FM-25'");
        }

        var revision = map.Text("revision");
        var risk = Risk(map) ?? Limit.DefaultMaximumRisk;
        var limits = map.Map("limits") is { } inner ? Limits(inner, risk) : [];
        if (!map.Has("limits"))
        {
            file.Report(1, "limits is missing; add at least one, such as 'limits: {mean_diameter: {at_most: 2.4 um}}'");
        }

        var calibration = CalibrationKey.Read(map, folder, correlations);
        map.RejectUnknownKeys();
        file.ThrowIfProblems();
        return (new Grade(revision is null ? name! : $"{name} revision {revision}", limits), calibration);
    }

    private static double? Risk(MapReader map) => map.Inside("maximum_risk", 0, HighestRisk);

    private static ImmutableArray<Limit> Limits(MapReader map, double risk)
    {
        Limit?[] limits =
        [
            .. Characteristic.Known.SelectMany(characteristic => map.Items(characteristic.Key)
                .Select(item => One(map, characteristic, item, risk))),
        ];
        map.RejectUnknownKeys();
        if (limits.Length == 0)
        {
            map.File.Report(map.Line, $"limits: is empty; known here: {string.Join(", ", Characteristic.Known.Select(c => c.Key))}");
        }

        return [.. limits.OfType<Limit>()];
    }

    private static Limit? One(MapReader map, Characteristic characteristic, YamlNode item, double risk)
    {
        if (map.AsMap(item, characteristic.Key) is not { } inner)
        {
            return null;
        }

        var low = Bound(inner, "at_least", characteristic);
        var high = Bound(inner, "at_most", characteristic);
        var ownRisk = Risk(inner) ?? risk;
        var particle = characteristic == Characteristic.PenetrationAtSize ? Required(inner, "particle", Kinds.Length) : null;
        var pressure = characteristic == Characteristic.AirPermeability ? Required(inner, "at", Kinds.Pressure) : null;
        inner.RejectUnknownKeys();
        if (!inner.Has("at_least") && !inner.Has("at_most"))
        {
            inner.File.Report(inner.Line, $"{characteristic.Key}: needs at_least, at_most or both");
        }
        else if (low is not null && high is not null && characteristic.In(low) >= characteristic.In(high))
        {
            inner.Complain("at_least", "must be below at_most");
        }
        else if (low is not null || high is not null)
        {
            return new Limit(characteristic, low, high) { MaximumRisk = ownRisk, Particle = particle, TestPressure = pressure };
        }

        return null;
    }

    private static T? Required<T>(MapReader map, string key, QuantityKind<T> kind)
        where T : struct, IQuantity
    {
        if (!map.Has(key))
        {
            map.File.Report(map.Line, $"needs '{key}', such as '{key}: {kind.Example}'");
        }

        return map.Positive(key, kind)?.Value;
    }

    private static IQuantity? Bound(MapReader map, string key, Characteristic characteristic) => characteristic.Of(1) switch
    {
        Ratio when characteristic == Characteristic.DiameterGsd => Pure(map, key, 1, 20),
        Ratio => Pure(map, key, 0, double.MaxValue),
        Length => map.Positive(key, Kinds.Length)?.Value,
        AreaDensity => map.Positive(key, Kinds.BasisWeight)?.Value,
        Pressure => map.Positive(key, Kinds.Pressure)?.Value,
        Speed => map.Positive(key, Kinds.AirPermeability)?.Value,
        Compressibility => map.Positive(key, Kinds.QualityFactor)?.Value,
        ReciprocalArea => map.Quantity(key, Kinds.CountPerArea)?.Value,
        var other => throw new NotSupportedException($"No way to read a {other.QuantityInfo.Name}."),
    };

    private static Ratio? Pure(MapReader map, string key, double low, double high) =>
        map.Within(key, low, high) is { } value ? Ratio.FromDecimalFractions(Require.Finite(value)) : null;
}
