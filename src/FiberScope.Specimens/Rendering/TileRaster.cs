using FiberScope.Specimens.Mats;

namespace FiberScope.Specimens.Rendering;

/// <summary>Finds the two uppermost surfaces at every sample of one tile.</summary>
/// <remarks>Surfaces are told apart by number: 0 and above a stretch of fibre, −1 the ground, below that bodies and then films.</remarks>
internal sealed class TileRaster(MatModel mat, SegmentSet set, SamplePattern pattern, float[] lineShift)
{
    public const int Ground = -1;

    private readonly Segment[] _segments = set.Segments;
    private readonly int _count = pattern.Count;
    private int _left, _top, _width, _height;

    /// <summary>Per sample: height of the uppermost surface, its number, and the place across it from −1 to 1.</summary>
    public float[] Z { get; } = new float[SegmentSet.TileWidth * SegmentSet.TileHeight * pattern.Count];

    public int[] Id { get; } = new int[SegmentSet.TileWidth * SegmentSet.TileHeight * pattern.Count];

    public float[] U { get; } = new float[SegmentSet.TileWidth * SegmentSet.TileHeight * pattern.Count];

    /// <summary>The same for the surface below it.</summary>
    public float[] Z2 { get; } = new float[SegmentSet.TileWidth * SegmentSet.TileHeight * pattern.Count];

    public int[] Id2 { get; } = new int[SegmentSet.TileWidth * SegmentSet.TileHeight * pattern.Count];

    public float[] U2 { get; } = new float[SegmentSet.TileWidth * SegmentSet.TileHeight * pattern.Count];

    /// <summary>The number of a body as a surface.</summary>
    public static int BodyId(int body) => -2 - body;

    /// <summary>The index of the first sample of a pixel of this tile.</summary>
    public int Sample(int column, int row) => (((row - _top) * _width) + (column - _left)) * _count;

    public void Draw(int left, int top, int width, int height, List<int> segments)
    {
        (_left, _top, _width, _height) = (left, top, width, height);
        var samples = width * height * _count;
        Z.AsSpan(0, samples).Fill(-1e9f);
        Z2.AsSpan(0, samples).Fill(-1e9f);
        Id.AsSpan(0, samples).Fill(Ground);
        Id2.AsSpan(0, samples).Fill(Ground);
        U.AsSpan(0, samples).Clear();
        U2.AsSpan(0, samples).Clear();
        foreach (var index in segments)
        {
            DrawSegment(index);
        }

        for (var b = 0; b < mat.Bodies.Length; b++)
        {
            DrawBody(BodyId(b), mat.Bodies[b]);
        }

        for (var f = 0; f < mat.Films.Length; f++)
        {
            DrawFilm(BodyId(mat.Bodies.Length + f), mat.Films[f]);
        }
    }

    private void DrawSegment(int index)
    {
        ref readonly var segment = ref _segments[index];
        var (a, b) = (segment.From, segment.To);
        var pad = segment.Reach + 1;
        var (tx, ty) = (b.X - a.X, b.Y - a.Y);
        var length = MathF.Sqrt((tx * tx) + (ty * ty));
        var (nx, ny) = (-ty / length, tx / length);
        var bend = 1 + (segment.Reach * Math.Max(Turn(a, nx, ny), Turn(b, nx, ny)));
        var firstRow = Math.Max(_top, (int)MathF.Floor(Math.Min(a.Y, b.Y) - pad));
        var lastRow = Math.Min(_top + _height - 1, (int)MathF.Floor(Math.Max(a.Y, b.Y) + pad));
        for (var row = firstRow; row <= lastRow; row++)
        {
            var shift = lineShift[row];
            var (low, high) = (Math.Min(a.X, b.X) - pad, Math.Max(a.X, b.X) + pad);
            var y = row + 0.5f - a.Y;
            (low, high) = Narrow(low, high, nx, a.X - (y * ny / nx), pad / Math.Abs(nx));
            (low, high) = Narrow(low, high, ny, a.X + (((length / 2) - (y * -nx)) / ny), ((length / 2) + bend) / Math.Abs(ny));
            var firstColumn = Math.Max(_left, (int)MathF.Floor(low - shift));
            var lastColumn = Math.Min(_left + _width - 1, (int)MathF.Floor(high - shift));
            for (var column = firstColumn; column <= lastColumn; column++)
            {
                DrawPixel(index, in segment, nx, ny, column, row, shift);
            }
        }
    }

    /// <summary>The part of a line that lies in a slab: its centre on the line and half its width there; the slab's normal has the given x part.</summary>
    private static (float Low, float High) Narrow(float low, float high, float normalX, float centre, float half) =>
        Math.Abs(normalX) > 0.05f ? (Math.Max(low, centre - half - 1), Math.Min(high, centre + half + 1)) : (low, high);

