using System.Reflection;

namespace FiberScope.Assessment;

/// <summary>This program's own name and version.</summary>
public static class Software
{
    /// <summary>Name, version and source revision where known: <c>FiberScope 0.1.0+1b7c706…</c>.</summary>
    public static string Version { get; } = "FiberScope " + (typeof(Software).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "of unknown version");
}
