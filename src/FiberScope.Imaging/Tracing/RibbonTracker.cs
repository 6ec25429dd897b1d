using System.Numerics.Tensors;

namespace FiberScope.Imaging.Tracing;

/// <summary>A step along a followed fibre, in pixels of the full picture (first pixel's centre at 0).</summary>
internal readonly record struct TrackPoint(float X, float Y, float Normal, float HalfWidth, float Score);

/// <summary>Follows a fibre from a seed, both ways, over crossings.</summary>
internal sealed class RibbonTracker
{
    /// <summary>Weights of rows one spread apart, from two spreads behind to two ahead; Gaussian, of sum 1.</summary>
    private static readonly float[] RowWeights = [0.0544887f, 0.2442013f, 0.40262f, 0.2442013f, 0.0544887f];

    private const float SampleStep = 0.5f;
    private const int MostSteps = 4000;
    private const float TurnStep = 0.075f;

    private readonly Plane _level;
    private readonly float _scale;
    private readonly float _noise;
    private readonly float _insideWeight;
    private readonly float[] _profile = new float[256];
    private readonly float[] _slope = new float[256];

    public RibbonTracker(Plane level, int index, double noise, double insideWeight)
    {
        _level = level;
        _scale = 1 << index;
        _noise = (float)noise;
        _insideWeight = (float)insideWeight;
    }

    /// <summary>The whole track through a seed; in pixels of the full picture.</summary>
    public List<TrackPoint> Follow(Seed seed)
    {
        var start = new State(seed.X, seed.Y, seed.Normal, seed.HalfWidth, seed.Score, 0);
        var slopeNoise = _noise * 0.44f / MathF.Sqrt(3.54f * Spread(seed.HalfWidth));
        var threshold = Math.Max(2.5f * slopeNoise, 0.25f * seed.Score);
        var back = Walk(start, -1, threshold);
        var forth = Walk(start, 1, threshold);
        back.Reverse();
        back.Add(Full(start));
        back.AddRange(forth);
        return back;
    }

    /// <summary>The paired-edge score of a ribbon in pixels of the full picture, at just this place, direction and width.</summary>
    public float Score(double x, double y, double normal, double halfWidth)
    {
        var at = new State((float)((x + 0.5) / _scale) - 0.5f, (float)((y + 0.5) / _scale) - 0.5f, (float)normal, (float)halfWidth / _scale, 0, 0);
        return Measure(at).Score;
    }

    private List<TrackPoint> Walk(State start, float sign, float threshold)
    {
        var track = new List<TrackPoint>();
        var state = start;
        var (missed, good) = (0f, 0);
        while (track.Count < MostSteps)
        {
            var step = Math.Clamp(0.5f * state.HalfWidth, 1f, 3f);
            var (sin, cos) = MathF.SinCos(state.Normal);
            var ahead = state with { X = state.X - (sign * step * sin), Y = state.Y + (sign * step * cos), Normal = state.Normal + (sign * state.Curl * step) };
            if (ahead.X < 1 || ahead.Y < 1 || ahead.X > _level.Width - 2 || ahead.Y > _level.Height - 2)
            {
                break;
            }

            var found = Improve(ahead, threshold, look: track.Count % 2 == 0);
            if (found.Score < threshold)
            {
                missed += step;
                if (missed > Math.Max(4f, 2.4f * state.HalfWidth))
                {
                    break;
                }

                state = ahead;
            }
            else
            {
                var turn = sign * (found.Normal - ahead.Normal) / step;
                state = found with { Curl = (0.75f * state.Curl) + (0.25f * (state.Curl + turn) * 0.8f) };
                missed = 0;
            }

            track.Add(Full(state));
            good = missed == 0 ? track.Count : good;
            if (track.Count > 60 && Math.Abs(state.X - start.X) + Math.Abs(state.Y - start.Y) < 2 * start.HalfWidth)
            {
                break;
            }
        }

        return track.GetRange(0, good);
    }

    private TrackPoint Full(State s) =>
        new(((s.X + 0.5f) * _scale) - 0.5f, ((s.Y + 0.5f) * _scale) - 0.5f, s.Normal, s.HalfWidth * _scale, s.Score);

    /// <summary>Goes straight on where that does well; else, and on every other step, tries a few directions.</summary>
    /// <remarks>In each the profile itself says where the two edges are. A fibre's curve is gentle over two steps.</remarks>
    private State Improve(State guess, float threshold, bool look)
    {
        var straight = Turned(guess, 0, threshold);
        if (!look && straight.Score > 0.9f * guess.Score)
        {
            return straight;
        }

        var (left, right) = (Turned(guess, -1, threshold), Turned(guess, 1, threshold));
        if (left.Score <= straight.Score && right.Score <= straight.Score)
        {
            return straight;
        }

        // The better side leads further; most steps need no such look.
        var best = left.Score > right.Score ? left : right;
        var further = Turned(guess, left.Score > right.Score ? -2 : 2, threshold);
        return further.Score > best.Score ? further : best;
    }

