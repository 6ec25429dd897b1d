using ScottPlot;

namespace FiberScope.Validation.Imaging;

/// <summary>Draws the cumulative distributions read beside the true ones, one small panel a family.</summary>
internal static class FamilyFigure
{
    private const int PanelWidth = 300, PanelHeight = 220, Columns = 4;

    public static void Save(FamilyFigures[] families, string path)
    {
        var shown = families.Where(f => f.ReadPercentiles.Length > 0).ToArray();
        if (shown.Length == 0)
        {
            return;
        }

        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        var sheet = new Multiplot();
        sheet.AddPlots(shown.Length);
        sheet.Layout = new ScottPlot.MultiplotLayouts.Grid((shown.Length + Columns - 1) / Columns, Columns);
        var share = Enumerable.Range(1, 99).Select(p => p / 100.0).ToArray();
        for (var i = 0; i < shown.Length; i++)
        {
            var plot = sheet.GetPlot(i);
            Draw(plot, shown[i].TruePercentiles, share, Colors.Black, 2.5f, LinePattern.Solid);
            Draw(plot, shown[i].ReadPercentiles, share, Color.FromHex("#C2410C"), 2, LinePattern.Dashed);
            plot.Title(shown[i].Family, size: 12);
            plot.Axes.SetLimits(0, shown[i].TruePercentiles[^1] * 1.15, 0, 1);
            plot.XLabel("diameter, px", 10);
            plot.Grid.MajorLineColor = Colors.Gray.WithAlpha(0.2);
        }

        sheet.SavePng(path, PanelWidth * Columns, PanelHeight * ((shown.Length + Columns - 1) / Columns));
    }

    private static void Draw(Plot plot, double[] x, double[] y, Color colour, float width, LinePattern pattern)
    {
        var line = plot.Add.ScatterLine(x, y, colour);
        line.LineWidth = width;
        line.LinePattern = pattern;
    }
}
