namespace FiberScope.Validation.Imaging;

/// <summary>What a family must reach: the bars of the measurement, wider where the picture is poor or the mat is mixed.</summary>
/// <param name="Mean">Largest relative error of the mean.</param>
/// <param name="Median">Of D50.</param>
/// <param name="Tail">Of D10 and D90.</param>
/// <param name="Spread">Of the standard deviation.</param>
/// <param name="Distance">Largest Kolmogorov-Smirnov distance.</param>
/// <param name="Gross">Largest share of readings off by more than a quarter.</param>
/// <param name="Read">Smallest share of the length showing both edges that is read.</param>
internal sealed record FamilyBars(double Mean, double Median, double Tail, double Spread, double Distance, double Gross, double Read)
{
    private static readonly HashSet<string> Hard = new(["noisy", "defocused-charging", "thin-fibres", "ropes-shot-films", "fine-in-coarse"], StringComparer.Ordinal);

    private static FamilyBars Usual { get; } = new(0.03, 0.05, 0.06, 0.12, 0.07, 0.02, 0.70);

    private static FamilyBars Wide { get; } = new(0.05, 0.08, 0.12, 0.25, 0.12, 0.05, 0.45);

    public static bool IsHard(string family) => Hard.Contains(family);

    public static FamilyBars For(string family) => IsHard(family) ? Wide : Usual;

    public int Misses(FamilyFigures f) =>
        Over(f.Mean, Mean) + Over(f.D50, Median) + Over(f.D10, Tail) + Over(f.D90, Tail) + Over(f.Spread, Spread) + Over(f.Distance, Distance) + Over(f.Gross, Gross) + (f.Read >= Read ? 0 : 1);

    private static int Over(double value, double bar) => Math.Abs(value) <= bar ? 0 : 1;
}
