using FiberScope.Assessment.Auditing;

namespace FiberScope.Assessment.Json;

/// <summary>The key of an audit.</summary>
internal sealed record AuditKeyEntry(string Schema, string Software, string Source, string SourceSha256, int Seed, AuditKeyCropEntry[] Crops)
{
    public static AuditKeyEntry Of(AuditKey key) => new(
        Schemas.AuditKey,
        Assessment.Software.Version,
        key.Source,
        key.SourceSha256,
        key.Seed,
        [.. key.Crops.Select(AuditKeyCropEntry.Of)]);
}

/// <summary>One crop with the machine's reading.</summary>
internal sealed record AuditKeyCropEntry(
    string Crop,
    double UmPerPx,
    string Layer,
    string Image,
    string ImageSha256,
    int Page,
    int Field,
    int Trace,
    double XPx,
    double YPx,
    double DirectionDeg,
    double DiameterUm,
    double UUm,
    double PixelSizeUm)
{
    public static AuditKeyCropEntry Of(AuditCrop c) => new(
        c.Name,
        c.MicrometresPerPixel,
        c.Reading.Layer,
        c.Reading.Image,
        c.Reading.ImageSha256,
        c.Reading.Page,
        c.Reading.Field,
        c.Reading.Trace,
        c.Reading.X,
        c.Reading.Y,
        c.Reading.DirectionDegrees,
        c.Reading.Diameter.Micrometers,
        c.Reading.StandardUncertainty.Micrometers,
        c.Reading.PixelSize.Micrometers);
}
