using System;
using System.Collections.Generic;

namespace ProbeCal.Station.Entry;

/// <summary>Finds the known name that a mistyped one most likely meant.</summary>
public static class NearestName
{
    /// <summary>Longest name that is compared; nobody mistypes more.</summary>
    private const int LongestName = 64;

    /// <summary>Letters of a beginning that is taken for the name.</summary>
    private const int LeastBeginning = 4;

    /// <summary>
    /// The nearest of <paramref name="known"/>: the same but for case, or else the first that begins so, or else the one that takes the fewest single
    /// changes (a letter more, less, other, or two swapped), at most one in three letters. Null when none is near.
    /// </summary>
    public static string? Find(string given, IEnumerable<string> known)
    {
        string? nearest = null;
        int fewest = int.MaxValue;
        foreach (string name in known)
        {
            if (string.Equals(name, given, StringComparison.OrdinalIgnoreCase))
            {
                return name;
            }

            int changes = given.Length <= LongestName && name.Length <= LongestName ? Changes(given, name) : int.MaxValue;
            if (changes < fewest)
            {
                fewest = changes;
                nearest = name;
            }
        }

        // Whoever leaves out the end means the first that begins so: an equation without its year, an amount without "per litre".
        if (LeastBeginning <= given.Length && First(given, known) is string begun)
        {
            return begun;
        }

        int allowed = nearest is null ? 0 : Math.Max(1, Math.Min(given.Length, nearest.Length) / 3);
        return fewest <= allowed && fewest < given.Length ? nearest : null;
    }

    private static string? First(string beginning, IEnumerable<string> known)
    {
        foreach (string name in known)
        {
            if (name.StartsWith(beginning, StringComparison.OrdinalIgnoreCase))
            {
                return name;
            }
        }

        return null;
    }

    /// <summary><c> (did you mean mmHg?)</c> with its leading blank, or nothing when no name is near.</summary>
    public static string DidYouMean(string given, IEnumerable<string> known)
    {
        return Find(given, known) is string name ? " (did you mean " + name + "?)" : "";
    }

    /// <summary>Number of single changes between two names, case ignored (optimal string alignment distance).</summary>
    private static int Changes(string a, string b)
    {
        int[,] least = new int[a.Length + 1, b.Length + 1];
        for (int i = 0; i <= a.Length; i++)
        {
            least[i, 0] = i;
        }

        for (int j = 0; j <= b.Length; j++)
        {
            least[0, j] = j;
        }

        for (int i = 1; i <= a.Length; i++)
        {
            for (int j = 1; j <= b.Length; j++)
            {
                int other = Same(a[i - 1], b[j - 1]) ? 0 : 1;
                int best = Math.Min(Math.Min(least[i - 1, j], least[i, j - 1]) + 1, least[i - 1, j - 1] + other);
                bool swapped = 1 < i && 1 < j && Same(a[i - 1], b[j - 2]) && Same(a[i - 2], b[j - 1]);
                least[i, j] = swapped ? Math.Min(best, least[i - 2, j - 2] + 1) : best;
            }
        }

        return least[a.Length, b.Length];
    }

    private static bool Same(char x, char y)
    {
        return char.ToLowerInvariant(x) == char.ToLowerInvariant(y);
    }
}
