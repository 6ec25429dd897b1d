using System.Xml.Linq;
using FiberScope.TestKit;

namespace FiberScope.Architecture.Tests;

/// <summary>This table is the architecture: which project may use which, and where each package lives.</summary>
internal static class Arrows
{
    public static readonly IReadOnlyDictionary<string, string[]> Allowed = new Dictionary<string, string[]>(StringComparer.Ordinal)
    {
        ["Statistics"] = [],
        ["Fibres"] = ["Statistics"],
        ["Imaging"] = ["Fibres", "Statistics"],
        ["Filtration"] = ["Fibres", "Statistics"],
        ["Conformity"] = ["Fibres", "Statistics"],
        ["Specimens"] = ["Fibres", "Statistics"],
        ["Assessment"] = ["Conformity", "Fibres", "Filtration", "Imaging", "Statistics"],
        ["Reports"] = ["Assessment", "Conformity", "Fibres", "Filtration", "Imaging", "Statistics"],
        ["Cli"] = ["Assessment", "Conformity", "Fibres", "Filtration", "Imaging", "Reports", "Specimens", "Statistics"],
    };

    /// <summary>Packages with one home; the others (units, numbers, analyzers) may be used anywhere.</summary>
    public static readonly IReadOnlyDictionary<string, string[]> Homes = new Dictionary<string, string[]>(StringComparer.Ordinal)
    {
        ["OpenCvSharp4"] = ["Imaging"],
        ["System.Numerics.Tensors"] = ["Imaging", "Filtration"],
        ["OpenCvSharp4.official.runtime.linux-x64"] = ["Imaging"],
        ["OpenCvSharp4.runtime.win"] = ["Imaging"],
        ["OpenCvSharp4.runtime.osx_arm64"] = ["Imaging"],
        ["BitMiracle.LibTiff.NET"] = ["Imaging", "Specimens"],
        ["SixLabors.ImageSharp"] = ["Imaging", "Reports", "Specimens"],
        ["YamlDotNet"] = ["Assessment", "Specimens"],
        ["Microsoft.Extensions.FileSystemGlobbing"] = ["Assessment"],
        ["OxyPlot.Core"] = ["Reports"],
        ["System.CommandLine"] = ["Cli"],
        ["Spectre.Console"] = ["Cli"],
    };

    public static readonly string[] FreePackages =
        ["UnitsNet", "MathNet.Numerics", "Meziantou.Analyzer", "Microsoft.CodeAnalysis.BannedApiAnalyzers"];

    public static IEnumerable<string> Projects => Directory
        .EnumerateDirectories(Repository.PathTo("src"), "FiberScope.*")
        .Select(folder => Path.GetFileName(folder)["FiberScope.".Length..])
        .Order(StringComparer.Ordinal);

    public static string[] References(string project) =>
        [.. Items(project, "ProjectReference").Select(path => Path.GetFileNameWithoutExtension(path.Replace('\\', '/'))["FiberScope.".Length..]).Order(StringComparer.Ordinal)];

    public static string[] Packages(string project) => [.. Items(project, "PackageReference").Order(StringComparer.Ordinal)];

    public static IEnumerable<string> Sources(string project) => Directory
        .EnumerateFiles(Repository.PathTo("src", "FiberScope." + project), "*.cs", SearchOption.AllDirectories);

    private static IEnumerable<string> Items(string project, string kind) =>
        XDocument.Load(Repository.PathTo("src", "FiberScope." + project, $"FiberScope.{project}.csproj"))
            .Descendants(kind)
            .Select(item => item.Attribute("Include")!.Value);
}
