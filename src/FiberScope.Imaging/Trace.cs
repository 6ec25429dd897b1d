using System.Collections.Immutable;

namespace FiberScope.Imaging;

/// <summary>The measured centre line of one visible fibre segment.</summary>
/// <param name="Id">The trace's number in its field, from 0.</param>
/// <param name="CentreLine">Points along the fibre, in order, at least two.</param>
public sealed record Trace(int Id, ImmutableArray<TracePoint> CentreLine);
