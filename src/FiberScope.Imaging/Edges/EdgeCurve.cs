namespace FiberScope.Imaging.Edges;

/// <summary>The blurred brightness across a fibre for given parameters, and how it changes with each of them.</summary>
internal readonly ref struct EdgeCurve
{
    private readonly ReadOnlySpan<double> _at;

    // Per step, left and right: its height, and how much higher it is than what lies further out.
    private readonly Span<double> _left, _right, _jumpLeft, _jumpRight;
    private readonly double _half, _sharp;

    /// <param name="at">The parameters, in the order of <see cref="EdgeParameters"/>.</param>
    /// <param name="memory">Room for four times the steps.</param>
    public EdgeCurve(ReadOnlySpan<double> at, Span<double> memory)
    {
        _at = at;
        _half = 0.5 * (at[EdgeParameters.Right] - at[EdgeParameters.Left]);
        _sharp = Math.Exp(-at[EdgeParameters.LogBlur]);
        _left = memory[..EdgeShape.Steps];
        _right = memory.Slice(EdgeShape.Steps, EdgeShape.Steps);
        _jumpLeft = memory.Slice(2 * EdgeShape.Steps, EdgeShape.Steps);
        _jumpRight = memory.Slice(3 * EdgeShape.Steps, EdgeShape.Steps);
        var (outerLeft, outerRight) = (at[EdgeParameters.OutsideLeft], at[EdgeParameters.OutsideRight]);
        for (var k = 0; k < EdgeShape.Steps; k++)
        {
            var even = at[EdgeParameters.Inside] + (at[EdgeParameters.Rim] * EdgeShape.Rim[k]) + (at[EdgeParameters.Dome] * EdgeShape.Dome[k]);
            var tilt = at[EdgeParameters.Tilt] * EdgeShape.Tilt[k];
            (_left[k], _right[k]) = (even - tilt, even + tilt);
            (_jumpLeft[k], _jumpRight[k]) = (_left[k] - outerLeft, _right[k] - outerRight);
            (outerLeft, outerRight) = (_left[k], _right[k]);
        }
    }

    /// <summary>The blurred brightness at a place across; pixels.</summary>
    public double Value(double u)
    {
        var (fromLeft, fromRight) = ((u - _at[EdgeParameters.Left]) * _sharp, (_at[EdgeParameters.Right] - u) * _sharp);
        var sum = _at[EdgeParameters.OutsideLeft] + _at[EdgeParameters.OutsideRight];
        for (var k = 0; k < EdgeShape.Steps; k++)
        {
            var depth = EdgeShape.From[k] * _half * _sharp;
            sum += (_jumpLeft[k] * GaussianTable.At(fromLeft - depth).Share) + (_jumpRight[k] * GaussianTable.At(fromRight - depth).Share);
        }

        // Both halves end at the axis: left of it the right half is missing, and the other way round.
        var beyond = GaussianTable.At(fromLeft - (_half * _sharp)).Share;
        sum -= (_left[^1] * beyond) + (_right[^1] * (1 - beyond));
        var (left, right) = (GaussianTable.At(fromLeft), GaussianTable.At(fromRight));
        return sum + (_at[EdgeParameters.SlopeLeft] * Ramp(fromLeft, left)) + (_at[EdgeParameters.SlopeRight] * Ramp(fromRight, right));
    }

    /// <summary>The blurred brightness at a place across, and its derivatives by the parameters.</summary>
    public double At(double u, Span<double> row)
    {
        row.Clear();
        var (fromLeft, fromRight) = ((u - _at[EdgeParameters.Left]) * _sharp, (_at[EdgeParameters.Right] - u) * _sharp);
        var depthAxis = _half * _sharp;
        var (axis, axisDensity) = GaussianTable.At(fromLeft - depthAxis);
        var (edgeLeft, edgeRight) = (GaussianTable.At(fromLeft), GaussianTable.At(fromRight));
        var (shareLeft, shareRight) = (edgeLeft, edgeRight);
        var sum = (_at[EdgeParameters.OutsideLeft] * (1 - edgeLeft.Share)) + (_at[EdgeParameters.OutsideRight] * (1 - edgeRight.Share));
        for (var k = 0; k < EdgeShape.Steps; k++)
        {
            var last = k == EdgeShape.Steps - 1;
            var next = EdgeShape.From[k + 1] * depthAxis;
            var nextLeft = last ? (axis, axisDensity) : GaussianTable.At(fromLeft - next);
            var nextRight = last ? (1 - axis, axisDensity) : GaussianTable.At(fromRight - next);
            var (inLeft, inRight) = (shareLeft.Share - nextLeft.Item1, shareRight.Share - nextRight.Item1);
            sum += (_left[k] * inLeft) + (_right[k] * inRight);
            row[EdgeParameters.Inside] += inLeft + inRight;
            row[EdgeParameters.Rim] += EdgeShape.Rim[k] * (inLeft + inRight);
            row[EdgeParameters.Dome] += EdgeShape.Dome[k] * (inLeft + inRight);
            row[EdgeParameters.Tilt] += EdgeShape.Tilt[k] * (inRight - inLeft);
            Jump(row, EdgeShape.From[k], _jumpLeft[k] * shareLeft.Density, _jumpRight[k] * shareRight.Density, fromLeft, fromRight);
            (shareLeft, shareRight) = (nextLeft, nextRight);
        }

        Jump(row, 1, -_left[^1] * axisDensity, -_right[^1] * axisDensity, fromLeft, fromRight);
        row[EdgeParameters.OutsideLeft] = 1 - edgeLeft.Share;
        row[EdgeParameters.OutsideRight] = 1 - edgeRight.Share;
        return sum + Slopes(row, fromLeft, fromRight, edgeLeft, edgeRight);
    }

    /// <summary>How a step at a depth (in half-widths) moves with edges and blur; its jumps come times the density there.</summary>
    private void Jump(Span<double> row, double depth, double left, double right, double fromLeft, double fromRight)
    {
        if (left == 0 && right == 0)
        {
            return;
        }

        var (own, other) = ((1 - (0.5 * depth)) * _sharp, 0.5 * depth * _sharp);
        row[EdgeParameters.Left] += (right * other) - (left * own);
        row[EdgeParameters.Right] += (right * own) - (left * other);
        var inside = depth * _half * _sharp;
        row[EdgeParameters.LogBlur] -= (left * (fromLeft - inside)) + (right * (fromRight - inside));
    }

    private double Slopes(Span<double> row, double fromLeft, double fromRight, (double Share, double Density) left, (double Share, double Density) right)
    {
        var (slopeLeft, slopeRight) = (_at[EdgeParameters.SlopeLeft], _at[EdgeParameters.SlopeRight]);
        row[EdgeParameters.SlopeLeft] = Ramp(fromLeft, left);
        row[EdgeParameters.SlopeRight] = Ramp(fromRight, right);
        row[EdgeParameters.Left] += slopeLeft * (1 - left.Share);
        row[EdgeParameters.Right] -= slopeRight * (1 - right.Share);
        row[EdgeParameters.LogBlur] += ((slopeLeft * left.Density) + (slopeRight * right.Density)) / _sharp;
        return (slopeLeft * row[EdgeParameters.SlopeLeft]) + (slopeRight * row[EdgeParameters.SlopeRight]);
    }

    /// <summary>A ramp that begins at an edge and grows outwards, blurred; pixels.</summary>
    private double Ramp(double inwards, (double Share, double Density) at) => ((-inwards * (1 - at.Share)) + at.Density) / _sharp;
}
