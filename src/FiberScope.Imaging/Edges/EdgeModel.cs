namespace FiberScope.Imaging.Edges;

/// <summary>
/// Finds the geometric edges of a fibre from its grey profile by fitting what a cylinder looks like to secondary electrons.
/// </summary>
/// <remarks>
/// The yield of a cylinder rises towards its edges as the surface tilts, y(t) = 1 + e (min(cap, (1 − t²)^−½) − 1) − d t² with t from −1
/// to 1 across (secant law: Seiler 1983, J. Appl. Phys. 54, R1; from memory), one side may face the detector (a tilt), and the ground
/// may brighten or darken away from the fibre. Probe, focus and pixel blur all of it with a Gaussian. The steepest point of such an edge
/// lies outside the geometric one, so the steepest points read every fibre too thick.
/// Edges, blur and the eight heights are found together by Gauss–Newton steps on the sum of squares, with what the picture's other
/// fibres say of blur, rim and dome as further observations: a thin fibre cannot tell its width, blur and rims apart.
/// </remarks>
internal static class EdgeModel
{
    private const int MostRounds = 14;

    // Until then the data lead: counting a poor start's misfit as noise would hold blur and edges where they began.
    private const int RoundsBeforeRescaling = 4;

    /// <summary>Fits one profile.</summary>
    /// <param name="profile">The mean grey across.</param>
    /// <param name="optics">What is known beforehand.</param>
    public static EdgeFit Fit(in EdgeProfile profile, PictureOptics optics)
    {
        Span<double> memory = stackalloc double[EdgeParameters.Count * (EdgeParameters.Count + 4)];
        memory.Clear();
        var normal = memory[..(EdgeParameters.Count * EdgeParameters.Count)];
        var now = memory.Slice(normal.Length, EdgeParameters.Count);
        var next = memory.Slice(normal.Length + EdgeParameters.Count, EdgeParameters.Count);
        var right = memory.Slice(normal.Length + (2 * EdgeParameters.Count), EdgeParameters.Count);
        var combination = memory.Slice(normal.Length + (3 * EdgeParameters.Count), EdgeParameters.Count);

        var problem = new EdgeProblem(profile, optics);
        problem.Start(now);
        problem.SolveHeights(now, normal, right);
        var settled = false;
        for (var round = 0; round < MostRounds && !(settled && round > RoundsBeforeRescaling); round++)
        {
            var cost = problem.Accumulate(now, normal, right);
            SmallSystem.Factorise(normal, EdgeParameters.Count);
            SmallSystem.Solve(normal, right, EdgeParameters.Count);
            settled = problem.Move(now, right, next, cost);
            next.CopyTo(now);
            if (round >= RoundsBeforeRescaling)
            {
                problem.Rescale(now);
            }
        }

        problem.Accumulate(now, normal, right);
        SmallSystem.Factorise(normal, EdgeParameters.Count);
        return Result(profile, problem, now, normal, combination, settled);
    }

    private static EdgeFit Result(in EdgeProfile profile, in EdgeProblem problem, ReadOnlySpan<double> now, ReadOnlySpan<double> factor, Span<double> combination, bool settled)
    {
        var inside = Math.Max(1e-6, now[EdgeParameters.Inside]);
        var (rim, dome) = (now[EdgeParameters.Rim] / inside, now[EdgeParameters.Dome] / inside);
        var width = now[EdgeParameters.Right] - now[EdgeParameters.Left];
        var blur = Math.Exp(now[EdgeParameters.LogBlur]);
        var outside = Math.Max(now[EdgeParameters.OutsideLeft], now[EdgeParameters.OutsideRight]);
        var moved = Math.Abs(width - profile.Width);
        return new EdgeFit
        {
            Left = now[EdgeParameters.Left],
            Right = now[EdgeParameters.Right],
            WidthUncertainty = Deviation(factor, combination, (EdgeParameters.Right, 1), (EdgeParameters.Left, -1)),
            Blur = blur,
            LogBlurUncertainty = Deviation(factor, combination, (EdgeParameters.LogBlur, 1), (EdgeParameters.LogBlur, 0)),
            Rim = rim,
            RimUncertainty = Deviation(factor, combination, (EdgeParameters.Rim, 1 / inside), (EdgeParameters.Inside, -rim / inside)),
            Dome = dome,
            DomeUncertainty = Deviation(factor, combination, (EdgeParameters.Dome, 1 / inside), (EdgeParameters.Inside, -dome / inside)),
            Residual = Math.Sqrt(problem.Misfit),
            Length = profile.Length,
            IsAccepted = settled && double.IsFinite(width) && inside * (1 + (0.3 * rim)) > outside && moved < Math.Max(2.2 * blur, 0.12 * profile.Width) && width > 0.8 * blur,
        };
    }

    private static double Deviation(ReadOnlySpan<double> factor, Span<double> combination, (int At, double Times) first, (int At, double Times) second)
    {
        combination.Clear();
        combination[first.At] += first.Times;
        combination[second.At] += second.Times;
        return Math.Sqrt(SmallSystem.Variance(factor, combination, EdgeParameters.Count));
    }
}
