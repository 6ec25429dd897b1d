using FiberScope.Imaging.Edges;

namespace FiberScope.Imaging.Transmitted;

/// <summary>Where a fibre's true edges lie in its profile of light, how blurred it is, and how much light it takes.</summary>
/// <param name="Outward">How far the true edges lie outside the traced ones; pixels.</param>
/// <param name="Blur">The fibre's blur, as the sigma of a Gaussian; pixels.</param>
/// <param name="Uncertainty">Standard uncertainty of <paramref name="Outward"/>; pixels.</param>
/// <param name="Contrast">How much darker the rim is than the outside, unblurred.</param>
/// <param name="LightTaken">The light that the fibre takes, summed across it, over its true diameter; its surroundings are taken for 1.</param>
internal readonly record struct RimFit(double Outward, double Blur, double Uncertainty, double Contrast, double LightTaken);

/// <summary>The look of a small cylinder lens in a bright field, blurred.</summary>
/// <remarks>
/// A cylinder bends light more the further from its axis it meets it; what is bent out of the objective's aperture is lost, so that the
/// core passes light, the rim is dark up to the edge, and between lies a slope as wide as the cone of the lamp (ray optics). Outside
/// runs a bright line. All of it is blurred by a Gaussian.
/// </remarks>
internal static class RimModel
{
    private const int Levels = 4;

    /// <summary>What the simple law of the light leaves open in the place of an edge, as a share of the blur: found on virtual mats whose light follows another law.</summary>
    private const double LawByBlur = 0.28;
    private static readonly double[] Cores = [0.15, 0.35, 0.5, 0.65, 0.8];

    /// <summary>Fits edges, blur and core by a search, the four levels of light by least squares.</summary>
    public static RimFit? Fit(RimProfile profile)
    {
        var best = (Misfit: double.PositiveInfinity, Outward: 0.0, Blur: 1.0, Core: 0.5);
        for (var blur = 0.6; blur < Math.Max(3, 0.7 * profile.Half); blur *= 1.3)
        {
            foreach (var core in Cores)
            {
                for (var outward = -1.5; outward <= 1.01; outward += 0.25)
                {
                    Try(profile, outward, blur, core, ref best);
                }
            }
        }

        for (var (place, scale) = (0.125, 1.14); place > 0.01; (place, scale) = (place / 2, Math.Sqrt(scale)))
        {
            var centre = best;
            for (var i = 0; i < 9; i++)
            {
                Try(profile, centre.Outward + (((i % 3) - 1) * place), centre.Blur * Math.Pow(scale, (i / 3) - 1), centre.Core, ref best);
                Try(profile, centre.Outward + (((i % 3) - 1) * place), centre.Blur, Math.Clamp(centre.Core + (((i / 3) - 1) * place * 0.5), 0.05, 0.92), ref best);
            }
        }

        return double.IsFinite(best.Misfit) && profile.Half + best.Outward > 0.7 ? Describe(profile, best) : null;
    }

    private static RimFit? Describe(RimProfile profile, (double Misfit, double Outward, double Blur, double Core) best)
    {
        Span<double> levels = stackalloc double[Levels];
        Solve(profile, best.Outward, best.Blur, best.Core, levels);
        var outside = profile.Light[profile.Near..].Average();
        if (!(outside > 0.1))
        {
            return null;
        }

        var radius = profile.Half + best.Outward;
        var taken = 0.0;
        for (var i = 0; i < profile.Near; i++)
        {
            taken += (1 - (profile.Light[i] / outside)) * RimProfile.Step / radius * (i == 0 ? 0.5 : 1);
        }

        var perValue = Math.Sqrt(best.Misfit / Math.Max(4, profile.Near - 7));
        var contrast = -(levels[1] + levels[2]);
        var steepness = Math.Max(1e-3, Math.Abs(contrast) / (best.Blur * Math.Sqrt(2 * Math.PI)));
        var uncertainty = Math.Sqrt(Math.Pow(Math.Max(perValue, profile.Noise) / steepness, 2) + Math.Pow(LawByBlur * best.Blur, 2));
        return new RimFit(best.Outward, best.Blur, uncertainty, contrast / outside, taken);
    }

    private static void Try(RimProfile profile, double outward, double blur, double core, ref (double Misfit, double Outward, double Blur, double Core) best)
    {
        if (profile.Half + outward < 0.7 || blur < 0.4)
        {
            return;
        }

        Span<double> levels = stackalloc double[Levels];
        var misfit = Solve(profile, outward, blur, core, levels);
        if (misfit < best.Misfit && levels[1] + levels[2] < 0)
        {
            best = (misfit, outward, blur, core);
        }
    }

    /// <summary>The four levels (outside, inside against it, rim against the inside, bright line) and the sum of squares that is left.</summary>
    private static double Solve(RimProfile profile, double outward, double blur, double core, Span<double> levels)
    {
        Span<double> matrix = stackalloc double[Levels * Levels];
        Span<double> shape = stackalloc double[Levels];
        levels.Clear();
        matrix.Clear();
        for (var i = 0; i < profile.Near; i++)
        {
            Shape(RimProfile.Step * i, profile.Half + outward, blur, core, shape);
            for (var a = 0; a < Levels; a++)
            {
                levels[a] += shape[a] * profile.Light[i];
                for (var b = 0; b <= a; b++)
                {
                    matrix[(a * Levels) + b] += shape[a] * shape[b];
                }
            }
        }

        for (var a = 0; a < Levels; a++)
        {
            matrix[(a * Levels) + a] += 1e-4;
        }

        SmallSystem.Factorise(matrix, Levels);
        SmallSystem.Solve(matrix, levels, Levels);
        var left = 0.0;
        for (var i = 0; i < profile.Near; i++)
        {
            Shape(RimProfile.Step * i, profile.Half + outward, blur, core, shape);
            var value = profile.Light[i];
            for (var a = 0; a < Levels; a++)
            {
                value -= levels[a] * shape[a];
            }

            left += value * value;
        }

        return left;
    }

    private static void Shape(double x, double radius, double blur, double core, Span<double> shape)
    {
        var (from, to) = (core * radius, 0.5 * (1 + core) * radius);
        shape[0] = 1;
        shape[1] = Box(x, -radius, radius, blur);
        shape[2] = Slope(x, from, to, blur) - Step(x, radius, blur) + Slope(-x, from, to, blur) - Step(-x, radius, blur);
        var line = radius + 1.2 + (0.5 * blur);
        shape[3] = Box(x, radius, line, blur) + Box(x, -line, -radius, blur);
    }

    private static double Step(double x, double at, double blur) => GaussianTable.At((x - at) / blur).Share;

    private static double Box(double x, double from, double to, double blur) => Step(x, from, blur) - Step(x, to, blur);

    /// <summary>0 before <paramref name="from"/>, 1 after <paramref name="to"/>, straight between, blurred.</summary>
    private static double Slope(double x, double from, double to, double blur)
    {
        var (a, b) = ((x - from) / blur, (x - to) / blur);
        var (lower, upper) = (GaussianTable.At(a), GaussianTable.At(b));
        return blur / (to - from) * ((a * lower.Share) + lower.Density - (b * upper.Share) - upper.Density);
    }
}
