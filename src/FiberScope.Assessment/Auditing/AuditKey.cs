using System.Collections.Immutable;

namespace FiberScope.Assessment.Auditing;

/// <summary>What the crops of an audit show by the machine's reading; kept from the person who measures.</summary>
/// <param name="Source">The file that the readings were drawn from.</param>
/// <param name="SourceSha256">Its SHA-256.</param>
/// <param name="Seed">The seed of the draw.</param>
/// <param name="Crops">The crops, in the order of their names.</param>
public sealed record AuditKey(string Source, string SourceSha256, int Seed, ImmutableArray<AuditCrop> Crops)
{
    /// <summary>The file's name in the audit's folder.</summary>
    public const string FileName = "audit-key.json";
}

/// <summary>One crop.</summary>
/// <param name="Name">The picture's file name.</param>
/// <param name="MicrometresPerPixel">The side of one of the crop's pixels on the specimen, µm.</param>
/// <param name="Reading">What the machine read there.</param>
public sealed record AuditCrop(string Name, double MicrometresPerPixel, AuditReading Reading);
