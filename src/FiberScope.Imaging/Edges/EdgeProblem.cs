namespace FiberScope.Imaging.Edges;

/// <summary>The sum of squares of one profile: data, and what is known beforehand.</summary>
internal ref struct EdgeProblem
{
    private const int Size = EdgeParameters.Count;

    // How uneven the two flanks of a fibre are, and how fast the ground's grey changes: usual sizes, against the inside. Common practice, no source.
    private const double UsualTilt = 0.15, UsualSlope = 0.25;

    private readonly EdgeProfile _profile;
    private readonly PictureOptics _optics;
    private readonly int _from, _to;
    private readonly double _noise, _level, _blur;

    /// <param name="profile">What was seen.</param>
    /// <param name="optics">What is known.</param>
    public EdgeProblem(in EdgeProfile profile, PictureOptics optics)
    {
        _profile = profile;
        _optics = optics;
        _blur = EdgeWindow.StartingBlur(profile, optics.Blur);
        (_from, _to) = EdgeWindow.Of(profile, _blur);
        var middle = 0.5 * (profile.Left + profile.Right);
        _level = Math.Max(0.02, Mean(middle - (0.2 * profile.Width), middle + (0.2 * profile.Width)));

        // Noise of pixels is independent: a mean over a length and a spacing of samples sees this variance, times the spacing's inverse.
        _noise = profile.PixelNoise * profile.PixelNoise / Math.Max(1, profile.Length);
        Misfit = 1;
    }

    /// <summary>Mean square misfit over what the noise explains, at least 1.</summary>
    public double Misfit { get; private set; }

    /// <summary>Where the search begins.</summary>
    public readonly void Start(Span<double> at)
    {
        at.Clear();
        var inwards = Math.Min(0.35 * _blur, 0.1 * _profile.Width);
        at[EdgeParameters.Left] = _profile.Left + inwards;
        at[EdgeParameters.Right] = _profile.Right - inwards;
        at[EdgeParameters.LogBlur] = Math.Log(_blur);
        at[EdgeParameters.Inside] = _level;
    }

    /// <summary>The best heights for edges and blur as they are.</summary>
    public readonly void SolveHeights(Span<double> at, Span<double> normal, Span<double> right)
    {
        at[..EdgeParameters.Heights].Clear();
        Accumulate(at, normal, right);
        for (var p = EdgeParameters.Left; p < Size; p++)
        {
            for (var q = 0; q < Size; q++)
            {
                normal[(p * Size) + q] = p == q ? 1 : 0;
            }

            right[p] = 0;
        }

        SmallSystem.Factorise(normal, Size);
        SmallSystem.Solve(normal, right, Size);
        for (var p = 0; p < EdgeParameters.Heights; p++)
        {
            at[p] += right[p];
        }
    }

    /// <summary>Normal equations of the next step; returns the sum of squares.</summary>
    public readonly double Accumulate(ReadOnlySpan<double> at, Span<double> normal, Span<double> right)
    {
        normal.Clear();
        right.Clear();
        Span<double> row = stackalloc double[Size];
        var curve = new EdgeCurve(at, stackalloc double[4 * EdgeShape.Steps]);
        var cost = 0.0;
        for (var i = _from; i < _to; i++)
        {
            var off = _profile.Grey[i] - curve.At(_profile.Offsets[i], row);
            var weight = Weight(i);
            cost += weight * off * off;
            Add(normal, right, row, off, weight);
        }

        return cost + AddKnown(at, normal, right, row);
    }

    /// <summary>Takes the step, shortened until the sum of squares falls; true when nothing moves any more.</summary>
    public readonly bool Move(ReadOnlySpan<double> from, ReadOnlySpan<double> step, Span<double> to, double cost)
    {
        var blur = Math.Exp(from[EdgeParameters.LogBlur]);
        var reach = Math.Max(0.5 * blur, 0.05 * _profile.Width);
        var share = Math.Min(1, 1 / Math.Max(1e-12, Math.Max(Math.Max(Math.Abs(step[EdgeParameters.Left]), Math.Abs(step[EdgeParameters.Right])) / reach, Math.Abs(step[EdgeParameters.LogBlur]) / 0.3)));
        for (var halving = 0; halving < 6; halving++, share *= 0.4)
        {
            for (var p = 0; p < Size; p++)
            {
                to[p] = from[p] + (share * step[p]);
            }

            if (to[EdgeParameters.Right] - to[EdgeParameters.Left] > 0.3 * blur && Cost(to) <= cost * (1 + 1e-9))
            {
                return Math.Abs(step[EdgeParameters.Left]) + Math.Abs(step[EdgeParameters.Right]) < 0.02 * blur && share > 0.9;
            }
        }

        from.CopyTo(to);
        return true;
    }

    /// <summary>What the model cannot explain counts as noise: known values then weigh more, and uncertainties grow.</summary>
    public void Rescale(scoped ReadOnlySpan<double> at)
    {
        var curve = new EdgeCurve(at, stackalloc double[4 * EdgeShape.Steps]);
        double sum = 0, pixels = 0;
        for (var i = _from; i < _to; i++)
        {
            var off = _profile.Grey[i] - curve.Value(_profile.Offsets[i]);
            sum += off * off * Spacing(i) / _noise;
            pixels += Spacing(i);
        }

        Misfit = Math.Max(1, sum / Math.Max(pixels - 7, 0.3 * pixels));
    }

    private readonly double Cost(ReadOnlySpan<double> at)
    {
        var curve = new EdgeCurve(at, stackalloc double[4 * EdgeShape.Steps]);
        var cost = 0.0;
        for (var i = _from; i < _to; i++)
        {
            var off = _profile.Grey[i] - curve.Value(_profile.Offsets[i]);
            cost += Weight(i) * off * off;
        }

        Span<double> none = stackalloc double[Size];
        return cost + AddKnown(at, [], [], none);
    }

    private readonly double Spacing(int i) => 0.5 * (_profile.Offsets[Math.Min(i + 1, _profile.Offsets.Length - 1)] - _profile.Offsets[Math.Max(0, i - 1)]);

    private readonly double Weight(int i) => Spacing(i) / (_noise * Misfit);

    private readonly double Mean(double low, double high)
    {
        double sum = 0;
        var count = 0;
        for (var i = 0; i < _profile.Offsets.Length; i++)
        {
            if (_profile.Offsets[i] >= low && _profile.Offsets[i] <= high)
            {
                sum += _profile.Grey[i];
                count++;
            }
        }

        return count == 0 ? _profile.Grey[_profile.Grey.Length / 2] : sum / count;
    }

    /// <summary>The usual blur, rim, dome, tilt and ground as observations; returns their squares.</summary>
    private readonly double AddKnown(ReadOnlySpan<double> at, Span<double> normal, Span<double> right, Span<double> row)
    {
        var inside = at[EdgeParameters.Inside];
        var slope = UsualSlope * _level / (2 + (2 * _optics.Blur));
        return KnownBlur(at, normal, right, row)
            + Known(normal, right, row, at[EdgeParameters.Rim] - (_optics.Rim * inside), _optics.RimSpread * _level, (EdgeParameters.Rim, 1), (EdgeParameters.Inside, -_optics.Rim))
            + Known(normal, right, row, at[EdgeParameters.Dome] - (_optics.Dome * inside), _optics.DomeSpread * _level, (EdgeParameters.Dome, 1), (EdgeParameters.Inside, -_optics.Dome))
            + Known(normal, right, row, at[EdgeParameters.Tilt], UsualTilt * _level, (EdgeParameters.Tilt, 1), (EdgeParameters.Inside, 0))
            + Known(normal, right, row, at[EdgeParameters.SlopeLeft], slope, (EdgeParameters.SlopeLeft, 1), (EdgeParameters.Inside, 0))
            + Known(normal, right, row, at[EdgeParameters.SlopeRight], slope, (EdgeParameters.SlopeRight, 1), (EdgeParameters.Inside, 0));
    }

    /// <summary>
    /// The usual blur as an observation with the long tails of Student's law: a fibre out of focus is not usual, and may say so.
    /// </summary>
    private readonly double KnownBlur(ReadOnlySpan<double> at, Span<double> normal, Span<double> right, Span<double> row)
    {
        const double Freedom = 4;
        var off = at[EdgeParameters.LogBlur] - Math.Log(_optics.Blur);
        var square = off * off / (_optics.BlurSpread * _optics.BlurSpread);
        Known(normal, right, row, off, _optics.BlurSpread * Math.Sqrt((Freedom + square) / (Freedom + 1)), (EdgeParameters.LogBlur, 1), (EdgeParameters.Inside, 0));
        return (Freedom + 1) * Math.Log(1 + (square / Freedom));
    }

    private static double Known(Span<double> normal, Span<double> right, Span<double> row, double off, double spread, (int At, double Slope) first, (int At, double Slope) second)
    {
        var weight = 1 / (spread * spread);
        if (!normal.IsEmpty)
        {
            row.Clear();
            row[first.At] = first.Slope;
            row[second.At] += second.Slope;
            Add(normal, right, row, -off, weight);
        }

        return weight * off * off;
    }

    private static void Add(Span<double> normal, Span<double> right, ReadOnlySpan<double> row, double off, double weight)
    {
        for (var p = 0; p < Size; p++)
        {
            var scaled = weight * row[p];
            right[p] += scaled * off;
            var line = normal.Slice(p * Size, p + 1);
            for (var q = 0; q < line.Length; q++)
            {
                line[q] += scaled * row[q];
            }
        }
    }
}
