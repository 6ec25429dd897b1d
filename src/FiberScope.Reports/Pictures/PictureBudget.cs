namespace FiberScope.Reports.Pictures;

/// <summary>How large each picture on the page may be, so that a report can be sent by mail.</summary>
/// <param name="MostColumns">The most pixels across.</param>
/// <param name="MostBytes">The most bytes that compression aims at.</param>
internal sealed record PictureBudget(int MostColumns, int MostBytes)
{
    private const int BytesInAll = 2_800_000;

    /// <summary>The share of each picture when there are several.</summary>
    public static PictureBudget For(int pictures) => new(
        pictures switch { <= 6 => 1200, <= 15 => 900, _ => 700 },
        BytesInAll / Math.Max(1, pictures));
}
