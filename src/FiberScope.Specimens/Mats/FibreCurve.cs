namespace FiberScope.Specimens.Mats;

/// <summary>A point on a fibre's axis: place and height in pixels, radius in pixels, unit tangent in the plane.</summary>
internal readonly record struct FibreNode(float X, float Y, float Z, float Radius, float TangentX, float TangentY);

/// <summary>One fibre of the mat.</summary>
internal sealed class FibreCurve
{
    public required FibreNode[] Nodes { get; init; }

    /// <summary>Its mean diameter; pixels.</summary>
    public required double Diameter { get; init; }

    public required float Brightness { get; init; }

    public required float Rim { get; init; }

    /// <summary>The rope it belongs to; −1 for none.</summary>
    public int Rope { get; init; } = -1;

    /// <summary>Height of its middle; pixels above the lowest layer laid.</summary>
    public float Level => Nodes[Nodes.Length / 2].Z;
}
