using System.Collections.Immutable;
using FiberScope.Filtration;
using UnitsNet;

namespace FiberScope.Assessment.Input;

/// <summary>What is asked of a forecast beside the curve at the operating point.</summary>
public sealed record ForecastRequest
{
    /// <summary>The area of medium in the finished product; null when not told.</summary>
    public Area? MediaArea { get; init; }

    /// <summary>Aerosols to send against the medium; may be empty.</summary>
    public ImmutableArray<NamedAerosol> Challenges { get; init; } = [];

    /// <summary>Bands of particle size to average over; may be empty.</summary>
    public ImmutableArray<SizeBand> Bands { get; init; } = [];

    /// <summary>What passes beside the medium of a mask; null when not told.</summary>
    public MaskLeak? Mask { get; init; }

    /// <summary>Two penetrations that tell the fibre charge; null when none were told.</summary>
    public ChargePair? ChargePair { get; init; }

    /// <summary>What earlier rolls of the grade taught; null without a calibration.</summary>
    public GradeCalibration? Calibration { get; init; }
}

/// <summary>An aerosol to send against the medium.</summary>
/// <param name="Name">What to call it.</param>
/// <param name="Aerosol">The aerosol.</param>
/// <param name="FaceVelocity">The velocity that it comes at; null for the operating point's.</param>
/// <param name="Discharged">Whether the medium counts as discharged.</param>
public sealed record NamedAerosol(string Name, ChallengeAerosol Aerosol, Speed? FaceVelocity, bool Discharged);

/// <summary>A band of particle size.</summary>
/// <param name="From">Its lower end; above zero.</param>
/// <param name="To">Its upper end; above <paramref name="From"/>.</param>
public sealed record SizeBand(Length From, Length To);

/// <summary>Shares of the inhaled air that come past the medium of a mask.</summary>
/// <param name="Seal">Through the face seal; dimensionless, 0 to 1.</param>
/// <param name="Valve">Through the exhalation valve; dimensionless, 0 to 1.</param>
public sealed record MaskLeak(double Seal, double Valve);

/// <summary>A penetration as received and one discharged, at the operating point, which together tell the fibre charge.</summary>
/// <param name="Particle">The particle size of both.</param>
/// <param name="AsReceived">Penetration as received; dimensionless, in (0, 1).</param>
/// <param name="Discharged">Penetration discharged; dimensionless, in (0, 1).</param>
/// <param name="RelativeUncertainty">Relative standard uncertainty of each; dimensionless.</param>
public sealed record ChargePair(Length Particle, double AsReceived, double Discharged, double RelativeUncertainty);
