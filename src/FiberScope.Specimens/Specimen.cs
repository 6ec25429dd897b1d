namespace FiberScope.Specimens;

/// <summary>A virtual specimen: its picture, what the picture would be without noise, and the truth about it.</summary>
public sealed class Specimen
{
    private readonly byte[] _pixels;
    private readonly float[] _noiseFree;
    private readonly byte[] _defects;
    private readonly int[] _topFibre;

    internal Specimen(SpecimenTruth truth, byte[] pixels, float[] noiseFree, byte[] defects, int[] topFibre) =>
        (Truth, _pixels, _noiseFree, _defects, _topFibre) = (truth, pixels, noiseFree, defects, topFibre);

    /// <summary>What is truly in it.</summary>
    public SpecimenTruth Truth { get; }

    /// <summary>The recipe it was made from.</summary>
    public SpecimenRecipe Recipe => Truth.Recipe;

    /// <summary>Columns; pixels.</summary>
    public int Width => Recipe.WidthPixels;

    /// <summary>Rows, the information strip included; pixels.</summary>
    public int Height => Recipe.HeightPixels;

    /// <summary>The picture, 8-bit grey, row by row from the top left; height × width bytes.</summary>
    public ReadOnlySpan<byte> Pixels => _pixels;

    /// <summary>The field before noise and clipping, 0 black to 1 white; field rows × width values, without the strip.</summary>
    public ReadOnlySpan<float> NoiseFree => _noiseFree;

    /// <summary>Per pixel of the field 0, or the number of the kind of defect (<see cref="DefectForm"/>) that is uppermost there.</summary>
    public ReadOnlySpan<byte> DefectMask => _defects;

    /// <summary>Per pixel of the field the number of the uppermost fibre, −1 for none, below −1 for a defect; empty for sections.</summary>
    public ReadOnlySpan<int> TopFibre => _topFibre;
}
