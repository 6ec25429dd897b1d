namespace FiberScope.Filtration.Uncertainty;

/// <summary>One draw of what is uncertain in a layer.</summary>
internal sealed class LayerDraw
{
    public double DiameterFactor { get; set; } = 1;

    /// <summary>Length fractions of the classes; they sum to one.</summary>
    public required double[] LengthFractions { get; init; }

    public double LogSolidity { get; set; }

    public double LogThickness { get; set; }

    public double LogInhomogeneity { get; set; }

    public double LogCharge { get; set; }
}

/// <summary>One draw of everything uncertain.</summary>
internal sealed class InputDraw
{
    public required LayerDraw[] Layers { get; init; }

    public double LogVelocity { get; set; }

    public double KelvinsAbove { get; set; }

    public double LogPressure { get; set; }
}
