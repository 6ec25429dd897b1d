namespace FiberScope.Assessment.Input;

/// <summary>A value that a person wrote down, with its uncertainty where they gave one.</summary>
/// <typeparam name="T">The quantity.</typeparam>
/// <param name="Value">The value.</param>
/// <param name="RelativeUncertainty">Its standard uncertainty over the value; dimensionless, zero or above; null when not told.</param>
public sealed record Stated<T>(T Value, double? RelativeUncertainty = null);
