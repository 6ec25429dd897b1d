namespace FiberScope.Fibres;

/// <summary>Something a reader must know before relying on a number; it travels with the result to the report.</summary>
/// <param name="Code">A short stable name for programs, such as <c>outside-fitted-range</c>.</param>
/// <param name="Message">One sentence for people: what, where, the range, what to do.</param>
public sealed record Caveat(string Code, string Message);
