namespace Auditor.Yaml;

/// <summary>The name someone most likely meant.</summary>
internal static class NearestName
{
    /// <summary>A sentence part naming the nearest of the known names, or all of them when none is near and they are few.</summary>
    public static string Hint(string name, IReadOnlyCollection<string> known)
    {
        if (Of(name, known) is { } near)
        {
            return $"; did you mean '{near}'?";
        }

        return known.Count is > 0 and <= 12 ? "; known: " + string.Join(", ", known) : "";
    }

    /// <summary>
    /// The known name with the fewest edits (a swap of neighbours is one), when they are at most a third of the name, two for a name
    /// of five or six letters, one for a shorter one; the first on a tie.
    /// </summary>
    public static string? Of(string name, IEnumerable<string> known)
    {
        var best = known.Select(candidate => (candidate, edits: Edits(name, candidate))).MinBy(pair => pair.edits);
        return best.candidate is not null && best.edits <= (name.Length < 5 ? Math.Min(1, name.Length) : Math.Max(2, name.Length / 3)) ? best.candidate : null;
    }

    /// <summary>Optimal string alignment distance, case ignored.</summary>
    private static int Edits(string a, string b)
    {
        a = a.ToUpperInvariant();
        b = b.ToUpperInvariant();
        var cost = new int[a.Length + 1, b.Length + 1];
        for (var i = 0; i <= a.Length; i++)
        {
            for (var j = 0; j <= b.Length; j++)
            {
                cost[i, j] = i == 0 || j == 0 ? i + j : Cheapest(a, b, cost, i, j);
            }
        }

        return cost[a.Length, b.Length];
    }

    private static int Cheapest(string a, string b, int[,] cost, int i, int j)
    {
        var change = a[i - 1] == b[j - 1] ? 0 : 1;
        var least = Math.Min(cost[i - 1, j - 1] + change, Math.Min(cost[i - 1, j], cost[i, j - 1]) + 1);
        var swapped = i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1];
        return swapped ? Math.Min(least, cost[i - 2, j - 2] + 1) : least;
    }
}
