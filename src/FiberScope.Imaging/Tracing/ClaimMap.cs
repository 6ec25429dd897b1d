namespace FiberScope.Imaging.Tracing;

/// <summary>Which directions of fibre already have which ground; crossing fibres both keep theirs.</summary>
internal sealed class ClaimMap(int width, int height)
{
    private const int Slots = 4;
    private const int Turns = 60;

    private readonly byte[] _claims = new byte[width * height * Slots];

    /// <summary>Whether ground is taken in a direction within a tolerance; radians.</summary>
    public bool Holds(double x, double y, double normal, double tolerance)
    {
        var (i, j) = ((int)Math.Round(x), (int)Math.Round(y));
        if (i < 0 || j < 0 || i >= width || j >= height)
        {
            return false;
        }

        var wanted = Turn(normal);
        foreach (var claim in _claims.AsSpan(((j * width) + i) * Slots, Slots))
        {
            if (claim == 0)
            {
                return false;
            }

            var off = Math.Abs(claim - 1 - wanted);
            if (Math.Min(off, Turns - off) * Math.PI / Turns < tolerance)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>Takes the ground from −half to half across at a place, and a little along.</summary>
    public void Take(double x, double y, double normal, double half, double along)
    {
        var (sin, cos) = Math.SinCos(normal);
        var (across, forth) = ((int)Math.Ceiling(half / 0.7), Math.Max(1, (int)Math.Ceiling(along / 0.7)));
        var turn = (byte)(Turn(normal) + 1);
        for (var a = -across; a <= across; a++)
        {
            var offset = a * half / Math.Max(1, across);
            for (var b = 0; b < forth; b++)
            {
                Put((int)Math.Round(x + (offset * cos) - (b * 0.7 * sin)), (int)Math.Round(y + (offset * sin) + (b * 0.7 * cos)), turn);
            }
        }
    }

    private static int Turn(double normal)
    {
        var share = normal / Math.PI;
        return (int)Math.Round((share - Math.Floor(share)) * Turns) % Turns;
    }

    private void Put(int i, int j, byte turn)
    {
        if (i < 0 || j < 0 || i >= width || j >= height)
        {
            return;
        }

        foreach (ref var claim in _claims.AsSpan(((j * width) + i) * Slots, Slots))
        {
            if (claim == 0)
            {
                claim = turn;
                return;
            }

            var off = Math.Abs(claim - turn);
            if (Math.Min(off, Turns - off) <= 2)
            {
                return;
            }
        }
    }
}
