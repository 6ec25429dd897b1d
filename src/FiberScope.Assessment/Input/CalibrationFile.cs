using System.Collections.Immutable;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Input;

/// <summary>What a calibration file tells: rolls of one grade, each with its structure and what a rig showed for it.</summary>
public sealed record CalibrationFile
{
    /// <summary>The file as the user named it.</summary>
    public required string Name { get; init; }

    /// <summary>The grade.</summary>
    public required string Grade { get; init; }

    /// <summary>The rolls; at least one.</summary>
    public required ImmutableArray<CalibrationRoll> Rolls { get; init; }

    /// <summary>The correlations asked for; null for the default.</summary>
    public required CorrelationSet? Correlations { get; init; }

    /// <summary>Reads and checks a calibration file.</summary>
    /// <exception cref="InputException">The file cannot be read or something in it is wrong; every problem is listed.</exception>
    public static CalibrationFile Read(string path) => CalibrationFileReader.Read(InputText.FromFile(path), Path.GetDirectoryName(Path.GetFullPath(path))!);

    /// <summary>Reads and checks the text of a calibration file.</summary>
    /// <param name="text">The YAML text.</param>
    /// <param name="name">The name to use in messages.</param>
    /// <param name="folder">The folder that relative paths start from.</param>
    /// <exception cref="InputException">Something in the text is wrong; every problem is listed.</exception>
    public static CalibrationFile Parse(string text, string name, string folder) => CalibrationFileReader.Read(new InputText(name, text), folder);
}
