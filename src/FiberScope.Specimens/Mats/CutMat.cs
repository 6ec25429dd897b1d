using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Mats;

/// <summary>One cut fibre: an ellipse. Pixels.</summary>
internal readonly record struct CutFibre(double X, double Y, double Minor, double Major, double Cos, double Sin, double Brightness)
{
    /// <summary>Below 1 inside the ellipse.</summary>
    public double Level(double x, double y)
    {
        var (dx, dy) = (x - X, y - Y);
        var (p, q) = (((dx * Cos) + (dy * Sin)) / Major * 2, ((dy * Cos) - (dx * Sin)) / Minor * 2);
        return (p * p) + (q * q);
    }
}

/// <summary>A mat cut by a plane: ellipses placed at random that do not overlap.</summary>
/// <remarks>
/// A plane meets a fibre with a chance proportional to the cosine of the angle between the fibre and the plane's normal, and cuts it in
/// an ellipse whose axes have the ratio 1 / cosine. Fibres within 15° of the plane are left out.
/// </remarks>
internal sealed class CutMat
{
    private const double SmallestCosine = 0.2588;
    private readonly SeededRandom _random;
    private readonly double _margin, _cell;
    private readonly Dictionary<(int, int), List<int>> _grid = [];
    private readonly List<CutFibre> _fibres = [];

    private CutMat(MatScale scale, SeededRandom random)
    {
        (Scale, _random) = (scale, random);
        _margin = 6 * scale.MeanDiameter;
        _cell = 2 * scale.MeanDiameter;
    }

    public MatScale Scale { get; }

    public IReadOnlyList<CutFibre> Fibres => _fibres;

    public static CutMat Lay(MatScale scale, SeededRandom random, CancellationToken cancellation)
    {
        var mat = new CutMat(scale, random);
        var area = (scale.Width + (2 * mat._margin)) * (scale.Height + (2 * mat._margin)) * scale.Recipe.Mat.Solidity;
        var wanted = new List<CutFibre>();
        while (area > 0)
        {
            var fibre = mat.Draw();
            wanted.Add(fibre);
            area -= Math.PI / 4 * fibre.Minor * fibre.Major;
        }

        foreach (var fibre in wanted.OrderByDescending(f => f.Major))
        {
            cancellation.ThrowIfCancellationRequested();
            mat.Place(fibre);
        }

        return mat;
    }

    private CutFibre Draw()
    {
        var diameter = Scale.Diameters.Draw(_random);
        double cosine;
        do
        {
            // The wrapped Cauchy law about the plane's normal, as for the fibres of a mat seen from above.
            var (sin, cos) = PortableMath.SinCos(Math.PI * (_random.Next() - 0.5));
            var order = Scale.Recipe.Mat.OrientationOrder;
            var tangent = (1 - order) / (1 + order) * sin / Math.Max(cos, 1e-12);
            cosine = 1 / Math.Sqrt(1 + (tangent * tangent));
        }
        while (cosine < SmallestCosine || _random.Next() > cosine);
        var tilt = PortableMath.SinCos(0.05 * _random.Normal());
        var brightness = 1 + (Scale.Recipe.Section.BrightnessSpread * _random.Normal());
        return new CutFibre(0, 0, diameter, diameter / cosine, tilt.Cos, tilt.Sin, brightness);
    }

    private void Place(CutFibre fibre)
    {
        for (var attempt = 0; attempt < 400; attempt++)
        {
            var touching = _fibres.Count > 0 && attempt < 40 && _random.Next() < Scale.Recipe.Section.TouchingShare;
            var placed = touching ? BesideANeighbour(fibre) : fibre with
            {
                X = _random.Between(-_margin, Scale.Width + _margin),
                Y = _random.Between(-_margin, Scale.Height + _margin),
            };
            if (!Overlaps(placed))
            {
                _fibres.Add(placed);
                foreach (var cell in Cells(placed))
                {
                    (_grid.TryGetValue(cell, out var list) ? list : _grid[cell] = []).Add(_fibres.Count - 1);
                }

                return;
            }
        }
    }

    private CutFibre BesideANeighbour(CutFibre fibre)
    {
        var neighbour = _fibres[_random.Below(_fibres.Count)];
        var (sin, cos) = PortableMath.SinCos(2 * Math.PI * _random.Next());
        var (near, far) = (0.0, (neighbour.Major + fibre.Major) / 2);
        for (var i = 0; i < 24; i++)
        {
            var middle = (near + far) / 2;
            var trial = fibre with { X = neighbour.X + (middle * cos), Y = neighbour.Y + (middle * sin) };
            (near, far) = Overlap(trial, neighbour) ? (middle, far) : (near, middle);
        }

        return fibre with { X = neighbour.X + (far * cos), Y = neighbour.Y + (far * sin) };
    }

    private bool Overlaps(CutFibre fibre) =>
        Cells(fibre).Any(cell => _grid.TryGetValue(cell, out var list) && list.Any(other => Overlap(fibre, _fibres[other])));

    private IEnumerable<(int, int)> Cells(CutFibre fibre)
    {
        var half = fibre.Major / 2;
        for (var row = (int)Math.Floor((fibre.Y - half) / _cell); row <= (int)Math.Floor((fibre.Y + half) / _cell); row++)
        {
            for (var column = (int)Math.Floor((fibre.X - half) / _cell); column <= (int)Math.Floor((fibre.X + half) / _cell); column++)
            {
                yield return (column, row);
            }
        }
    }

    private static bool Overlap(CutFibre a, CutFibre b)
    {
        var (dx, dy) = (a.X - b.X, a.Y - b.Y);
        var reach = (a.Major + b.Major) / 2;
        return (dx * dx) + (dy * dy) < reach * reach && (RimInside(a, b) || RimInside(b, a));
    }

    private static bool RimInside(CutFibre a, CutFibre b)
    {
        const int points = 36;
        for (var i = 0; i < points; i++)
        {
            var (sin, cos) = Unit[i];
            var (p, q) = (a.Major / 2 * cos, a.Minor / 2 * sin);
            if (b.Level(a.X + (p * a.Cos) - (q * a.Sin), a.Y + (p * a.Sin) + (q * a.Cos)) < 1)
            {
                return true;
            }
        }

        return b.Level(a.X, a.Y) < 1;
    }

    private static readonly (double Sin, double Cos)[] Unit = [.. Enumerable.Range(0, 36).Select(i => PortableMath.SinCos(2 * Math.PI * i / 36))];
}
