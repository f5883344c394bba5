namespace RuleAndCompass.Language.Diagnostics;

/// <summary>Finds the word someone probably meant.</summary>
public static class NearName
{
    private const int LongestWord = 64;

    /// <summary>Finds the known word nearest to a mistyped one.</summary>
    /// <returns>
    /// The one that differs by case alone, or else by the fewest letters put in, left out, changed or swapped with a neighbour: one for a word of up to
    /// four letters, two up to eight, three above. Of several, the one that begins alike, then the first; null when none is near.
    /// </returns>
    public static string? Find(string word, IEnumerable<string> known)
    {
        if (word.Length is 0 or > LongestWord)
            return null;
        int allowed = word.Length <= 4 ? 1 : word.Length <= 8 ? 2 : 3;
        string? nearest = null;
        int least = int.MaxValue;
        foreach (string candidate in known)
        {
            if (candidate == word || Math.Abs(candidate.Length - word.Length) > allowed || candidate.Length > LongestWord)
                continue;
            if (string.Equals(candidate, word, StringComparison.OrdinalIgnoreCase))
                return candidate;
            int distance = Distance(word, candidate);
            // a word of which nothing is left is not near
            if (distance > allowed || distance >= Math.Max(word.Length, candidate.Length))
                continue;
            int rank = (2 * distance) + (candidate[0] == word[0] ? 0 : 1);
            if (rank < least)
                (nearest, least) = (candidate, rank);
        }

        return nearest;
    }

    /// <summary>How many letters must be put in, left out, changed or swapped with a neighbour to make one word the other; each letter is touched once.</summary>
    /// <remarks>Optimal string alignment: the restricted form of Damerau's distance (Damerau, Communications of the ACM 7 (1964) 171–176).</remarks>
    internal static int Distance(string first, string second)
    {
        int[,] cost = new int[first.Length + 1, second.Length + 1];
        for (int i = 0; i <= first.Length; i++)
            cost[i, 0] = i;
        for (int j = 0; j <= second.Length; j++)
            cost[0, j] = j;
        for (int i = 1; i <= first.Length; i++)
        {
            for (int j = 1; j <= second.Length; j++)
            {
                int changed = cost[i - 1, j - 1] + (first[i - 1] == second[j - 1] ? 0 : 1);
                cost[i, j] = Math.Min(changed, Math.Min(cost[i - 1, j], cost[i, j - 1]) + 1);
                if (i > 1 && j > 1 && first[i - 1] == second[j - 2] && first[i - 2] == second[j - 1])
                    cost[i, j] = Math.Min(cost[i, j], cost[i - 2, j - 2] + 1);
            }
        }

        return cost[first.Length, second.Length];
    }
}
