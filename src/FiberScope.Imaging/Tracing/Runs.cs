namespace FiberScope.Imaging.Tracing;

/// <summary>Runs of accepted rows.</summary>
internal static class Runs
{
    /// <summary>Drops runs with fewer accepted rows than <paramref name="least"/>; gaps up to <paramref name="gap"/> rows do not break a run.</summary>
    public static void Keep(bool[] accepted, int gap, double least)
    {
        var start = 0;
        while (start < accepted.Length)
        {
            if (!accepted[start])
            {
                start++;
                continue;
            }

            var (end, count, holes) = (start, 0, 0);
            for (var r = start; r < accepted.Length && holes <= gap; r++)
            {
                holes = accepted[r] ? 0 : holes + 1;
                count += accepted[r] ? 1 : 0;
                end = accepted[r] ? r : end;
            }

            if (count < least)
            {
                Array.Fill(accepted, false, start, end - start + 1);
            }

            start = end + 1;
        }
    }

    /// <summary>Takes rows off both ends of every run, where what lies beside it was smoothed in; at least three stay.</summary>
    public static void Trim(bool[] accepted, int rows)
    {
        var start = 0;
        while (start < accepted.Length)
        {
            var end = start;
            while (end < accepted.Length && accepted[end])
            {
                end++;
            }

            var off = Math.Min(rows, (end - start - 3) / 2);
            if (off > 0)
            {
                Array.Fill(accepted, false, start, off);
                Array.Fill(accepted, false, end - off, off);
            }

            start = end + 1;
        }
    }

    /// <summary>The running median over accepted rows; the value itself where a row is not accepted.</summary>
    public static double[] Median(double[] values, bool[] accepted, double window)
    {
        var places = Enumerable.Range(0, values.Length).Where(r => accepted[r]).ToArray();
        var reach = Math.Max(1, (int)(window / 2));
        var result = (double[])values.Clone();
        for (var i = 0; i < places.Length; i++)
        {
            var (from, to) = (Math.Max(0, i - reach), Math.Min(places.Length - 1, i + reach));
            result[places[i]] = Series.Median([.. places[from..(to + 1)].Select(r => values[r])]);
        }

        return result;
    }
}
