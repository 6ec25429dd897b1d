using FiberScope.Imaging;
using FiberScope.Specimens;

namespace FiberScope.Validation.Imaging;

/// <summary>Finds the true fibre that a reading lies on.</summary>
internal sealed class TruthIndex
{
    private const int Cell = 16;
    private readonly SpecimenTruth _truth;
    private readonly Dictionary<(int, int), List<int>> _cells = [];

    public TruthIndex(SpecimenTruth truth)
    {
        _truth = truth;
        for (var i = 0; i < truth.Stations.Length; i++)
        {
            Add(truth.Stations[i].X, truth.Stations[i].Y, i);
        }

        for (var i = 0; i < truth.Sections.Length; i++)
        {
            Add(truth.Sections[i].X, truth.Sections[i].Y, i);
        }
    }

    /// <summary>The station of the fibre under a reading: along its direction (within 25°) and the closest to the middle of its fibre; −1 for none.</summary>
    /// <param name="reading">The reading.</param>
    /// <param name="anyDirection">Whether the reading knows no direction.</param>
    public int Match(PixelReading reading, bool anyDirection = false)
    {
        var (best, closest) = (-1, 1.3);
        foreach (var i in Near(reading.X, reading.Y, Math.Max(24, reading.Diameter)))
        {
            var s = _truth.Stations[i];
            var (dx, dy) = (reading.X - s.X, reading.Y - s.Y);
            var (sin, cos) = Math.SinCos(s.Direction);
            var (along, across) = ((dx * cos) + (dy * sin), (dy * cos) - (dx * sin));
            var turn = Math.Abs(Math.IEEERemainder(reading.Direction - s.Direction, Math.PI));
            var away = Math.Abs(across) / (s.Diameter / 2);
            if (away < closest && Math.Abs(along) <= Math.Max(3, s.Length + 1) && (anyDirection || turn < 25 * Math.PI / 180))
            {
                (best, closest) = (i, away);
            }
        }

        return best;
    }

    /// <summary>The cut fibre of a section whose ellipse a reading's centre lies in; −1 for none.</summary>
    public int MatchSection(PixelReading reading)
    {
        var (best, closest) = (-1, 1.0);
        foreach (var i in Near(reading.X, reading.Y, Math.Max(80, 2 * reading.Diameter)))
        {
            var s = _truth.Sections[i];
            var (dx, dy) = (reading.X - s.X, reading.Y - s.Y);
            var (sin, cos) = Math.SinCos(s.Direction);
            var (p, q) = (((dx * cos) + (dy * sin)) / s.Major * 2, ((dy * cos) - (dx * sin)) / s.Minor * 2);
            if ((p * p) + (q * q) < closest)
            {
                (best, closest) = (i, (p * p) + (q * q));
            }
        }

        return best;
    }

    private void Add(float x, float y, int index)
    {
        var key = ((int)x / Cell, (int)y / Cell);
        (_cells.TryGetValue(key, out var list) ? list : _cells[key] = []).Add(index);
    }

    private IEnumerable<int> Near(double x, double y, double reach)
    {
        for (var row = (int)((y - reach) / Cell); row <= (int)((y + reach) / Cell); row++)
        {
            for (var column = (int)((x - reach) / Cell); column <= (int)((x + reach) / Cell); column++)
            {
                if (_cells.TryGetValue((column, row), out var list))
                {
                    foreach (var i in list)
                    {
                        yield return i;
                    }
                }
            }
        }
    }
}
