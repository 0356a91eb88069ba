using Auditor.Data;

namespace Auditor.Design;

/// <summary>
/// Order by Unicode code point, the same on every machine and in every culture. (Ordinal comparison is by 16-bit unit and would put
/// characters beyond U+FFFF before U+E000.)
/// </summary>
internal sealed class CodePointOrder : IComparer<string>
{
    public static readonly CodePointOrder Instance = new();

    public int Compare(string? x, string? y)
    {
        using var left = (x ?? string.Empty).EnumerateRunes().GetEnumerator();
        using var right = (y ?? string.Empty).EnumerateRunes().GetEnumerator();
        while (true)
        {
            var (more, other) = (left.MoveNext(), right.MoveNext());
            if (!more || !other)
            {
                return more.CompareTo(other);
            }

            if (left.Current != right.Current)
            {
                return left.Current.CompareTo(right.Current);
            }
        }
    }

    /// <summary>Texts by value when all are numbers (equal values by code point), else by code point.</summary>
    public static IEnumerable<string> Sort(IReadOnlyList<string> texts)
    {
        var numbers = texts.Select(text => CellText.TryNumber(text, out var value) ? value : double.NaN).ToList();
        return numbers.Any(double.IsNaN)
            ? texts.Order(Instance)
            : texts.Zip(numbers).OrderBy(pair => pair.Second).ThenBy(pair => pair.First, Instance).Select(pair => pair.First);
    }
}
