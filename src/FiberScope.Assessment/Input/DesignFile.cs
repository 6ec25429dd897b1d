using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>What a design file tells: a medium to start from, targets, and what may change.</summary>
public sealed record DesignFile
{
    /// <summary>The file as the user named it.</summary>
    public required string Name { get; init; }

    /// <summary>The medium to start from, with its use; what nothing varies stays as it is.</summary>
    public required MediaFile Start { get; init; }

    /// <summary>The density of the fibres, for basis weight.</summary>
    public required Density FibreDensity { get; init; }

    /// <summary>What must be reached.</summary>
    public required DesignTargets Targets { get; init; }

    /// <summary>What the aerosol of the targets is called; empty without one.</summary>
    public required string AerosolName { get; init; }

    /// <summary>What may change; at least one.</summary>
    public required ImmutableArray<DesignVariable> Variables { get; init; }

    /// <summary>The variables of the map, by index: across and up; null with one variable only.</summary>
    public required (int Across, int Up)? Map { get; init; }

    /// <summary>Reads and checks a design file.</summary>
    /// <exception cref="InputException">The file cannot be read or something in it is wrong; every problem is listed.</exception>
    public static DesignFile Read(string path) => DesignFileReader.Read(InputText.FromFile(path), Path.GetDirectoryName(Path.GetFullPath(path))!);

    /// <summary>Reads and checks the text of a design file.</summary>
    /// <param name="text">The YAML text.</param>
    /// <param name="name">The name to use in messages.</param>
    /// <param name="folder">The folder that relative paths start from.</param>
    /// <exception cref="InputException">Something in the text is wrong; every problem is listed.</exception>
    public static DesignFile Parse(string text, string name, string folder) => DesignFileReader.Read(new InputText(name, text), folder);
}
