using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Filtration;

namespace FiberScope.Assessment.Predicting;

/// <summary>Answers what was asked of a forecast beside its curve.</summary>
internal sealed class RequestedFindings(IReadOnlyList<MediaLayer> layers, OperatingPoint operation, ForecastRequest request, ForecastSettings settings)
{
    /// <summary>Draws behind the band of one aerosol or size band; fewer than the curve's, for there may be many.</summary>
    private const int AskedDraws = 500;

    private readonly ForecastSettings _asked = settings with { Draws = Math.Min(settings.Draws, AskedDraws) };

    public ImmutableArray<ChallengeFinding> Challenges() => [.. request.Challenges.Select(Challenge)];

    public ImmutableArray<BandFinding> Bands() =>
        [.. request.Bands.Select(b => new BandFinding(b.From, b.To, Filtration.Challenge.OverBand(layers, operation, b.From, b.To, _asked)))];

    public ImmutableArray<ClassForecast> Classes() => MediaClasses.Judge(layers, operation, settings, request.MediaArea);

    /// <summary>What a penetration of the medium becomes with the mask's leaks beside it. An edge leak is in the penetration already.</summary>
    public double? TotalInward(double penetration) => request.Mask is { } mask
        ? Leakage.TotalInward(penetration, mask.Seal, mask.Valve)
        : operation.Leak is null ? null : penetration;

    private ChallengeFinding Challenge(NamedAerosol asked)
    {
        var at = operation with { FaceVelocity = asked.FaceVelocity ?? operation.FaceVelocity };
        IReadOnlyList<MediaLayer> tested = asked.Discharged ? [.. layers.Select(l => l with { Charge = null })] : layers;
        var result = Filtration.Challenge.Penetration(tested, at, asked.Aerosol, _asked);
        return new ChallengeFinding(asked.Name, asked.Aerosol, at.FaceVelocity, asked.Discharged, result, TotalInward(result.Penetration));
    }
}