    private State Turned(State guess, int turns, float threshold)
    {
        var tried = Measure(guess with { Normal = guess.Normal + (turns * TurnStep) });
        return tried with { Score = tried.Score - (threshold * 0.05f * turns * turns) };
    }

    /// <summary>Averages a short straight piece along the fibre and finds the two edges on the mean profile.</summary>
    private State Measure(State at)
    {
        var half = at.HalfWidth;
        var reach = Math.Min((_profile.Length / 2) - 1, (int)MathF.Ceiling(((1.3f * half) + 3f) / SampleStep));
        var count = (2 * reach) + 1;
        Average(at, reach, count);
        Smooth(count);
        for (var i = 1; i < count - 1; i++)
        {
            _slope[i] = (_profile[i + 1] - _profile[i - 1]) / (2 * SampleStep);
        }

        _slope[0] = _slope[count - 1] = 0;
        var tolerance = Math.Max(1f, 0.22f * half);
        var (left, leftRise) = Edge(reach, -half, tolerance, 1);
        var (right, rightRise) = Edge(reach, half, tolerance, -1);
        var score = Math.Min(leftRise, rightRise);
        if (score <= 0 || right - left < 1.6f)
        {
            return at with { Score = Math.Min(score, 0) };
        }

        var slopeNoise = _noise * 0.44f / MathF.Sqrt(3.54f * Spread(half));
        score -= _insideWeight * Math.Max(0, Inside(reach, left, right) - (2 * slopeNoise));
        var (middle, width) = (0.5f * (left + right), 0.5f * (right - left));
        var change = (width - half) / Math.Max(1, half);
        score -= Math.Min(leftRise, rightRise) * 1.5f * change * change;
        var (sin, cos) = MathF.SinCos(at.Normal);
        return at with { X = at.X + (0.6f * middle * cos), Y = at.Y + (0.6f * middle * sin), HalfWidth = (0.7f * half) + (0.3f * width), Score = score };
    }

    private void Average(State at, int reach, int count)
    {
        var (sin, cos) = MathF.SinCos(at.Normal);
        var spread = Spread(at.HalfWidth);
        Array.Clear(_profile, 0, count);
        for (var r = 0; r < RowWeights.Length; r++)
        {
            var along = (r - (RowWeights.Length / 2)) * spread;
            var (x, y) = (at.X - (along * sin) - (reach * SampleStep * cos), at.Y + (along * cos) - (reach * SampleStep * sin));
            var line = _slope.AsSpan(0, count);
            _level.SampleLine(x, y, SampleStep * cos, SampleStep * sin, line);
            TensorPrimitives.MultiplyAdd(line, RowWeights[r], _profile.AsSpan(0, count), _profile.AsSpan(0, count));
        }
    }

    private static float Spread(float halfWidth) => Math.Clamp(0.45f * halfWidth, 1.2f, 3f);

    private void Smooth(int count)
    {
        for (var pass = 0; pass < 2; pass++)
        {
            var before = _profile[0];
            for (var i = 1; i < count - 1; i++)
            {
                var here = _profile[i];
                _profile[i] = (0.25f * before) + (0.5f * here) + (0.25f * _profile[i + 1]);
                before = here;
            }
        }
    }

    /// <summary>The strongest climb inwards near the wanted offset, and where it is.</summary>
    private (float Offset, float Rise) Edge(int reach, float wanted, float tolerance, float sign)
    {
        var from = Math.Max(1, (int)MathF.Round((wanted - tolerance) / SampleStep) + reach);
        var to = Math.Min((2 * reach) - 1, (int)MathF.Round((wanted + tolerance) / SampleStep) + reach);
        var (best, where) = (float.NegativeInfinity, from);
        for (var i = from; i <= to; i++)
        {
            var off = (((i - reach) * SampleStep) - wanted) / tolerance;
            var value = sign * _slope[i] * (1 - (0.15f * off * off));
            if (value > best)
            {
                (best, where) = (value, i);
            }
        }

        return ((where - reach) * SampleStep, best);
    }

    private float Inside(int reach, float left, float right)
    {
        var margin = Math.Max(2.2f, 0.2f * (right - left));
        var from = (int)MathF.Ceiling((left + margin) / SampleStep) + reach;
        var to = (int)MathF.Floor((right - margin) / SampleStep) + reach;
        var worst = 0f;
        for (var i = from; i <= to; i++)
        {
            worst = Math.Max(worst, Math.Abs(_slope[i]));
        }

        return worst;
    }

    private readonly record struct State(float X, float Y, float Normal, float HalfWidth, float Score, float Curl);
}
