namespace FiberScope.Assessment.Measuring;

/// <summary>How far a run has come.</summary>
/// <param name="Done">Steps done.</param>
/// <param name="Total">Steps in all.</param>
/// <param name="What">What was just done, for people: <c>measured fields/a.tif</c>.</param>
public sealed record RunProgress(int Done, int Total, string What);
