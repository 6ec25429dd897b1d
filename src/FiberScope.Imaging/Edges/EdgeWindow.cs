namespace FiberScope.Imaging.Edges;

/// <summary>How much of a profile belongs to the fibre and its nearest ground.</summary>
internal static class EdgeWindow
{
    /// <summary>First sample, and the one after the last.</summary>
    /// <remarks>
    /// The ground counts up to where the blurred edge has faded. Where a neighbour begins earlier, seen by the grey rising again from its
    /// lowest by a tenth of the contrast, it ends at the lowest.
    /// </remarks>
    public static (int From, int To) Of(in EdgeProfile profile, double blur)
    {
        var reach = (2.8 * blur) + 0.7;
        var least = 1.1 * blur;
        var to = Outwards(profile, 1, profile.Right, reach, least);
        var from = Outwards(profile, -1, profile.Left, reach, least);
        return (from, to + 1);
    }

    /// <summary>Where the search for the blur begins: the usual one, unless a wide fibre is plainly out of focus.</summary>
    /// <remarks>An edge of height c blurred by σ has slope c / (σ √(2π)); a rim makes c look larger, hence the share.</remarks>
    public static double StartingBlur(in EdgeProfile profile, double usual)
    {
        const double RimShare = 0.85, PlainlyMore = 1.4, WideEnough = 4;
        double top = 0, bottom = double.PositiveInfinity, climb = 1e-9, fall = 1e-9;
        for (var i = 2; i < profile.Offsets.Length - 2; i++)
        {
            if (profile.Offsets[i] < profile.Left - (3 * usual) || profile.Offsets[i] > profile.Right + (3 * usual))
            {
                continue;
            }

            (top, bottom) = (Math.Max(top, profile.Grey[i]), Math.Min(bottom, profile.Grey[i]));
            var slope = (profile.Grey[i + 2] - profile.Grey[i - 2]) / (profile.Offsets[i + 2] - profile.Offsets[i - 2]);
            (climb, fall) = (Math.Max(climb, slope), Math.Max(fall, -slope));
        }

        var own = RimShare * (top - bottom) / (0.5 * (climb + fall) * Math.Sqrt(2 * Math.PI));
        return own > PlainlyMore * usual && profile.Width > WideEnough * own ? own : usual;
    }

    private static int Outwards(in EdgeProfile profile, int side, double edge, double reach, double least)
    {
        var i = side > 0 ? 0 : profile.Offsets.Length - 1;
        while (i + side >= 0 && i + side < profile.Offsets.Length && side * (profile.Offsets[i] - edge) < least)
        {
            i += side;
        }

        var top = 0.0;
        for (var j = 0; j < profile.Grey.Length; j++)
        {
            top = Math.Max(top, profile.Offsets[j] >= profile.Left && profile.Offsets[j] <= profile.Right ? profile.Grey[j] : 0);
        }

        var lowest = i;
        while (i + side >= 0 && i + side < profile.Offsets.Length && side * (profile.Offsets[i + side] - edge) <= reach)
        {
            i += side;
            if (profile.Grey[i] < profile.Grey[lowest])
            {
                lowest = i;
            }
            else if (profile.Grey[i] - profile.Grey[lowest] > 0.1 * (top - profile.Grey[lowest]))
            {
                return lowest;
            }
        }

        return i;
    }
}
