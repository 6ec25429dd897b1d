namespace FiberScope.Specimens.Files;

/// <summary>File formats that a picture can be written in.</summary>
public enum SpecimenFormat
{
    /// <summary>TIFF, 8-bit grey, deflated, with the true scale in its resolution tags.</summary>
    Tiff,

    /// <summary>PNG, 8-bit grey, with the true scale in its physical size.</summary>
    Png,

    /// <summary>JPEG, 8-bit grey.</summary>
    Jpeg,
}
