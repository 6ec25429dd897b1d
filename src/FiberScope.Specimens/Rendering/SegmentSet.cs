using FiberScope.Specimens.Mats;

namespace FiberScope.Specimens.Rendering;

/// <summary>A stretch of fibre between two nodes. Pixels.</summary>
internal readonly record struct Segment(FibreNode From, FibreNode To, int Fibre)
{
    public float Reach => Math.Max(From.Radius, To.Radius);
}

/// <summary>The stretches of fibre that can be seen, and for each tile of the picture those that may touch it, top fibres first.</summary>
internal sealed class SegmentSet
{
    public const int TileWidth = 128, TileHeight = 32;

    private SegmentSet(Segment[] segments, List<int>[] tiles, int columns, int rows) => (Segments, Tiles, Columns, Rows) = (segments, tiles, columns, rows);

    public Segment[] Segments { get; }

    public List<int>[] Tiles { get; }

    public int Columns { get; }

    public int Rows { get; }

    /// <param name="mat">The mat.</param>
    /// <param name="margin">How far outside its radius a stretch still matters; pixels.</param>
    /// <param name="sideways">The largest sideways shift of a line; pixels.</param>
    public static SegmentSet Of(MatModel mat, double margin, double sideways)
    {
        var (width, height) = (mat.Scale.Width, mat.Scale.Height);
        var (columns, rows) = ((width + TileWidth - 1) / TileWidth, (height + TileHeight - 1) / TileHeight);
        var tiles = new List<int>[columns * rows];
        for (var t = 0; t < tiles.Length; t++)
        {
            tiles[t] = [];
        }

        var segments = new List<Segment>();
        for (var f = 0; f < mat.Fibres.Length; f++)
        {
            var nodes = mat.Fibres[f].Nodes;
            for (var i = 1; i < nodes.Length; i++)
            {
                var segment = new Segment(nodes[i - 1], nodes[i], f);
                var (left, right) = (Math.Min(segment.From.X, segment.To.X), Math.Max(segment.From.X, segment.To.X));
                var (top, bottom) = (Math.Min(segment.From.Y, segment.To.Y), Math.Max(segment.From.Y, segment.To.Y));
                var pad = segment.Reach + margin + 1;
                if (right + pad + sideways < 0 || bottom + pad < 0 || left - pad - sideways > width || top - pad > height)
                {
                    continue;
                }

                segments.Add(segment);
                foreach (var tile in Touched(left - pad - sideways, right + pad + sideways, top - pad, bottom + pad, columns, rows))
                {
                    tiles[tile].Add(segments.Count - 1);
                }
            }
        }

        return new SegmentSet([.. segments], tiles, columns, rows);
    }

    private static IEnumerable<int> Touched(double left, double right, double top, double bottom, int columns, int rows)
    {
        var (firstColumn, lastColumn) = (Math.Max(0, (int)(left / TileWidth)), Math.Min(columns - 1, (int)(right / TileWidth)));
        var (firstRow, lastRow) = (Math.Max(0, (int)(top / TileHeight)), Math.Min(rows - 1, (int)(bottom / TileHeight)));
        for (var row = firstRow; row <= lastRow; row++)
        {
            for (var column = firstColumn; column <= lastColumn; column++)
            {
                yield return (row * columns) + column;
            }
        }
    }
}
