using FiberScope.Filtration.Passage;

namespace FiberScope.Filtration.Uncertainty;

/// <summary>A particle size of the curve, and the charges its particles carry.</summary>
internal sealed record SizeTraits(Particle Particle, ChargeStates States);
