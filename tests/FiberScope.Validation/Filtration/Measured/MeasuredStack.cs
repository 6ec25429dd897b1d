using System.Collections.Immutable;
using FiberScope.Fibres;
using FiberScope.Filtration;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Validation.Filtration.Measured;

/// <summary>One published measurement: a stack of like layers, its pressure drop and its penetration by particle size.</summary>
internal sealed record MeasuredStack
{
    /// <summary>Density of polypropylene, kg/m³; handbook value.</summary>
    private const double PolymerDensity = 905;

    /// <summary>Face velocity of the source, m/s.</summary>
    private const double FaceVelocity = 0.049;

    /// <summary>Density of dry salt, kg/m³, assumed as the source does.</summary>
    private const double SaltDensity = 2165;

    public required string Material { get; init; }

    public required string Treatment { get; init; }

    public required int Layers { get; init; }

    /// <summary>Thickness of the stack, m; taken from the same material's other rows where the source has none.</summary>
    public required double ThicknessMetres { get; init; }

    public required double KilogramsPerSquareMetre { get; init; }

    public required double Pascals { get; init; }

    public required ImmutableArray<double> Micrometres { get; init; }

    public required ImmutableArray<double> Penetration { get; init; }

    public bool IsDischarged => Treatment.Contains("discharged", StringComparison.Ordinal);

    public double Solidity => KilogramsPerSquareMetre / (PolymerDensity * ThicknessMetres);

    public OperatingPoint Point => new()
    {
        FaceVelocity = Speed.FromMetersPerSecond(FaceVelocity),
        ParticleDensity = Density.FromKilogramsPerCubicMeter(SaltDensity),
        Particles = [.. Micrometres.Select(d => Length.FromMicrometers(d))],
    };

    /// <summary>All rows whose thickness is known or can be taken from the same material.</summary>
    public static IReadOnlyList<MeasuredStack> ReadAll()
    {
        var rows = DataFile.Read("measured-media.csv");
        var sizes = rows[0].Keys.Where(k => k.StartsWith("P_", StringComparison.Ordinal)).ToList();
        var perLayer = rows.Where(r => r["thickness_mm"].Length > 0)
            .GroupBy(r => r["material"], StringComparer.Ordinal)
            .ToDictionary(g => g.Key, g => g.Average(r => DataFile.Number(r["thickness_mm"]) / DataFile.Number(r["layers"])), StringComparer.Ordinal);
        return [.. rows.Where(r => perLayer.ContainsKey(r["material"])).Select(r => new MeasuredStack
        {
            Material = r["material"],
            Treatment = r["treatment"],
            Layers = (int)DataFile.Number(r["layers"]),
            ThicknessMetres = 1e-3 * (r["thickness_mm"].Length > 0 ? DataFile.Number(r["thickness_mm"]) : perLayer[r["material"]] * DataFile.Number(r["layers"])),
            KilogramsPerSquareMetre = 1e-3 * DataFile.Number(r["basis_weight_g_m2"]),
            Pascals = DataFile.Number(r["pressure_drop_pa"]),
            Micrometres = [.. sizes.Select(s => DataFile.Number(s[2..^2]))],
            Penetration = [.. sizes.Select(s => DataFile.Number(r[s]))],
        })];
    }

    /// <summary>The stack's layers, all alike, of fibres of one diameter.</summary>
    public IReadOnlyList<MediaLayer> Build(double diameterMetres, Func<MediaLayer, MediaLayer>? with = null)
    {
        var layer = new MediaLayer
        {
            Diameters = new DiameterDistribution([new DiameterClass(Length.FromMeters(diameterMetres), 1)]),
            Solidity = new Solidity(Solidity),
            Thickness = Length.FromMeters(ThicknessMetres / Layers),
        };
        layer = with is null ? layer : with(layer);
        return [.. Enumerable.Repeat(layer, Layers)];
    }

    /// <summary>The fibre diameter at which the model gives the measured pressure drop, by the set's own drag law.</summary>
    public double EffectiveDiameter(ForecastSettings settings, Func<MediaLayer, MediaLayer>? with = null)
    {
        var (low, high) = (Math.Log(0.5e-6), Math.Log(100e-6));
        for (var step = 0; step < 40; step++)
        {
            var middle = 0.5 * (low + high);
            var pascals = MediaModel.PressureDropAt(Build(Math.Exp(middle), with), Point, Point.FaceVelocity, settings).Pascals;
            (low, high) = pascals > Pascals ? (middle, high) : (low, middle);
        }

        return Math.Exp(0.5 * (low + high));
    }

    /// <summary>Whether a channel lies in the range for which the forecasts are judged, 0.3 to 1.2 µm.</summary>
    public static bool IsJudged(double micrometres) => new Interval(0.3, 1.25).Contains(micrometres);
}
