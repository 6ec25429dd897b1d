namespace FiberScope.Reports.Figures;

/// <summary>The grid that maps are drawn on.</summary>
/// <param name="Across">The values along the width, ascending.</param>
/// <param name="AcrossTitle">What they are, with unit.</param>
/// <param name="Up">The values along the height, ascending.</param>
/// <param name="UpTitle">What they are, with unit.</param>
/// <param name="Met">Whether every target is met, [across, up].</param>
/// <param name="Limits">The targets, for the lines along which each is just met.</param>
/// <param name="Best">The place to mark.</param>
internal sealed record MapGrid(double[] Across, string AcrossTitle, double[] Up, string UpTitle, bool[,] Met, MapLimit[] Limits, (double X, double Y) Best)
{
    /// <summary>Whether at least half of a cell's corners meet every target.</summary>
    public bool IsAllowed(int column, int row)
    {
        bool[] corners = [Met[column, row], Met[column + 1, row], Met[column, row + 1], Met[column + 1, row + 1]];
        return corners.Count(met => met) >= 2;
    }
}

/// <summary>A target on a map.</summary>
/// <param name="Title">What it limits, with the limit.</param>
/// <param name="Values">The limited figure, [across, up].</param>
/// <param name="Level">The limit.</param>
internal sealed record MapLimit(string Title, double[,] Values, double Level);
