namespace FiberScope.Assessment.Input;

/// <summary>Finds the word that a mistyped one was meant to be.</summary>
internal static class Spelling
{
    /// <summary>The nearest of the known words, or null when none is near enough to be meant.</summary>
    public static string? Nearest(string word, IEnumerable<string> known)
    {
        var (distance, best) = known
            .Select(k => (Distance: Distance(word.ToLowerInvariant(), k.ToLowerInvariant()), Word: k))
            .OrderBy(c => c.Distance).ThenBy(c => c.Word, StringComparer.Ordinal)
            .FirstOrDefault((int.MaxValue, ""));
        return distance <= Math.Max(2, word.Length / 2) ? best : null;
    }

    /// <summary>
    /// The number of letters to insert, delete, replace or swap with a neighbour (optimal string alignment).
    /// Source: Damerau (1964), from memory.
    /// </summary>
    private static int Distance(string a, string b)
    {
        var table = new int[a.Length + 1, b.Length + 1];
        for (var i = 0; i <= a.Length; i++)
        {
            for (var j = 0; j <= b.Length; j++)
            {
                table[i, j] = i == 0 || j == 0 ? i + j : Step(table, a, b, i, j);
            }
        }

        return table[a.Length, b.Length];
    }

    private static int Step(int[,] table, string a, string b, int i, int j)
    {
        var replaced = table[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
        var best = Math.Min(replaced, 1 + Math.Min(table[i - 1, j], table[i, j - 1]));
        var swapped = i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1];
        return swapped ? Math.Min(best, table[i - 2, j - 2] + 1) : best;
    }
}
