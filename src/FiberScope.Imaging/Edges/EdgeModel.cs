namespace FiberScope.Imaging.Edges;

/// <summary>
/// Finds the geometric edges of a fibre from its grey profile by fitting what a cylinder looks like to secondary electrons.
/// </summary>
/// <remarks>
/// The yield of a cylinder rises towards its edges as the surface tilts, like the secant of the tilt up to a cap where the edge is
/// rounded off by the escape depth: y(v) = 1 + e (min(cap, (1 − v²)^−½) − 1) with v from −1 to 1 across (Reimer 1998, Scanning
/// Electron Microscopy, section 4.2; from memory). Probe, focus and pixel blur it with a Gaussian. The steepest point of such an
/// edge lies outside the geometric one, so the steepest points read every fibre too thick by about the blur. Heavy coating and high
/// voltage darken the flanks instead, like 1 − d v².
/// The model is a blurred sum of: outside left, outside right, flat inside, tilted inside, rims, dome. It is linear in those six heights
/// and they are solved for exactly at every step (variable projection: Golub and Pereyra 1973, SIAM J. Numer. Anal. 10, 413–432);
/// edges and blur are found by Levenberg–Marquardt. What the profile cannot tell (thin fibres: blur against rim) is held by the
/// picture's own usual values.
/// </remarks>
internal sealed class EdgeModel
{
    private const int Heights = 6;
    private const double Cap = 3;
    private const int Iterations = 12;

    private readonly EdgePriors _priors;
    private double[] _basis = [];
    private double[] _weights = [];

    public EdgeModel(EdgePriors priors) => _priors = priors;

    /// <summary>Fits one profile; null when it does not look like a fibre.</summary>
    public EdgeFit? Fit(FibreProfile profile)
    {
        var half = 0.5 * profile.Width;
        var now = new Shape(profile.Left, profile.Right, Math.Log(_priors.Blur));
        Weigh(profile, half);
        var best = Residuals(profile, now, out var heights);
        var damping = 1e-2;
        var jacobian = new double[3][];
        for (var i = 0; i < Iterations; i++)
        {
            for (var p = 0; p < 3; p++)
            {
                const double Nudge = 1e-3;
                var nudged = Residuals(profile, now.Nudged(p, Nudge), out _);
                jacobian[p] = [.. nudged.Zip(best, (a, b) => (a - b) / Nudge)];
            }

            var step = Step(jacobian, best, damping);
            var next = now.Moved(step);
            if (!next.IsSane(profile))
            {
                damping *= 10;
                continue;
            }

            var tried = Residuals(profile, next, out var triedHeights);
            if (Square(tried) < Square(best))
            {
                (now, best, heights) = (next, tried, triedHeights);
                damping = Math.Max(1e-6, damping / 5);
                if (Math.Abs(step[0]) + Math.Abs(step[1]) < 2e-3)
                {
                    break;
                }
            }
            else if ((damping *= 5) > 1e4)
            {
                break;
            }
        }

        return Finish(profile, now, best, heights, jacobian);
    }

    private static EdgeFit? Finish(FibreProfile profile, Shape now, double[] residuals, double[] heights, double[][] jacobian)
    {
        var inside = heights[2];
        if (inside <= Math.Min(heights[0], heights[1]) || jacobian[0] is null)
        {
            return null;
        }

        var covariance = Inverse(Normal(jacobian, 0));
        var variance = covariance[0, 0] + covariance[1, 1] - (2 * covariance[0, 1]);
        var freedom = Math.Max(1, (profile.Values.Length * profile.Step) - 6);
        var misfit = Math.Sqrt(Square(residuals) / freedom);
        return new EdgeFit(now.Left, now.Right, Math.Exp(now.LogBlur), heights[4] / inside, -heights[5] / inside, Math.Sqrt(Math.Max(0, variance)) * Math.Max(1, misfit), misfit);
    }

