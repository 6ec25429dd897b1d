namespace FiberScope.Specimens;

/// <summary>The kinds of defect that a virtual specimen can hold.</summary>
public enum DefectForm
{
    /// <summary>A solidified droplet, or a bead on a fibre.</summary>
    Shot = 1,

    /// <summary>Fibres lying side by side, touching.</summary>
    Rope = 2,

    /// <summary>A patch where fibres have run together.</summary>
    Film = 3,

    /// <summary>Dust and clumps.</summary>
    Debris = 4,
}
