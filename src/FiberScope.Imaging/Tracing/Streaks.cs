namespace FiberScope.Imaging.Tracing;

/// <summary>Narrow ribbons that lie wholly on a much wider one: streaks of its surface or noise, not fibres.</summary>
/// <remarks>A real thin fibre that crosses a wide one goes on beyond its edges.</remarks>
internal static class Streaks
{
    private const double MuchWider = 2.5;
    private const double MostlyInside = 0.7;

    /// <summary>The ribbons without the streaks, in the same order.</summary>
    public static List<Ribbon> Removed(List<Ribbon> ribbons, int width, int height)
    {
        var covering = new float[width * height];
        foreach (var ribbon in ribbons)
        {
            Cover(ribbon, covering, width, height);
        }

        return [.. ribbons.Where(ribbon => Inside(ribbon, covering, width, height) < MostlyInside)];
    }

    private static void Cover(Ribbon ribbon, float[] covering, int width, int height)
    {
        var strip = ribbon.Strip;
        for (var r = 0; r < strip.Rows; r++)
        {
            if (!ribbon.Accepted[r])
            {
                continue;
            }

            for (var u = -0.5 * ribbon.Width; u <= 0.5 * ribbon.Width; u += 0.7)
            {
                for (var along = 0.0; along <= strip.Step; along += 0.7)
                {
                    var at = Place(strip.X[r] + (u * strip.Nx[r]) + (along * strip.Ny[r]), strip.Y[r] + (u * strip.Ny[r]) - (along * strip.Nx[r]), width, height);
                    covering[at] = Math.Max(covering[at], (float)ribbon.Width);
                }
            }
        }
    }

    private static double Inside(Ribbon ribbon, float[] covering, int width, int height)
    {
        int[] rows = [.. Enumerable.Range(0, ribbon.Strip.Rows).Where(r => ribbon.Accepted[r])];
        return rows.Count(r => covering[Place(ribbon.Strip.X[r], ribbon.Strip.Y[r], width, height)] > MuchWider * ribbon.Width) / (double)Math.Max(1, rows.Length);
    }

    private static int Place(double x, double y, int width, int height) =>
        (Math.Clamp((int)Math.Round(y), 0, height - 1) * width) + Math.Clamp((int)Math.Round(x), 0, width - 1);
}
