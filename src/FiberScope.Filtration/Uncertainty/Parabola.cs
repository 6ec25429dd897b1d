namespace FiberScope.Filtration.Uncertainty;

/// <summary>A change a x + b x² about a middle point.</summary>
internal readonly record struct Parabola(double Slope, double Curvature)
{
    public static Parabola Through(double below, double middle, double above, double step) =>
        new((above - below) / (2 * step), (above - (2 * middle) + below) / (2 * step * step));

    public double At(double x) => x * (Slope + (Curvature * x));
}
