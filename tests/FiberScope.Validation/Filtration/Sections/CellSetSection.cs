using FiberScope.Filtration.Cell;
using FiberScope.Validation.Filtration.Reference;

namespace FiberScope.Validation.Filtration.Sections;

/// <summary>The set <c>cell</c> against the reference at points that are not in its tables.</summary>
internal static class CellSetSection
{
    private const int Seed = 20_260_301;

    private sealed record Point(double Solidity, double Knudsen, double Peclet, double Ratio, double Stokes)
    {
        public CellFlow Flow => new(Solidity, Knudsen);

        public CellSolution Set => new(Solidity, Knudsen);
    }

    public static void Write(MarkdownText text)
    {
        var alone = Points(Seed, 0).Take(160).ToList();
        var slipping = Points(Seed + 1, 1).Take(100).ToList();
        var joint = Points(Seed + 2, 0).Take(72).ToList();
        var both = joint.AsParallel().AsOrdered().Select((p, i) => Stochastic(p, i)).ToList();
        text.Heading(3, "The set `cell` against the reference, off its table")
            .Paragraph($"Random points, even in logarithm over α 0.02–0.2, Pe 10–1e5, R 0.01–1 (inside the cell) and Stk 0.01–5 or even over 0–5; seed {Seed}. Wanted: median 3 %, worst 10 %.")
            .Table(["E from", "judged by", "Kn", "points", "median", "nine in ten", "worst"],
            [
                Row("diffusion + interception", "grid", "0", alone.AsParallel().Select(Diffusion)),
                Row("diffusion + interception", "grid", "0–1", slipping.AsParallel().Select(Diffusion)),
                Row("inertia + interception", "trajectories", "0", alone.AsParallel().Select(Inertia)),
                Row("inertia + interception", "trajectories", "0–1", slipping.AsParallel().Select(Inertia)),
                Row("all three", "stochastic particles", "0", both.Select(b => b.Error)),
                Row("all three, Pe·Stk > 100", "stochastic particles", "0", both.Where(b => b.Point.Peclet * b.Point.Stokes > 100).Select(b => b.Error)),
            ]);
        JointAction(text, both);
    }

    private static void JointAction(MarkdownText text, List<(Point Point, double Error, double Noise, double Sum)> both)
    {
        var sum = ErrorSummary.Of(both.Select(b => b.Sum));
        var worst = both.OrderByDescending(b => Math.Abs(b.Error)).Take(6);
        text.Paragraph($"How diffusion and inertia combine: diffusion is taken as a larger reach R*, on which inertia acts while particles follow the air, less the kinetic layer at the absorbing surface (`CellSolution.Efficiency`). Plain addition of what each adds to interception misses by {100 * sum.Median:0.0} % (median) and {100 * sum.Worst:0} % (worst) at the same points, as both draw on the same air. The noise of the stochastic particles is about {100 * both.Average(b => b.Noise):0.0} % and is inside the figures above. Pe·Stk = m U²/kT; an aerosol at ordinary face velocities whose inertia matters has Pe·Stk above 100. The worst points lie near the onset of impaction or at Pe below 50; the wanted worst of 10 % is met by each solver's own part and missed where all three act:")
            .Table(["α", "Pe", "R", "Stk", "error of `cell`, %", "noise, %", "error of plain addition, %"], worst.Select(b => (IReadOnlyList<string>)
            [
                MarkdownText.Number(b.Point.Solidity, "G3"), MarkdownText.Number(b.Point.Peclet, "G3"), MarkdownText.Number(b.Point.Ratio, "G3"), MarkdownText.Number(b.Point.Stokes, "G3"),
                MarkdownText.Signed(b.Error, "+0.0;-0.0"), MarkdownText.Signed(b.Noise, "0.0"), MarkdownText.Signed(b.Sum),
            ]));
    }

    private static IReadOnlyList<string> Row(string what, string judge, string knudsen, IEnumerable<double> errors)
    {
        var s = ErrorSummary.Of(errors);
        return [what, judge, knudsen, MarkdownText.Number(s.Count), MarkdownText.Percent(s.Median, "0.00"), MarkdownText.Percent(s.NinetyPercent, "0.0"), MarkdownText.Percent(s.Worst)];
    }

    private static double Diffusion(Point p) =>
        (p.Set.DiffusionInterception(p.Peclet, p.Ratio) / DiffusionSolver.Solve(p.Flow, p.Peclet, p.Ratio, DiffusionSolver.CellsFor(p.Peclet))) - 1;

    private static double Inertia(Point p) =>
        (p.Set.ImpactionInterception(p.Ratio, p.Stokes) / new TrajectorySolver(p.Flow).Efficiency(p.Ratio, p.Stokes)) - 1;

    private static (Point Point, double Error, double Noise, double Sum) Stochastic(Point p, int seed)
    {
        var (truth, error) = new StochasticParticles(p.Flow, p.Peclet, p.Ratio, p.Stokes).Efficiency(24_000, seed);
        var set = p.Set;
        var sum = set.DiffusionInterception(p.Peclet, p.Ratio) + set.ImpactionInterception(p.Ratio, p.Stokes) - set.Flow.Interception(p.Ratio);
        return (p, (set.Efficiency(p.Peclet, p.Ratio, p.Stokes) / truth) - 1, error / truth, (sum / truth) - 1);
    }

    private static IEnumerable<Point> Points(int seed, double largestKnudsen)
    {
        var random = new Random(seed);
        double Logarithmic(double low, double high) => low * Math.Pow(high / low, random.NextDouble());
        while (true)
        {
            var stokes = random.Next(2) == 0 ? Logarithmic(0.01, 5) : 5 * random.NextDouble();
            var point = new Point(Logarithmic(0.02, 0.2), largestKnudsen * random.NextDouble(), Logarithmic(10, 1e5), Logarithmic(0.01, 1), stokes);
            if (1 + point.Ratio < 0.98 * point.Flow.Rim)
            {
                yield return point;
            }
        }
    }
}
