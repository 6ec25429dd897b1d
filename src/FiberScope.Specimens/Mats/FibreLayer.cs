using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Mats;

/// <summary>Lays the fibres of a mat: lines placed at random over a disc round the picture, each wandering about its direction.</summary>
/// <remarks>
/// Lines with uniform offsets meet every part of the disc alike, and each has the same expected length in it, so that diameters drawn
/// line by line from the length-weighted law give the mat that length-weighted law. The doubled angle follows a wrapped Cauchy law,
/// whose ⟨cos 2θ⟩ is its parameter (Mardia and Jupp 2000, Directional Statistics, from memory).
/// </remarks>
internal sealed class FibreLayer(MatScale scale, SeededRandom random)
{
    private readonly MatRecipe _mat = scale.Recipe.Mat;
    private readonly double _reach = (Math.Sqrt(((double)scale.Width * scale.Width) + ((double)scale.Height * scale.Height)) / 2) + (4 * scale.MeanDiameter) + 24;
    private readonly List<FibreCurve> _fibres = [];
    private readonly List<RopeStretch> _ropes = [];

    public (FibreCurve[] Fibres, RopeStretch[] Ropes) Lay()
    {
        var wanted = scale.LengthPerVolume * scale.LaidDepth * 2 * _reach;
        var count = (int)Math.Floor(wanted + random.Next());
        for (var rope = 0; rope < scale.Recipe.Defects.Ropes; rope++)
        {
            var leader = Leader(nearTop: true, rope);
            _fibres.Add(leader);
            Alongside(leader, 2 + random.Below(scale.Recipe.Defects.RopeFibres - 1), rope);
        }

        while (_fibres.Count < count)
        {
            var leader = Leader(nearTop: false, rope: -1);
            _fibres.Add(leader);
            if (random.Next() < _mat.PairedShare / 2)
            {
                Alongside(leader, 1, rope: -1);
            }
        }

        return ([.. _fibres.OrderByDescending(f => f.Level)], [.. _ropes]);
    }

    private FibreCurve Leader(bool nearTop, int rope)
    {
        var direction = Direction();
        var diameter = scale.Diameters.Draw(random);
        var offset = random.Between(-_reach, _reach) * (nearTop ? 0.4 : 1);
        var level = scale.LaidDepth * (nearTop ? random.Between(0.85, 1) : random.Next());
        var nodes = Walk(direction, offset, level, diameter);
        return Fibre(nodes, diameter, rope);
    }

    private FibreCurve Fibre(FibreNode[] nodes, double diameter, int rope)
    {
        var look = scale.Recipe.Electrons;
        var charged = random.Next() < look.ChargedShare;
        var brightness = Math.Max(0.3, 1 + (look.BrightnessSpread * random.Normal())) * (charged ? random.Between(1.3, 1.9) : 1);
        return new FibreCurve
        {
            Nodes = nodes,
            Diameter = diameter,
            Brightness = (float)brightness,
            Rim = (float)Math.Max(0, look.RimHeight * (1 + (look.RimSpread * random.Normal()))),
            Rope = rope,
        };
    }

    private (double Cos, double Sin) Direction()
    {
        var (sin, cos) = PortableMath.SinCos(Math.PI * (random.Next() - 0.5));
        var order = _mat.OrientationOrder;
        var tangent = (1 - order) / (1 + order) * sin / Math.Max(cos, 1e-12);
        var c = 1 / Math.Sqrt(1 + (tangent * tangent));
        var s = tangent * c;
        var preferred = PortableMath.SinCos(_mat.PreferredDirection.Radians);
        return ((c * preferred.Cos) - (s * preferred.Sin), (s * preferred.Cos) + (c * preferred.Sin));
    }

