namespace FiberScope.Filtration.Passage;

/// <summary>How the air goes through a medium and past it.</summary>
/// <param name="Pascals">Pressure drop of all layers.</param>
/// <param name="MetresPerSecond">Velocity over the medium's area of the air that goes through it.</param>
/// <param name="EdgeLeakShare">Share of all the air that goes past it.</param>
/// <param name="Layers">Each layer's flow.</param>
internal sealed record MediumFlow(double Pascals, double MetresPerSecond, double EdgeLeakShare, LayerFlow[] Layers)
{
    public static MediumFlow At(double metresPerSecond, EvenLayer[] even, LayerPassage[] passages, EdgeLeak? leak, AirProperties air)
    {
        var whole = Through(metresPerSecond, even, passages, air);
        if (leak is null || leak.LengthMetres == 0)
        {
            return whole;
        }

        // Velocity through the medium such that medium and gap, at the same pressure drop, carry all the air.
        var through = RisingRoot.Solve(
            u => u + leak.MetresPerSecond(Through(u, even, passages, air).Pascals, air), metresPerSecond, metresPerSecond);
        return Through(through, even, passages, air) with { EdgeLeakShare = Math.Clamp(1 - (through / metresPerSecond), 0, 1) };
    }

    private static MediumFlow Through(double metresPerSecond, EvenLayer[] even, LayerPassage[] passages, AirProperties air)
    {
        var layers = new LayerFlow[passages.Length];
        var pascals = 0.0;
        for (var i = 0; i < layers.Length; i++)
        {
            layers[i] = passages[i].Flow(even[i], metresPerSecond, air);
            pascals += layers[i].Pascals;
        }

        return new MediumFlow(pascals, metresPerSecond, 0, layers);
    }
}
