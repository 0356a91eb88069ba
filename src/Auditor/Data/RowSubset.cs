namespace Auditor.Data;

/// <summary>Some rows of the table, ascending, 0-based. Two subsets are equal when they hold the same rows: groups with one missing pattern share a factor.</summary>
public sealed class RowSubset(int[] rows) : IEquatable<RowSubset>
{
    private readonly int _hash = Hash(rows);

    public int[] Rows { get; } = rows;

    public int Count => Rows.Length;

    public bool Equals(RowSubset? other) =>
        other is not null && _hash == other._hash && Rows.AsSpan().SequenceEqual(other.Rows);

    public override bool Equals(object? obj) => Equals(obj as RowSubset);

    public override int GetHashCode() => _hash;

    /// <summary>The rows of this subset that are not among the given ones (ascending).</summary>
    public RowSubset Without(IReadOnlyCollection<int> excluded)
    {
        if (excluded.Count == 0)
        {
            return this;
        }

        var set = excluded.ToHashSet();
        return new RowSubset([.. Rows.Where(row => !set.Contains(row))]);
    }

    private static int Hash(int[] rows)
    {
        var hash = default(HashCode);
        foreach (var row in rows)
        {
            hash.Add(row);
        }

        return hash.ToHashCode();
    }
}
