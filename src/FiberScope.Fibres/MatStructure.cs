namespace FiberScope.Fibres;

/// <summary>What a mat's fields show besides diameters, pooled.</summary>
/// <param name="Orientation">How the fibre length is oriented; null without readings.</param>
/// <param name="Openings">The openings between the foremost fibres; null where nothing shows them.</param>
/// <param name="Uniformity">How evenly the foremost fibres cover the fields; null where nothing shows it.</param>
/// <param name="Defects">What is no single fibre.</param>
public sealed record MatStructure(OrientationSummary? Orientation, OpeningSummary? Openings, UniformitySummary? Uniformity, DefectSummary Defects);