    private FibreNode[] Walk((double Cos, double Sin) direction, double offset, double level, double diameter)
    {
        var pixel = scale.Recipe.PixelSize.Meters;
        var wanderLength = _mat.WanderLength.Meters / pixel;
        var wander = Wave.Several(random, _mat.Wander.Radians, wanderLength);
        var height = Wave.Several(random, Math.Min(0.12 * scale.MeanDepth, 0.1 * scale.LaidDepth), Math.Max(wanderLength, 30 * diameter));
        var thickness = Wave.Several(random, _mat.DiameterUnevenness, Math.Max(20 * diameter, 0.5 * wanderLength));
        var bend = 2 * Math.PI * Math.Max(0.01, _mat.Wander.Radians) / wanderLength;
        var step = Math.Clamp(Math.Sqrt(0.08 / bend), 1.5, 10);
        var (x0, y0) = ((scale.Width / 2.0) - (offset * direction.Sin), (scale.Height / 2.0) + (offset * direction.Cos));
        var backward = Half(-step);
        backward.Reverse();
        return [.. backward, .. Half(step).Skip(1)];

        List<FibreNode> Half(double h)
        {
            var nodes = new List<FibreNode>();
            var (x, y, s) = (x0, y0, 0.0);
            while (true)
            {
                var (sin, cos) = PortableMath.SinCos(Wave.Sum(wander, s));
                var (tx, ty) = ((direction.Cos * cos) - (direction.Sin * sin), (direction.Sin * cos) + (direction.Cos * sin));
                var radius = diameter / 2 * (1 + Wave.Sum(thickness, s));
                nodes.Add(new((float)x, (float)y, (float)(level + Wave.Sum(height, s)), (float)radius, (float)tx, (float)ty));
                var (dx, dy) = (x - (scale.Width / 2.0), y - (scale.Height / 2.0));
                if ((dx * dx) + (dy * dy) > _reach * _reach && nodes.Count > 2)
                {
                    return nodes;
                }

                // The step's middle direction keeps the walk accurate to second order.
                var (midSin, midCos) = PortableMath.SinCos(Wave.Sum(wander, s + (h / 2)));
                x += h * ((direction.Cos * midCos) - (direction.Sin * midSin));
                y += h * ((direction.Sin * midCos) + (direction.Cos * midSin));
                s += h;
                if (Math.Abs(s) > 4 * _reach)
                {
                    return nodes;
                }
            }
        }
    }

    /// <summary>Lays fibres beside a leader: touching it over a stretch, drawing away from it beyond.</summary>
    private void Alongside(FibreCurve leader, int count, int rope)
    {
        var isRope = rope >= 0;
        var nodes = leader.Nodes;
        var middle = (nodes.Length / 2) + (int)(nodes.Length * random.Between(-0.1, 0.1));
        var step = Math.Max(0.1, Distance(nodes[0], nodes[1]));
        var half = scale.Width * (isRope ? random.Between(0.15, 0.5) : random.Between(0.1, 0.35)) / step;
        Span<double> sides = [leader.Diameter / 2, leader.Diameter / 2];
        for (var i = 0; i < count; i++)
        {
            var diameter = scale.Diameters.Draw(random);
            var side = isRope ? i % 2 : random.Below(2);
            var offset = (sides[side] + (diameter / 2)) * random.Between(0.93, 1.02);
            sides[side] = offset + (diameter / 2);
            var lift = random.Between(-0.4, 0.4) * (leader.Diameter + diameter) / 2;
            var away = random.Between(0.02, 0.2) * (isRope ? 0.4 : 1);
            _fibres.Add(Fibre(Shifted(nodes, middle, half, side == 0 ? offset : -offset, lift, diameter / 2, away), diameter, leader.Rope));
        }

        if (isRope)
        {
            var (from, to) = ((int)Math.Max(0, middle - half), (int)Math.Min(nodes.Length - 1, middle + half));
            _ropes.Add(new RopeStretch(rope, nodes[from..(to + 1)], sides[0], sides[1]));
        }
    }

    private static FibreNode[] Shifted(FibreNode[] leader, int middle, double half, double offset, double lift, double radius, double away)
    {
        var places = new (double X, double Y)[leader.Length];
        for (var i = 0; i < leader.Length; i++)
        {
            var beyond = Math.Max(0, Math.Abs(i - middle) - half);
            var lateral = offset + (Math.Sign(offset) * away * beyond * beyond / (beyond + 60));
            places[i] = (leader[i].X - (lateral * leader[i].TangentY), leader[i].Y + (lateral * leader[i].TangentX));
        }

        var nodes = new FibreNode[leader.Length];
        for (var i = 0; i < leader.Length; i++)
        {
            var (before, after) = (places[Math.Max(0, i - 1)], places[Math.Min(leader.Length - 1, i + 1)]);
            var (dx, dy) = (after.X - before.X, after.Y - before.Y);
            var length = Math.Max(1e-9, Math.Sqrt((dx * dx) + (dy * dy)));
            var unevenness = leader[i].Radius / leader[leader.Length / 2].Radius;
            nodes[i] = new((float)places[i].X, (float)places[i].Y, (float)(leader[i].Z + lift), (float)(radius * unevenness), (float)(dx / length), (float)(dy / length));
        }

        return nodes;
    }

    private static double Distance(FibreNode a, FibreNode b) => Math.Sqrt(((a.X - b.X) * (a.X - b.X)) + ((a.Y - b.Y) * (a.Y - b.Y)));
}
