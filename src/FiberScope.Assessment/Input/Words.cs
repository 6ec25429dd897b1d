using FiberScope.Filtration;
using FiberScope.Imaging;

namespace FiberScope.Assessment.Input;

/// <summary>The words that files, commands and machine output use for choices.</summary>
public static class Words
{
    /// <summary>How a micrograph was made, by the word that files use.</summary>
    public static IReadOnlyDictionary<string, ImagingMode> ImagingModes { get; } = new Dictionary<string, ImagingMode>(StringComparer.Ordinal)
    {
        ["sem"] = ImagingMode.SecondaryElectron,
        ["transmitted"] = ImagingMode.Transmitted,
        ["cross-section"] = ImagingMode.CrossSection,
    };

    /// <summary>The correlation sets, by the word that files use.</summary>
    public static IReadOnlyDictionary<string, CorrelationSet> Correlations { get; } = new Dictionary<string, CorrelationSet>(StringComparer.Ordinal)
    {
        ["kirsch-stechkina-1978"] = CorrelationSet.KirschStechkina1978,
        ["lee-liu-1982"] = CorrelationSet.LeeLiu1982,
        ["hinds-1999"] = CorrelationSet.Hinds1999,
        ["cell"] = CorrelationSet.Cell,
        ["cell-mat"] = CorrelationSet.CellMat,
    };

    /// <summary>Which way the air flows, by the word that files use.</summary>
    public static IReadOnlyDictionary<string, FlowDirection> FlowDirections { get; } = new Dictionary<string, FlowDirection>(StringComparer.Ordinal)
    {
        ["horizontal"] = FlowDirection.Horizontal,
        ["down"] = FlowDirection.Down,
        ["up"] = FlowDirection.Up,
    };

    /// <summary>How particles are charged, by the word that files use.</summary>
    public static IReadOnlyDictionary<string, ParticleCharging> ParticleCharges { get; } = new Dictionary<string, ParticleCharging>(StringComparer.Ordinal)
    {
        ["equilibrium"] = ParticleCharging.Equilibrium,
        ["none"] = ParticleCharging.Neutral,
    };

    /// <summary>What an instrument sums up, by the word that files use.</summary>
    public static IReadOnlyDictionary<string, AerosolBasis> AerosolBases { get; } = new Dictionary<string, AerosolBasis>(StringComparer.Ordinal)
    {
        ["count"] = AerosolBasis.Count,
        ["mass"] = AerosolBasis.Mass,
        ["scattered-light"] = AerosolBasis.ScatteredLight,
    };

    /// <summary>What may change in a layer while a structure is sought, by the word that files use.</summary>
    public static IReadOnlyDictionary<string, DesignKind> DesignKinds { get; } = new Dictionary<string, DesignKind>(StringComparer.Ordinal)
    {
        ["fibre_diameter"] = DesignKind.MedianDiameter,
        ["gsd"] = DesignKind.DiameterGsd,
        ["basis_weight"] = DesignKind.BasisWeight,
        ["solidity"] = DesignKind.Solidity,
        ["charge"] = DesignKind.Charge,
        ["weight_share"] = DesignKind.WeightShare,
    };

    /// <summary>Yes and no, as YAML files spell them.</summary>
    public static IReadOnlyDictionary<string, bool> YesOrNo { get; } = new Dictionary<string, bool>(StringComparer.Ordinal)
    {
        ["yes"] = true,
        ["no"] = false,
        ["true"] = true,
        ["false"] = false,
    };

    /// <summary>The word for a choice.</summary>
    /// <exception cref="KeyNotFoundException">The choice has no word.</exception>
    public static string Of<T>(IReadOnlyDictionary<string, T> words, T choice)
        where T : struct =>
        words.FirstOrDefault(pair => EqualityComparer<T>.Default.Equals(pair.Value, choice)).Key
        ?? throw new KeyNotFoundException($"No word for {choice}.");
}
