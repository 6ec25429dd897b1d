using System.Collections.Immutable;
using MathNet.Numerics.Distributions;
using UnitsNet;

namespace FiberScope.Filtration;

/// <summary>The ambient dusts over which ePM efficiencies are averaged; ISO 16890-1:2016, constants from memory.</summary>
public static class AmbientDust
{
    private static readonly double[] EdgesMicrometres = [0.3, 0.4, 0.55, 0.7, 1, 1.3, 1.6, 2.2, 3, 4, 5.5, 7, 10];
    private static readonly (double Share, double MedianMicrometres, double Gsd)[] Urban = [(0.45, 0.3, 2.2), (0.55, 10, 3.1)];
    private static readonly (double Share, double MedianMicrometres, double Gsd)[] Rural = [(0.18, 0.25, 2.2), (0.82, 11, 4)];

    /// <summary>Channel mid-sizes (geometric) and their weights for ePM1, ePM2.5 or ePM10; the weights sum to one.</summary>
    /// <param name="upper">1, 2.5 or 10 µm. Channels that end above it are left out; the treatment of the 2.5 µm edge is unverified.</param>
    /// <remarks>Weight of a channel: volume density at its mid-size times its width in ln d. Urban dust for ePM1 and ePM2.5, rural for ePM10.</remarks>
    public static ImmutableArray<(Length Size, double Weight)> Channels(Length upper)
    {
        var limit = upper.Micrometers * 1.0001;
        var modes = limit > 5 ? Rural : Urban;
        var raw = EdgesMicrometres.Zip(EdgesMicrometres.Skip(1)).Where(e => e.First < limit && (e.Second <= limit || Math.Sqrt(e.First * e.Second) <= limit))
            .Select(e => (Middle: Math.Sqrt(e.First * e.Second), Width: Math.Log(e.Second / e.First)))
            .Select(c => (c.Middle, Weight: c.Width * Density(modes, c.Middle))).ToArray();
        var sum = raw.Sum(r => r.Weight);
        return [.. raw.Select(r => (Length.FromMicrometers(r.Middle), r.Weight / sum))];
    }

    private static double Density((double Share, double MedianMicrometres, double Gsd)[] modes, double micrometres) =>
        modes.Sum(m => m.Share * Normal.PDF(Math.Log(m.MedianMicrometres), Math.Log(m.Gsd), Math.Log(micrometres)));
}