    /// <summary>Only the inside and a short way outside count: further out other fibres begin.</summary>
    private void Weigh(FibreProfile profile, double half)
    {
        var reach = Math.Max(2, Math.Min(2.2 * _priors.Blur + 0.5, 1.5 + half));
        if (_weights.Length != profile.Values.Length)
        {
            _weights = new double[profile.Values.Length];
            _basis = new double[profile.Values.Length * Heights];
        }

        for (var i = 0; i < _weights.Length; i++)
        {
            var outside = Math.Max(profile.Left - profile.At(i), profile.At(i) - profile.Right);
            _weights[i] = outside > reach + 1 ? 0 : outside < reach ? 1 : reach + 1 - outside;
        }
    }

    private double[] Residuals(FibreProfile profile, Shape shape, out double[] heights)
    {
        Fill(profile, shape);
        var n = profile.Values.Length;
        var scale = Math.Sqrt(profile.Step) / Math.Max(1e-6, profile.Noise);
        heights = Solve(profile, scale);
        var residuals = new double[n + 3];
        for (var i = 0; i < n; i++)
        {
            var model = 0.0;
            for (var b = 0; b < Heights; b++)
            {
                model += heights[b] * _basis[(i * Heights) + b];
            }

            residuals[i] = _weights[i] * scale * (profile.Values[i] - model);
        }

        residuals[n] = (shape.LogBlur - Math.Log(_priors.Blur)) / _priors.BlurSpread;
        residuals[n + 1] = ((heights[4] / Math.Max(1e-6, heights[2])) - _priors.Rim) / _priors.RimSpread;
        residuals[n + 2] = ((-heights[5] / Math.Max(1e-6, heights[2])) - _priors.Dome) / _priors.DomeSpread;
        return residuals;
    }

    /// <summary>The six blurred parts at every place of the profile.</summary>
    private void Fill(FibreProfile profile, Shape shape)
    {
        var (blur, centre, half) = (Math.Exp(shape.LogBlur), 0.5 * (shape.Left + shape.Right), 0.5 * (shape.Right - shape.Left));
        var nodes = Math.Clamp((int)(5 * half / blur), 16, 160);
        for (var i = 0; i < profile.Values.Length; i++)
        {
            var at = i * Heights;
            if (_weights[i] == 0)
            {
                Array.Clear(_basis, at, Heights);
                continue;
            }

            var u = profile.At(i);
            var (left, right) = (GaussianTable.Share((u - shape.Left) / blur), GaussianTable.Share((u - shape.Right) / blur));
            _basis[at] = 1 - left;
            _basis[at + 1] = right;
            _basis[at + 2] = left - right;
            _basis[at + 3] = ((u - centre) * (left - right) / half) + (blur / half * (GaussianTable.Density((u - shape.Left) / blur) - GaussianTable.Density((u - shape.Right) / blur)));
            _basis[at + 5] = Dome(u - centre, half, blur);
            _basis[at + 4] = Rims((u - centre) / blur, half / blur, nodes);
        }
    }

    /// <summary>∫ v² over the fibre against the blur: the second moment of a normal law between two limits.</summary>
    private static double Dome(double u, double half, double blur)
    {
        var (low, high) = ((-half - u) / blur, (half - u) / blur);
        var share = GaussianTable.Share(high) - GaussianTable.Share(low);
        var ends = ((u + half) * GaussianTable.Density(high)) - ((u - half) * GaussianTable.Density(low));
        return ((((u * u) + (blur * blur)) * share) - (blur * ends)) / (half * half);
    }

    /// <summary>∫ (min(cap, sec φ) − 1) cos φ · G(u − h sin φ) h dφ over the fibre, with lengths in blurs.</summary>
    private static double Rims(double u, double half, int nodes)
    {
        var sum = 0.0;
        var turn = Math.PI / nodes;
        for (var k = 0; k < nodes; k++)
        {
            var (sin, cos) = Math.SinCos((-0.5 * Math.PI) + ((k + 0.5) * turn));
            var z = u - (half * sin);
            if (Math.Abs(z) < 4)
            {
                sum += (Math.Min(Cap * cos, 1) - cos) * GaussianTable.Density(z);
            }
        }

        return sum * turn * half;
    }

