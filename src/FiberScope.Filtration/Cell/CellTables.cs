using System.Reflection;

namespace FiberScope.Filtration.Cell;

/// <summary>The tables of the numerical solution that ship with the program, read once.</summary>
public static class CellTables
{
    /// <summary>Diffusion with interception: ln of the numerical efficiency over <see cref="BoundaryLayerEstimate"/>.</summary>
    public static CellTable Diffusion { get; } = Read("diffusion.csv");

    /// <summary>Inertia with interception: ln of the numerical efficiency over exact interception.</summary>
    public static CellTable Impaction { get; } = Read("impaction.csv");

    private static CellTable Read(string name)
    {
        using var stream = Assembly.GetExecutingAssembly().GetManifestResourceStream($"{typeof(CellTables).Namespace}.{name}")
            ?? throw new InvalidOperationException($"The table '{name}' is not part of the program.");
        using var reader = new StreamReader(stream);
        return CellTable.Parse(reader.ReadToEnd());
    }
}