    private static float Turn(FibreNode node, float nx, float ny) => Math.Abs((node.TangentX * nx) + (node.TangentY * ny));

    private void DrawPixel(int index, in Segment segment, float nx, float ny, int column, int row, float shift)
    {
        var (a, b) = (segment.From, segment.To);
        var across = ((column + shift + 0.5f - a.X) * nx) + ((row + 0.5f - a.Y) * ny);
        if (Math.Abs(across) > segment.Reach + 0.8f)
        {
            return;
        }

        var place = pattern.First(column, row);
        var sample = Sample(column, row);
        if (_count > 1 && Buried(sample, Math.Max(a.Z, b.Z)))
        {
            return;
        }

        for (var k = 0; k < _count; k++)
        {
            var (x, y) = (column + shift + pattern.X[place + k], row + pattern.Y[place + k]);
            var fromStart = ((x - a.X) * a.TangentX) + ((y - a.Y) * a.TangentY);
            var toEnd = ((b.X - x) * b.TangentX) + ((b.Y - y) * b.TangentY);
            if (fromStart < 0 || toEnd <= 0)
            {
                continue;
            }

            var share = fromStart / (fromStart + toEnd);
            var radius = a.Radius + (share * (b.Radius - a.Radius));
            var u = (((x - a.X) * nx) + ((y - a.Y) * ny)) / radius;
            if (u > -1 && u < 1)
            {
                Put(sample + k, a.Z + (share * (b.Z - a.Z)), u, index);
            }
        }
    }

    /// <summary>Whether two surfaces already lie above a height at every sample of a pixel.</summary>
    private bool Buried(int sample, float z)
    {
        var buried = true;
        foreach (var second in Z2.AsSpan(sample, _count))
        {
            buried &= second >= z;
        }

        return buried;
    }

    private void DrawBody(int id, SolidBody body)
    {
        foreach (var (column, row) in PixelsNear(body.X, body.Y, body.Along + 1))
        {
            var (place, sample) = (pattern.First(column, row), Sample(column, row));
            for (var k = 0; k < _count; k++)
            {
                var (dx, dy) = (column + lineShift[row] + pattern.X[place + k] - body.X, row + pattern.Y[place + k] - body.Y);
                var (p, q) = (((dx * body.Cos) + (dy * body.Sin)) / body.Along, ((dy * body.Cos) - (dx * body.Sin)) / body.Across);
                var square = (p * p) + (q * q);
                if (square < 1)
                {
                    Put(sample + k, body.Z + (body.Across * MathF.Sqrt(1 - square)), MathF.Sqrt(square), id);
                }
            }
        }
    }

    private void DrawFilm(int id, FilmPatch film)
    {
        foreach (var (column, row) in PixelsNear(film.X, film.Y, film.Reach + 1))
        {
            var (place, sample) = (pattern.First(column, row), Sample(column, row));
            for (var k = 0; k < _count; k++)
            {
                var closeness = film.Closeness(column + lineShift[row] + pattern.X[place + k] - film.X, row + pattern.Y[place + k] - film.Y);
                if (closeness < 1)
                {
                    Put(sample + k, film.Z, closeness, id);
                }
            }
        }
    }

    private IEnumerable<(int Column, int Row)> PixelsNear(float x, float y, float reach)
    {
        var firstRow = Math.Max(_top, (int)MathF.Floor(y - reach));
        var lastRow = Math.Min(_top + _height - 1, (int)MathF.Floor(y + reach));
        for (var row = firstRow; row <= lastRow; row++)
        {
            var firstColumn = Math.Max(_left, (int)MathF.Floor(x - reach - lineShift[row]));
            var lastColumn = Math.Min(_left + _width - 1, (int)MathF.Floor(x + reach - lineShift[row]));
            for (var column = firstColumn; column <= lastColumn; column++)
            {
                yield return (column, row);
            }
        }
    }

    private void Put(int sample, float z, float u, int id)
    {
        if (z > Z[sample])
        {
            if (!Same(Id[sample], id))
            {
                (Z2[sample], Id2[sample], U2[sample]) = (Z[sample], Id[sample], U[sample]);
            }

            (Z[sample], Id[sample], U[sample]) = (z, id, u);
        }
        else if (z > Z2[sample] && !Same(Id[sample], id))
        {
            (Z2[sample], Id2[sample], U2[sample]) = (z, id, u);
        }
    }

    private bool Same(int first, int second) => first == second || (first >= 0 && second >= 0 && _segments[first].Fibre == _segments[second].Fibre);
}
