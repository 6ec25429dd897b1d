namespace FiberScope.Validation.Filtration.Reference;

/// <summary>Rings and sectors between the collision surface and the rim, with what flows and diffuses through their faces.</summary>
internal sealed class PolarGrid
{
    /// <summary>Width of the sectors in the wake, relative to even ones.</summary>
    private const double WakeSpacing = 0.06;

    private readonly double[] _faces;
    private readonly double[] _angles;
    private readonly double[] _stream;
    private readonly double[] _conductance;
    private readonly double[] _sines;
    private readonly double _diffusivity;

    public PolarGrid(CellFlow flow, double peclet, double ratio, int rings, int sectors)
    {
        Rings = rings;
        Sectors = sectors;
        _diffusivity = 2 / peclet;
        var inner = 1 + ratio;
        _faces = Graded(inner, flow.Rim, LayerThickness(flow, peclet), rings);
        _stream = Array.ConvertAll(_faces, r => flow.Stream(r));
        _angles = [.. Enumerable.Range(0, sectors + 1).Select(j => Angle(j / (double)sectors))];
        _sines = Array.ConvertAll(_angles, Math.Sin);
        _sines[sectors] = 0;
        _conductance = new double[rings + 1];
        for (var k = 0; k <= rings; k++)
        {
            var below = k == 0 ? inner : Centre(k - 1);
            var above = k == rings ? flow.Rim : Centre(k);
            _conductance[k] = _diffusivity / Math.Log(above / below);
        }
    }

    public int Rings { get; }

    public int Sectors { get; }

    /// <summary>Air through the outer face of ring <paramref name="i"/> (−1: the collision surface) within a sector, outward positive.</summary>
    public double RadialFlow(int i, int j) => _stream[i + 1] * (_sines[j + 1] - _sines[j]);

    /// <summary>Diffusive conductance of the same face.</summary>
    public double Conductance(int i, int j) => _conductance[i + 1] * (_angles[j + 1] - _angles[j]);

    /// <summary>Air from sector <paramref name="j"/> to the next in ring <paramref name="i"/>.</summary>
    public double SectorFlow(int i, int j) => -(_stream[i + 1] - _stream[i]) * _sines[j + 1];

    /// <summary>Diffusive conductance between sector <paramref name="j"/> and the next in ring <paramref name="i"/>.</summary>
    public double SectorConductance(int i, int j) =>
        _diffusivity * Math.Log(_faces[i + 1] / _faces[i]) * 2 / (_angles[j + 2] - _angles[j]);

    /// <summary>How much of the next sector's concentration stands at the face between sector <paramref name="j"/> and it.</summary>
    public double NextShare(int j) => (_angles[j + 1] - _angles[j]) / (_angles[j + 2] - _angles[j]);

    /// <summary>A smooth spacing, finer in the wake (θ near 0), whose depleted streak is thin at large Pe.</summary>
    private static double Angle(double share) => Math.PI * share * (WakeSpacing + ((1 - WakeSpacing) * share));

    private double Centre(int i) => 0.5 * (_faces[i] + _faces[i + 1]);

    /// <summary>The thickness that diffusion reaches into the air on its way past the fibre.</summary>
    private static double LayerThickness(CellFlow flow, double peclet)
    {
        var curvature = Math.Max(flow.StreamCurvature(1), 1e-3);
        var slow = Math.Pow(curvature * peclet / 4, -1d / 3);
        var slip = flow.StreamSlope(1);
        return slip > 0 ? Math.Min(slow, 1 / Math.Sqrt(slip * peclet / 2)) : slow;
    }

    /// <summary>Faces that widen as a hyperbolic sine, about a quarter of them inside the layer.</summary>
    private static double[] Graded(double inner, double outer, double layer, int rings)
    {
        const double ShareInsideLayer = 0.3;
        var span = outer - inner;
        var wanted = Math.Min(layer / span, ShareInsideLayer);
        var (low, high) = (1e-6, 60d);
        for (var k = 0; k < 80; k++)
        {
            var middle = 0.5 * (low + high);
            (low, high) = Math.Sinh(middle * ShareInsideLayer) / Math.Sinh(middle) > wanted ? (middle, high) : (low, middle);
        }

        return [.. Enumerable.Range(0, rings + 1).Select(k => inner + (span * Math.Sinh(low * k / rings) / Math.Sinh(low)))];
    }
}
