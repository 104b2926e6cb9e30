namespace Swarm.Engine.Models.Names;

/// <summary>Finds the known name that a misspelt one was meant to be.</summary>
internal static class NearestName
{
    // Beyond these a comparison costs more than its hint is worth.
    private const int MaxLength = ModelBounds.NameLength;
    private const int MaxCandidates = 2_000;

    /// <summary>The nearest known name, or null if none is near: a third of its characters may differ.</summary>
    public static string? Of(string name, IEnumerable<string> known)
    {
        if (name.Length > MaxLength)
        {
            return null;
        }

        string? nearest = null;
        int best = Math.Max(1, name.Length / 3) + 1;
        foreach (string candidate in known.Where(k => Math.Abs(k.Length - name.Length) < best && k.Length <= MaxLength).Take(MaxCandidates))
        {
            int distance = Distance(name, candidate, best);
            if (distance < best)
            {
                best = distance;
                nearest = candidate;
            }
        }

        return nearest;
    }

    /// <summary>
    /// Insertions, deletions, replacements and swaps of neighbours that turn one into the other (Damerau 1964, Levenshtein 1966;
    /// case counts nothing), or <paramref name="limit"/> if it takes that many or more.
    /// </summary>
    private static int Distance(string a, string b, int limit)
    {
        int[] beforeLast = new int[b.Length + 1];
        int[] last = [.. Enumerable.Range(0, b.Length + 1)];
        int[] row = new int[b.Length + 1];
        for (int i = 1; i <= a.Length; i++)
        {
            row[0] = i;
            for (int j = 1; j <= b.Length; j++)
            {
                int cost = Same(a[i - 1], b[j - 1]) ? 0 : 1;
                row[j] = Math.Min(Math.Min(row[j - 1], last[j]) + 1, last[j - 1] + cost);
                bool isSwap = i > 1 && j > 1 && Same(a[i - 1], b[j - 2]) && Same(a[i - 2], b[j - 1]);
                row[j] = isSwap ? Math.Min(row[j], beforeLast[j - 2] + 1) : row[j];
            }

            if (row.Min() >= limit)
            {
                return limit;
            }

            (beforeLast, last, row) = (last, row, beforeLast);
        }

        return last[b.Length];
    }

    private static bool Same(char a, char b) => char.ToLowerInvariant(a) == char.ToLowerInvariant(b);
}
