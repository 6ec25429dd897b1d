using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment;

/// <summary>What passes of an aerosol, summed as the instrument sums it.</summary>
/// <param name="Name">What the aerosol is called.</param>
/// <param name="Aerosol">The aerosol.</param>
/// <param name="FaceVelocity">The velocity that it came at.</param>
/// <param name="Discharged">Whether the medium counted as discharged.</param>
/// <param name="Result">What passed.</param>
/// <param name="TotalInwardLeakage">With the mask's leaks beside; null when none were told.</param>
public sealed record ChallengeFinding(string Name, ChallengeAerosol Aerosol, Speed FaceVelocity, bool Discharged, ChallengeResult Result, double? TotalInwardLeakage);
