namespace FiberScope.Imaging.Sections;

/// <summary>One piece of the mask: its pixels' number, middle and extent; pixels.</summary>
/// <param name="Label">Its number.</param>
/// <param name="Area">Its pixels.</param>
/// <param name="X">The middle of its pixels, to the right.</param>
/// <param name="Y">The middle of its pixels, downwards.</param>
/// <param name="Left">Its first column.</param>
/// <param name="Top">Its first row.</param>
/// <param name="Right">Its last column.</param>
/// <param name="Bottom">Its last row.</param>
internal sealed record SectionPiece(int Label, int Area, double X, double Y, int Left, int Top, int Right, int Bottom)
{
    /// <summary>A length that every ray from the middle to the outline is shorter than; pixels.</summary>
    public double Reach => 6 + Math.Sqrt(Math.Pow(Right - Left, 2) + Math.Pow(Bottom - Top, 2));

    /// <summary>Every piece that has pixels, by number.</summary>
    public static IReadOnlyList<SectionPiece> All(int[] labels, int width, int count)
    {
        var sums = new (int Area, double X, double Y, int Left, int Top, int Right, int Bottom)[count + 1];
        for (var i = 0; i < labels.Length; i++)
        {
            if (labels[i] > 0)
            {
                ref var sum = ref sums[labels[i]];
                var (x, y) = (i % width, i / width);
                sum = sum.Area == 0
                    ? (1, x + 0.5, y + 0.5, x, y, x, y)
                    : (sum.Area + 1, sum.X + x + 0.5, sum.Y + y + 0.5, Math.Min(sum.Left, x), sum.Top, Math.Max(sum.Right, x), y);
            }
        }

        return [.. sums.Select((sum, label) => new SectionPiece(label, sum.Area, sum.X / Math.Max(1, sum.Area), sum.Y / Math.Max(1, sum.Area), sum.Left, sum.Top, sum.Right, sum.Bottom)).Where(piece => piece.Area > 0)];
    }
}