    /// <summary>The six heights by least squares, the rim drawn to its usual strength.</summary>
    private double[] Solve(FibreProfile profile, double scale)
    {
        var normal = new double[Heights, Heights];
        var right = new double[Heights];
        for (var i = 0; i < profile.Values.Length; i++)
        {
            var weight = _weights[i] * scale * _weights[i] * scale;
            if (weight == 0)
            {
                continue;
            }

            for (var a = 0; a < Heights; a++)
            {
                var basis = weight * _basis[(i * Heights) + a];
                right[a] += basis * profile.Values[i];
                for (var b = 0; b <= a; b++)
                {
                    normal[a, b] += basis * _basis[(i * Heights) + b];
                }
            }
        }

        // (rim − usual · inside) / (spread · inside) is one more observation; the inside's height for it comes from the data.
        var level = Math.Max(1e-3, profile.Values[profile.Values.Length / 2]);
        var hold = 1 / Math.Pow(_priors.RimSpread * level, 2);
        normal[4, 4] += hold;
        normal[4, 2] -= hold * _priors.Rim;
        normal[2, 2] += hold * _priors.Rim * _priors.Rim;
        normal[3, 3] += 1 / Math.Pow(0.3 * level, 2);

        // The dome likewise: d = −dome height over the inside.
        var curve = 1 / Math.Pow(_priors.DomeSpread * level, 2);
        normal[5, 5] += curve;
        normal[5, 2] += curve * _priors.Dome;
        normal[2, 2] += curve * _priors.Dome * _priors.Dome;
        return SmallSystem.Solve(normal, right, Heights);
    }

    private static double Square(double[] residuals) => residuals.Sum(r => r * r);

    private static double[,] Normal(double[][] jacobian, double damping)
    {
        var normal = new double[3, 3];
        for (var a = 0; a < 3; a++)
        {
            for (var b = 0; b < 3; b++)
            {
                normal[a, b] = jacobian[a].Zip(jacobian[b], (p, q) => p * q).Sum();
            }

            normal[a, a] *= 1 + damping;
            normal[a, a] += 1e-9;
        }

        return normal;
    }

    private static double[] Step(double[][] jacobian, double[] residuals, double damping)
    {
        double[] right = [.. jacobian.Select(column => -column.Zip(residuals, (p, q) => p * q).Sum())];
        return SmallSystem.Solve(Normal(jacobian, damping), right, 3);
    }

    private static double[,] Inverse(double[,] normal)
    {
        var inverse = new double[3, 3];
        for (var c = 0; c < 3; c++)
        {
            var unit = new double[3];
            unit[c] = 1;
            var column = SmallSystem.Solve((double[,])normal.Clone(), unit, 3);
            for (var r = 0; r < 3; r++)
            {
                inverse[r, c] = column[r];
            }
        }

        return inverse;
    }

    private readonly record struct Shape(double Left, double Right, double LogBlur)
    {
        public Shape Nudged(int parameter, double by) => parameter switch
        {
            0 => this with { Left = Left + by },
            1 => this with { Right = Right + by },
            _ => this with { LogBlur = LogBlur + by },
        };

        public Shape Moved(double[] step) => new(Left + Math.Clamp(step[0], -1, 1), Right + Math.Clamp(step[1], -1, 1), LogBlur + Math.Clamp(step[2], -0.4, 0.4));

        public bool IsSane(FibreProfile profile) =>
            Right - Left > 0.4 * profile.Width && Right - Left < 1.4 * profile.Width && LogBlur is > -1.6 and < 2.5 && double.IsFinite(Left + Right);
    }
}
