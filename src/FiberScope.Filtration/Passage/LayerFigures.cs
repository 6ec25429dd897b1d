using FiberScope.Filtration.Correlations;

namespace FiberScope.Filtration.Passage;

/// <summary>The numbers of a layer in SI, apart from the units they came in; changed with <c>with</c> for every draw.</summary>
internal readonly record struct LayerFigures
{
    public required double[] DiameterMetres { get; init; }

    /// <summary>Shares of the fibre length; they sum to one.</summary>
    public required double[] LengthFractions { get; init; }

    public required double Solidity { get; init; }

    public required double ThicknessMetres { get; init; }

    public double? Inhomogeneity { get; init; }

    public double CoulombsPerSquareMetre { get; init; }

    public double FibrePermittivity { get; init; }

    /// <summary>Further division of the drag beyond a mat that obeys Davies' law; 1 when nothing is known.</summary>
    public double Unevenness => Inhomogeneity is { } given ? given / KirschStechkinaModel.DaviesInhomogeneity(Solidity) : 1;

    public static LayerFigures Of(MediaLayer layer) => new()
    {
        DiameterMetres = [.. layer.Diameters.Classes.Select(c => c.Diameter.Meters)],
        LengthFractions = [.. layer.Diameters.Classes.Select(c => c.LengthFraction)],
        Solidity = layer.Solidity.Fraction,
        ThicknessMetres = layer.Thickness.Meters,
        Inhomogeneity = layer.InhomogeneityFactor,
        CoulombsPerSquareMetre = layer.Charge?.CoulombsPerSquareMetre ?? 0,
        FibrePermittivity = layer.Charge?.FibrePermittivity ?? 1,
    };
}
