namespace FiberScope.Assessment.Input;

/// <summary>An image file.</summary>
/// <param name="Name">What to call it for people: the path as the pattern leads to it.</param>
/// <param name="Path">Where it is.</param>
public sealed record FoundImage(string Name, string Path);
