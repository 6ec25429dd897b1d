using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Mats;

/// <summary>A patch of film, its outline drawn out into cusps where fibres hold it. Lengths in pixels.</summary>
internal sealed class FilmPatch
{
    private const int Steps = 1024;
    private readonly float[] _radius = new float[Steps + 1];

    public FilmPatch(int group, double x, double y, double z, double radius, SeededRandom random)
    {
        (Group, X, Y, Z) = (group, (float)x, (float)y, (float)z);
        Brightness = (float)random.Between(0.6, 0.95);
        var waves = new (double A, double B)[5];
        for (var k = 2; k < waves.Length; k++)
        {
            waves[k] = (0.16 / k * random.Normal(), 0.16 / k * random.Normal());
        }

        var cusps = 9 + random.Below(10);
        var depth = random.Between(0.12, 0.3);
        for (var i = 0; i <= Steps; i++)
        {
            _radius[i] = (float)(radius * Shape(i, waves, cusps, depth));
            Reach = Math.Max(Reach, _radius[i]);
        }
    }

    public int Group { get; }

    public float X { get; }

    public float Y { get; }

    public float Z { get; }

    public float Brightness { get; }

    /// <summary>The largest distance of the outline from the centre.</summary>
    public float Reach { get; }

    /// <summary>Distance from the centre over that of the outline in the same direction; below 1 inside.</summary>
    public float Closeness(float dx, float dy)
    {
        var sum = Math.Abs(dx) + Math.Abs(dy);
        if (sum < 1e-6f)
        {
            return 0;
        }

        // The diamond angle runs from 0 to 4 as the direction goes round; unlike an arc tangent it is made of exact operations.
        var p = dy >= 0 ? (dx >= 0 ? dy / sum : 1 - (dx / sum)) : (dx < 0 ? 2 - (dy / sum) : 3 + (dx / sum));
        var place = Math.Clamp(p * (Steps / 4f), 0, Steps - 1e-3f);
        var index = (int)place;
        var radius = _radius[index] + ((place - index) * (_radius[index + 1] - _radius[index]));
        return MathF.Sqrt((dx * dx) + (dy * dy)) / radius;
    }

    private static double Shape(int step, (double A, double B)[] waves, int cusps, double depth)
    {
        var p = 4.0 * step / Steps;
        var (x, y) = p switch
        {
            < 1 => (1 - p, p),
            < 2 => (1 - p, 2 - p),
            < 3 => (p - 3, 2 - p),
            _ => (p - 3, p - 4),
        };
        var length = Math.Sqrt((x * x) + (y * y));
        (double C, double S) unit = (x / length, y / length), turn = (1, 0);
        var shape = 1.0;
        for (var k = 1; k <= cusps; k++)
        {
            turn = ((turn.C * unit.C) - (turn.S * unit.S), (turn.C * unit.S) + (turn.S * unit.C));
            shape += k < waves.Length ? (waves[k].A * turn.C) + (waves[k].B * turn.S) : 0;
        }

        return Math.Max(0.3, shape + (depth * (1 - Math.Sqrt(Math.Max(0, (1 - turn.C) / 2)))));
    }
}
