using MathNet.Numerics.RootFinding;

namespace FiberScope.Validation.Filtration.Reference;

/// <summary>Particles with inertia, followed from the cell's rim; the limiting one gives the efficiency.</summary>
/// <remarks>
/// dv/dt = (u − v) / τ with Stokes drag, τ U / Rf = 2 Stk where Stk = ρp dp² Cc U / (18 μ df). Particles start on the rim with
/// the face velocity (1, 0). A particle is collected when its centre comes within 1 + R. Integrated with the embedded
/// pair of Bogacki and Shampine (1989, order 3 with 2), step controlled by <see cref="Tolerance"/>.
/// </remarks>
internal sealed class TrajectorySolver(CellFlow flow, double tolerance = 1e-7)
{
    /// <summary>Largest error of position and velocity in one step.</summary>
    public double Tolerance => tolerance;

    /// <summary>The efficiency by interception and inertia: the height of the limiting trajectory in fibre radii.</summary>
    public double Efficiency(double ratio, double stokes)
    {
        if (1 + ratio >= flow.Rim)
        {
            return flow.Rim;
        }

        var reach = Math.Min(1 + ratio, flow.Rim * 0.999999);
        double Miss(double logHeight) => ClosestApproach(Math.Exp(logHeight), stokes) - (1 + ratio);
        var low = Math.Log(0.2 * Math.Min(flow.Interception(ratio), 1));
        var high = Math.Log(Math.Min(2 * reach, flow.Rim * 0.999999));
        return Math.Exp(Brent.FindRoot(Miss, low, high, accuracy: 1e-7, maxIterations: 200));
    }

    /// <summary>The nearest distance to the fibre's axis on a trajectory that starts at a height; the fibre's surface is 1.</summary>
    public double ClosestApproach(double height, double stokes)
    {
        var state = new State(-Math.Sqrt((flow.Rim * flow.Rim) - (height * height)), height, 1, 0);
        var relaxation = 2 * stokes;
        var step = 0.1 * Math.Min(relaxation, 0.5);
        var slope = Slope(state, relaxation);
        var nearest = state.Radius;
        for (var count = 0; count < 2_000_000; count++)
        {
            var (next, nextSlope, error) = Step(state, slope, step, relaxation);
            if (error > 1)
            {
                step *= Math.Max(0.2, 0.9 * Math.Pow(error, -1d / 3));
                continue;
            }

            if (next.Radius <= 1)
            {
                return next.Radius;
            }

            nearest = Math.Min(nearest, NearestWithin(state, next, step));
            if (next.X > 0 && ((next.X * next.VelocityX) + (next.Y * next.VelocityY) > 0) && next.Radius > nearest + 1e-3)
            {
                return nearest;
            }

            (state, slope) = (next, nextSlope);
            step *= Math.Min(3, 0.9 * Math.Pow(Math.Max(error, 1e-6), -1d / 3));
        }

        throw new InvalidOperationException("A trajectory did not leave the cell.");
    }

    /// <summary>The nearest distance inside one step, from the cubic through both ends, where the step passes its minimum.</summary>
    private static double NearestWithin(in State from, in State to, double step)
    {
        if (from.Approach >= 0 || to.Approach <= 0)
        {
            return Math.Min(from.Radius, to.Radius);
        }

        var (start, end) = (from.Approach / from.Radius, to.Approach / to.Radius);
        var (low, high) = (0d, 1d);
        for (var k = 0; k < 40; k++)
        {
            var t = 0.5 * (low + high);
            var slope = (6 * t * (t - 1) * (from.Radius - to.Radius)) + (step * ((((3 * t) - 4) * t + 1) * start + (((3 * t) - 2) * t * end)));
            (low, high) = slope < 0 ? (t, high) : (low, t);
        }

        var s = low;
        return ((1 + (2 * s)) * (1 - s) * (1 - s) * from.Radius) + (s * (1 - s) * (1 - s) * step * start)
            + (s * s * (3 - (2 * s)) * to.Radius) + (s * s * (s - 1) * step * end);
    }

    private (State Next, State Slope, double Error) Step(in State state, in State slope, double step, double relaxation)
    {
        var second = Slope(state.Moved(slope, step / 2), relaxation);
        var third = Slope(state.Moved(second, 0.75 * step), relaxation);
        var next = state.Moved(slope, 2 * step / 9).Moved(second, step / 3).Moved(third, 4 * step / 9);
        var last = Slope(next, relaxation);
        var difference = default(State).Moved(slope, -5 * step / 72).Moved(second, step / 12)
            .Moved(third, step / 9).Moved(last, -step / 8);
        return (next, last, difference.Largest / tolerance);
    }

    private State Slope(in State state, double relaxation)
    {
        var radius = state.Radius;
        // Inside the fibre the trajectory is already lost; the surface's air keeps the integrator finite there.
        var scale = radius < 1 ? 1 / radius : 1;
        var (airX, airY) = flow.Velocity(state.X * scale, state.Y * scale);
        return new State(state.VelocityX, state.VelocityY, (airX - state.VelocityX) / relaxation, (airY - state.VelocityY) / relaxation);
    }

    private readonly record struct State(double X, double Y, double VelocityX, double VelocityY)
    {
        public double Radius => Math.Sqrt((X * X) + (Y * Y));

        /// <summary>r dr/dt.</summary>
        public double Approach => (X * VelocityX) + (Y * VelocityY);

        public double Largest => Math.Max(Math.Max(Math.Abs(X), Math.Abs(Y)), Math.Max(Math.Abs(VelocityX), Math.Abs(VelocityY)));

        public State Moved(in State slope, double step) =>
            new(X + (slope.X * step), Y + (slope.Y * step), VelocityX + (slope.VelocityX * step), VelocityY + (slope.VelocityY * step));
    }
}
