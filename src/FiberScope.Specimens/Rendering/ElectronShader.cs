using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Rendering;

/// <summary>How bright a point of a surface is under the electron beam, before the instrument blurs it.</summary>
internal sealed class ElectronShader
{
    private const int TableSize = 2048;
    private const float DetectorX = -0.55f, DetectorY = -0.835f;

    private readonly MatModel _mat;
    private readonly SegmentSet _set;
    private readonly ElectronLook _look;
    private readonly float[] _secant = new float[TableSize + 1];
    private readonly float[] _decay = new float[TableSize + 1];
    private readonly float[] _near, _wide;
    private readonly ValueNoise _fine, _coarse;
    private readonly float _depthScale, _top;

    /// <param name="mat">The mat.</param>
    /// <param name="set">Its stretches of fibre.</param>
    /// <param name="heights">Height of the uppermost surface at each pixel's centre.</param>
    /// <param name="seed">Seed of the mottle.</param>
    public ElectronShader(MatModel mat, SegmentSet set, float[] heights, ulong seed)
    {
        (_mat, _set, _look) = (mat, set, mat.Scale.Recipe.Electrons);
        for (var i = 0; i <= TableSize; i++)
        {
            var u = i / (double)TableSize;
            _secant[i] = (float)Math.Min(_look.RimCap, PortableMath.Pow(Math.Max(1e-6, 1 - (u * u)), -_look.RimExponent / 2));
            _decay[i] = (float)PortableMath.Exp(-8.0 * i / TableSize);
        }

        _depthScale = (float)(1 / mat.Scale.MeanDepth);
        _top = (float)mat.Scale.LaidDepth;
        _near = Smooth(heights, 1.1 * mat.Scale.MeanDiameter);
        _wide = Smooth(heights, 5 * mat.Scale.MeanDiameter);
        _fine = new ValueNoise(seed ^ 0x51UL, 2.3f);
        _coarse = new ValueNoise(seed ^ 0xA7UL, (float)Math.Max(5, 0.8 * mat.Scale.MeanDiameter));
    }

    /// <summary>The mottle of a pixel, to be shared by its samples.</summary>
    public (float Fine, float Coarse) MottleAt(int column, int row) =>
        ((float)_look.Mottle * 1.5f * _fine.At(column, row), _coarse.At(column, row));

    public float Shade(TileRaster tile, int sample, int pixel, (float Fine, float Coarse) mottle)
    {
        var id = tile.Id[sample];
        var own = Surface(id, tile.U[sample], tile.Z[sample], pixel, mottle);
        if (_look.Translucency <= 0 || id < 0 || tile.Id2[sample] == TileRaster.Ground)
        {
            return own;
        }

        var thickness = 2 * _set.Segments[id].From.Radius / (float)_mat.Scale.MeanDiameter;
        var through = (float)_look.Translucency / Math.Max(0.7f, thickness);
        return own + (through * Surface(tile.Id2[sample], tile.U2[sample], tile.Z2[sample], pixel, mottle));
    }

    private float Surface(int id, float u, float z, int pixel, (float Fine, float Coarse) mottle)
    {
        if (id == TileRaster.Ground)
        {
            return (float)_look.Ground * Crevice(0, pixel) * (1 + mottle.Fine + (0.15f * mottle.Coarse));
        }

        var shine = id >= 0 ? Fibre(id, u) : id > TileRaster.BodyId(_mat.Bodies.Length) ? Body(-2 - id, u, mottle.Coarse) : Film(-2 - id - _mat.Bodies.Length, u, mottle.Coarse);
        var deep = (float)_look.DeepBrightness;
        var light = deep + ((1 - deep) * Decay((_top - z) * _depthScale / (float)_look.ShadingDepth));
        return Math.Max(0.01f, shine * light * Crevice(z, pixel) * (1 + mottle.Fine));
    }

    private float Fibre(int id, float u)
    {
        ref readonly var segment = ref _set.Segments[id];
        var fibre = _mat.Fibres[segment.Fibre];
        var towards = (-segment.From.TangentY * DetectorX) + (segment.From.TangentX * DetectorY);
        var rim = fibre.Rim * (Secant(u) - 1);
        return fibre.Brightness * (1 + rim - ((float)_look.Dome * u * u)) * (1 + ((float)_look.Asymmetry * u * towards));
    }

    private float Body(int body, float u, float coarse) =>
        _mat.Bodies[body].Brightness * (0.68f + (0.22f * u * u * u) + (0.5f * (float)_look.RimHeight * (Secant(u) - 1)) + (0.14f * coarse));

    private float Film(int film, float closeness, float coarse)
    {
        var rim = Math.Max(0, closeness - 0.93f) * 4;
        return _mat.Films[film].Brightness * (0.85f + rim + (0.1f * coarse));
    }

    private float Crevice(float z, int pixel)
    {
        var below = Math.Max(0, _near[pixel] - z) + (0.7f * Math.Max(0, _wide[pixel] - z));
        return Decay((float)_look.CreviceShadow * below * _depthScale);
    }

    private float Secant(float u) => _secant[(int)(Math.Abs(u) * TableSize)];

    private float Decay(float x) => _decay[Math.Min(TableSize, (int)(Math.Max(0, x) * (TableSize / 8f)))];

    private float[] Smooth(float[] heights, double sigma)
    {
        var copy = (float[])heights.Clone();
        Smoothing.Gaussian(copy, _mat.Scale.Width, _mat.Scale.Height, Math.Max(1.5, sigma));
        return copy;
    }
}
