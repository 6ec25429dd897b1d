using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>What passes in a band of particle size, averaged evenly in the logarithm of size.</summary>
/// <param name="From">The band's lower end.</param>
/// <param name="To">Its upper end.</param>
/// <param name="Result">What passes.</param>
public sealed record BandFinding(Length From, Length To, ChallengeResult Result);
