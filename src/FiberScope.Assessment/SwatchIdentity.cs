namespace FiberScope.Assessment;

/// <summary>Which piece of which material was assessed, as the swatch file tells it; parts not told are empty.</summary>
public sealed record SwatchIdentity
{
    /// <summary>The product's name or number.</summary>
    public string Material { get; init; } = "";

    /// <summary>The production batch.</summary>
    public string Lot { get; init; } = "";

    /// <summary>The roll of the lot.</summary>
    public string Roll { get; init; } = "";

    /// <summary>The swatch of the roll.</summary>
    public string Swatch { get; init; } = "";

    /// <summary>Where along the machine direction the swatch was cut, for people: <c>12 m</c>.</summary>
    public string MachineDirectionPosition { get; init; } = "";

    /// <summary>Where across the machine the swatch was cut, for people: <c>left</c>, <c>0.4 m</c>.</summary>
    public string CrossDirectionPosition { get; init; } = "";

    /// <summary>Anything else worth keeping with the result.</summary>
    public string Note { get; init; } = "";

    /// <summary>A short name for headings: the parts that were told, or the swatch file's name.</summary>
    public required string Title { get; init; }
}
