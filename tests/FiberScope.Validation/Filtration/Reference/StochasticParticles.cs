namespace FiberScope.Validation.Filtration.Reference;

/// <summary>Particles with inertia and Brownian motion together, followed one by one: the judge of rules that combine the two.</summary>
/// <remarks>
/// Langevin equation dv = (u − v) dt / τ + √(2 D) dW / τ with τ = 2 Stk and D = 2 / Pe in fibre radii and face velocities;
/// each step takes the local air as constant and is exact otherwise (Ornstein and Uhlenbeck). Steps shrink towards the
/// collision surface. The rim's inflow half reflects (total flux u n0), its outflow half lets go. Start heights are
/// stratified as b s³, so that the few near the axis, which are collected, are many. Seeded.
/// </remarks>
internal sealed class StochasticParticles(CellFlow flow, double peclet, double ratio, double stokes)
{
    private readonly double _diffusivity = 2 / peclet;
    private readonly double _relaxation = 2 * stokes;
    private readonly double _surface = 1 + ratio;

    /// <summary>The efficiency and its standard error from a number of particles.</summary>
    public (double Efficiency, double StandardError) Efficiency(int particles, int seed)
    {
        var random = new GaussianSource(seed);
        var (sum, squares) = (0d, 0d);
        for (var k = 0; k < particles; k++)
        {
            var s = (k + random.Uniform()) / particles;
            var weight = 3 * s * s * flow.Rim;
            if (Collects(s * s * s * flow.Rim, random))
            {
                sum += weight;
                squares += weight * weight;
            }
        }

        var mean = sum / particles;
        return (mean, Math.Sqrt(Math.Max(0, (squares / particles) - (mean * mean)) / particles));
    }

    private bool Collects(double height, GaussianSource random)
    {
        var thermal = Math.Sqrt(_diffusivity / _relaxation);
        var (x, y) = (-Math.Sqrt((flow.Rim * flow.Rim) - (height * height)), height);
        var (vx, vy) = (1 + (thermal * random.Next()), thermal * random.Next());
        while (true)
        {
            var r = Math.Sqrt((x * x) + (y * y));
            var step = StepFor(r - _surface, Math.Sqrt((vx * vx) + (vy * vy)));
            var h = step / _relaxation;
            var (ux, uy) = MidwayAir(x, y, vx, vy, step);
            var decay = Math.Exp(-h);
            var (noiseVelocityX, noiseMoveX) = Noise(h, decay, random);
            var (noiseVelocityY, noiseMoveY) = Noise(h, decay, random);
            x += (ux * step) + ((vx - ux) * _relaxation * (1 - decay)) + noiseMoveX;
            y += (uy * step) + ((vy - uy) * _relaxation * (1 - decay)) + noiseMoveY;
            vx = ux + ((vx - ux) * decay) + noiseVelocityX;
            vy = uy + ((vy - uy) * decay) + noiseVelocityY;
            var squared = (x * x) + (y * y);
            if (squared <= _surface * _surface)
            {
                return true;
            }

            if (squared > flow.Rim * flow.Rim)
            {
                if (x > 0)
                {
                    return false;
                }

                Reflect(ref x, ref y, ref vx, ref vy);
            }
        }
    }

    /// <summary>The air's velocity where the particle will be halfway through the step, but for its random motion.</summary>
    private (double X, double Y) MidwayAir(double x, double y, double vx, double vy, double step)
    {
        var (ux, uy) = flow.Velocity(x, y);
        var coast = _relaxation * (1 - Math.Exp(-0.5 * step / _relaxation));
        return flow.Velocity(x + (0.5 * ux * step) + ((vx - ux) * coast), y + (0.5 * uy * step) + ((vy - uy) * coast));
    }

    /// <summary>A step short against the way to the surface, by motion as by diffusion.</summary>
    private double StepFor(double gap, double speed)
    {
        const double Floor = 0.004;
        var way = 0.2 * Math.Max(gap, Floor);
        var ballistic = way / Math.Max(speed, 0.05);
        // Spread after time t: 2 D t once t is beyond the relaxation, (D / τ) t² before it.
        var diffusive = Math.Max(way * way / (2 * _diffusivity), way * Math.Sqrt(_relaxation / _diffusivity));
        return Math.Min(Math.Min(ballistic, diffusive), 0.1);
    }

    /// <summary>Joint noise of velocity and displacement over a step of h relaxation times.</summary>
    private (double Velocity, double Move) Noise(double h, double decay, GaussianSource random)
    {
        var velocityVariance = _diffusivity / _relaxation * (1 - (decay * decay));
        var covariance = _diffusivity * (1 - decay) * (1 - decay);
        var series = h < 0.02
            ? (2d / 3 * h * h * h) - (0.5 * h * h * h * h)
            : (2 * h) - 3 + (4 * decay) - (decay * decay);
        var moveVariance = _diffusivity * _relaxation * series;
        var velocity = Math.Sqrt(velocityVariance) * random.Next();
        var slope = covariance / velocityVariance;
        var rest = Math.Max(0, moveVariance - (slope * covariance));
        return (velocity, (slope * velocity) + (Math.Sqrt(rest) * random.Next()));
    }

    private void Reflect(ref double x, ref double y, ref double vx, ref double vy)
    {
        var r = Math.Sqrt((x * x) + (y * y));
        var scale = Math.Max((2 * flow.Rim) - r, _surface * 1.0001) / r;
        var outward = Math.Max(0, ((vx * x) + (vy * y)) / r);
        vx -= 2 * outward * x / r;
        vy -= 2 * outward * y / r;
        x *= scale;
        y *= scale;
    }

    /// <summary>Uniform and normal numbers from a seed.</summary>
    private sealed class GaussianSource(int seed)
    {
        private readonly Random _random = new(seed);
        private double _spare = double.NaN;

        public double Uniform() => _random.NextDouble();

        public double Next()
        {
            if (!double.IsNaN(_spare))
            {
                var kept = _spare;
                _spare = double.NaN;
                return kept;
            }

            var radius = Math.Sqrt(-2 * Math.Log(1 - _random.NextDouble()));
            var (sine, cosine) = Math.SinCos(2 * Math.PI * _random.NextDouble());
            _spare = radius * sine;
            return radius * cosine;
        }
    }
}
