using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens.Mats;

/// <summary>Strews droplets, beads, film and dust into a mat.</summary>
internal sealed class DefectLayer(MatScale scale, FibreCurve[] fibres, SeededRandom random)
{
    private readonly DefectRecipe _defects = scale.Recipe.Defects;
    private readonly List<SolidBody> _bodies = [];
    private int _group = 1000;

    public (SolidBody[] Bodies, FilmPatch[] Films) Lay()
    {
        for (var i = 0; i < _defects.Shot; i++)
        {
            var half = Size(_defects.ShotSize, 0.5) / 2;
            var (sin, cos) = PortableMath.SinCos(Math.PI * random.Next());
            var (x, y) = Place();
            _bodies.Add(new(DefectForm.Shot, _group++, x, y, Height(1), (float)(half * random.Between(1, 1.25)), (float)half, (float)cos, (float)sin, Shine()));
        }

        Beads();
        for (var i = 0; i < _defects.Debris; i++)
        {
            Clump();
        }

        var films = new FilmPatch[_defects.Films];
        for (var i = 0; i < films.Length; i++)
        {
            var (x, y) = Place();
            films[i] = new FilmPatch(_group++, x, y, Height(0.9), Size(_defects.FilmSize, 0.35) / 2, random);
        }

        return ([.. _bodies], films);
    }

    private void Beads()
    {
        var upper = fibres.Take(Math.Max(1, fibres.Length / 5)).ToArray();
        for (var i = 0; i < _defects.Beads && upper.Length > 0; i++)
        {
            var fibre = upper[random.Below(upper.Length)];
            var node = fibre.Nodes[random.Below(fibre.Nodes.Length)];
            var across = node.Radius * random.Between(1.8, 4);
            _bodies.Add(new(DefectForm.Shot, _group++, node.X, node.Y, node.Z, (float)(across * random.Between(1.6, 3.2)), (float)across, node.TangentX, node.TangentY, Shine()));
        }
    }

    private void Clump()
    {
        var (x, y) = Place();
        var z = Height(0.7);
        var size = Size(_defects.DebrisSize, 0.45);
        var grains = 6 + random.Below(25);
        for (var g = 0; g < grains; g++)
        {
            var half = size * random.Between(0.1, 0.28);
            var (sin, cos) = PortableMath.SinCos(Math.PI * random.Next());
            var (dx, dy) = (0.24 * size * random.Normal(), 0.24 * size * random.Normal());
            _bodies.Add(new(
                DefectForm.Debris, _group, (float)(x + dx), (float)(y + dy), (float)(z + (0.3 * half * random.Normal())),
                (float)(half * random.Between(1, 1.7)), (float)half, (float)cos, (float)sin, (float)(Shine() * random.Between(0.7, 1.35))));
        }

        _group++;
    }

    private double Size(double meanDiameters, double sigma) => scale.MeanDiameter * meanDiameters * PortableMath.Exp(sigma * Math.Clamp(random.Normal(), -2, 2));

    // Down to so many mean depths below the top: deeper ones would hardly be seen.
    private float Height(double depths) => (float)Math.Max(0, scale.LaidDepth - (scale.MeanDepth * depths * random.Between(-0.1, 1)));

    private float Shine() => (float)random.Between(0.75, 1.3);

    private (float X, float Y) Place() => ((float)(scale.Width * random.Next()), (float)(scale.Height * random.Next()));
}
