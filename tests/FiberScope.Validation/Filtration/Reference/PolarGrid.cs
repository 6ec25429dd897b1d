namespace FiberScope.Validation.Filtration.Reference;

/// <summary>Rings and sectors between the collision surface and the rim, with what flows and diffuses through their faces.</summary>
internal sealed class PolarGrid
{
    private readonly double[] _faces;
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
        var step = Math.PI / sectors;
        _sines = [.. Enumerable.Range(0, sectors + 1).Select(j => Math.Sin(j * step))];
        _sines[sectors] = 0;
        _conductance = new double[rings + 1];
        for (var k = 0; k <= rings; k++)
        {
            var below = k == 0 ? inner : Centre(k - 1);
            var above = k == rings ? flow.Rim : Centre(k);
            _conductance[k] = _diffusivity * step / Math.Log(above / below);
        }
    }

    public int Rings { get; }

    public int Sectors { get; }

    /// <summary>Air through the outer face of ring <paramref name="i"/> (−1: the collision surface) within a sector, outward positive.</summary>
    public double RadialFlow(int i, int j) => _stream[i + 1] * (_sines[j + 1] - _sines[j]);

    /// <summary>Diffusive conductance of the same face.</summary>
    public double Conductance(int i) => _conductance[i + 1];

    /// <summary>Air from sector <paramref name="j"/> to the next in ring <paramref name="i"/>.</summary>
    public double SectorFlow(int i, int j) => -(_stream[i + 1] - _stream[i]) * _sines[j + 1];

    /// <summary>Diffusive conductance between neighbouring sectors in ring <paramref name="i"/>.</summary>
    public double SectorConductance(int i) => _diffusivity * Math.Log(_faces[i + 1] / _faces[i]) * Sectors / Math.PI;

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
