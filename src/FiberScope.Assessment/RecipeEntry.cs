namespace FiberScope.Assessment;

/// <summary>One named value of a recipe, as text in the invariant culture.</summary>
/// <param name="Name">What it is, as the files call it: <c>face_velocity</c>, <c>bootstrap seed</c>.</param>
/// <param name="Value">The value with its unit.</param>
/// <param name="Origin">Where it came from: <c>swatch file, line 12</c>, <c>default</c>, <c>command line</c>.</param>
public sealed record RecipeEntry(string Name, string Value, string Origin);
