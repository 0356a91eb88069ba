namespace Auditor.Yaml;

/// <summary>The name someone most likely meant; upper and lower case count as the same.</summary>
public static class NearestName
{
    private const int LettersForEachSlip = 3;

    private const int MostNamesListed = 12;

    private const int FewestLettersOfABeginning = 3;

    private static readonly char[] _betweenWords = ['-', '_', ' '];

    /// <summary>A sentence part naming the nearest of the known names, or all of them when none is near and they are few.</summary>
    public static string Hint(string name, IReadOnlyCollection<string> known)
    {
        if (DidYouMean(name, known) is { Length: > 0 } meant)
        {
            return meant;
        }

        return known.Count is > 0 and <= MostNamesListed ? "; known: " + string.Join(", ", known) : "";
    }

    /// <summary>A sentence part naming the nearest of the known names, empty when none is near.</summary>
    public static string DidYouMean(string name, IReadOnlyCollection<string> known) =>
        (Of(name, known) ?? Begun(name, known) ?? LikeWords(name, known)) is { } near ? $"; did you mean '{near}'?" : "";

    /// <summary>
    /// The known name with the fewest slips, the first on a tie; null when none is near enough to be meant: one slip is, two when the shorter
    /// name has six letters, three from nine and so on, but never so many that no letter is right.
    /// </summary>
    public static string? Of(string name, IEnumerable<string> known)
    {
        string? nearest = null;
        var least = int.MaxValue;
        foreach (var candidate in known)
        {
            if (Slips(name, candidate) is int slips && slips < least)
            {
                (nearest, least) = (candidate, slips);
            }
        }

        return nearest;
    }

    /// <summary>
    /// Optimal string alignment distance: insertions, deletions, substitutions and swaps of neighbours, none edited twice
    /// (the restricted Damerau–Levenshtein distance). Three rows of the table are enough.
    /// </summary>
    public static int Distance(string a, string b)
    {
        var beforeLast = new int[b.Length + 1];
        var last = Enumerable.Range(0, b.Length + 1).ToArray();
        var row = new int[b.Length + 1];
        for (var i = 1; i <= a.Length; i++)
        {
            row[0] = i;
            for (var j = 1; j <= b.Length; j++)
            {
                var substituted = last[j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
                row[j] = Math.Min(substituted, 1 + Math.Min(last[j], row[j - 1]));
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                {
                    row[j] = Math.Min(row[j], beforeLast[j - 2] + 1);
                }
            }

            (beforeLast, last, row) = (last, row, beforeLast);
        }

        return last[b.Length];
    }

    /// <summary>The shortest known name that begins so, as precision does for prec.</summary>
    private static string? Begun(string name, IReadOnlyCollection<string> known) => name.Length < FewestLettersOfABeginning
        ? null
        : known.Where(candidate => candidate.StartsWith(name, StringComparison.OrdinalIgnoreCase)).MinBy(candidate => candidate.Length);

    /// <summary>The known name that shares the most first words, each with its slips: two at least, and more than half of the name's.</summary>
    private static string? LikeWords(string name, IReadOnlyCollection<string> known)
    {
        var words = name.Split(_betweenWords);
        return known.Select(candidate => (Name: candidate, Shared: SharedWords(words, candidate.Split(_betweenWords))))
            .Where(candidate => candidate.Shared > 1 && 2 * candidate.Shared > words.Length)
            .OrderByDescending(candidate => candidate.Shared)
            .ThenBy(candidate => candidate.Name.Length)
            .FirstOrDefault().Name;
    }

    private static int SharedWords(string[] words, string[] others) =>
        words.Zip(others).TakeWhile(pair => Slips(pair.First, pair.Second) is not null).Count();

    /// <summary>Null when there are too many for a misspelling. Names of very different length are never compared letter by letter.</summary>
    private static int? Slips(string name, string candidate)
    {
        var shorter = Math.Min(name.Length, candidate.Length);
        var longer = Math.Max(name.Length, candidate.Length);
        var allowed = Math.Min(longer - 1, Math.Max(1, shorter / LettersForEachSlip));
        if (longer - shorter > allowed)
        {
            return null;
        }

        var slips = Distance(name.ToUpperInvariant(), candidate.ToUpperInvariant());
        return slips <= allowed ? slips : null;
    }
}
