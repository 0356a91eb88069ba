using System.Collections;
using System.Numerics;

namespace Auditor.Data;

/// <summary>
/// Some rows of a table, 0-based, in rising order: one bit for each row of the table, whatever their number. Two subsets are equal when they hold the same
/// rows: groups with one missing pattern share a factor.
/// </summary>
public sealed class RowSubset : IEquatable<RowSubset>, IReadOnlyList<int>
{
    /// <summary>Words whose rows are counted together.</summary>
    private const int RunWords = 64;

    private readonly ulong[] _words;
    private readonly int[] _before;
    private readonly int _hash;

    /// <param name="rows">Rising, of a table that ends with the last of them.</param>
    public RowSubset(IReadOnlyCollection<int> rows)
        : this(BitsOf(rows))
    {
    }

    internal RowSubset(RowBits bits)
    {
        Bits = bits;
        _words = bits.Words;
        _before = new int[((_words.Length + RunWords - 1) / RunWords) + 1];
        var hash = default(HashCode);
        for (var w = 0; w < _words.Length; w++)
        {
            _before[(w / RunWords) + 1] += BitOperations.PopCount(_words[w]);
            hash.Add(_words[w]);
        }

        for (var run = 1; run < _before.Length; run++)
        {
            _before[run] += _before[run - 1];
        }

        (Count, _hash) = (_before[^1], hash.ToHashCode());
    }

    public int Count { get; }

    /// <summary>The same rows as bits.</summary>
    internal RowBits Bits { get; }

    /// <summary>The row at a position, 0 to Count - 1.</summary>
    public int this[int position]
    {
        get
        {
            Span<int> row = stackalloc int[1];
            CopyTo(position, row);
            return row[0];
        }
    }

    /// <summary>Every row of a table.</summary>
    public static RowSubset All(int rows) => new(RowBits.All(rows));

    /// <summary>The rows at consecutive positions.</summary>
    public void CopyTo(int position, Span<int> into)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(position);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(position + into.Length, Count, nameof(position));
        var (word, skip) = Find(position);
        for (var done = 0; done < into.Length; word++)
        {
            done += CopyWord(word, skip, into[done..]);
            skip = 0;
        }
    }

    public bool Equals(RowSubset? other) =>
        other is not null && (ReferenceEquals(this, other) || (_hash == other._hash && Count == other.Count && _words.AsSpan().SequenceEqual(other._words)));

    public override bool Equals(object? obj) => Equals(obj as RowSubset);

    public override int GetHashCode() => _hash;

    public IEnumerator<int> GetEnumerator()
    {
        for (var w = 0; w < _words.Length; w++)
        {
            for (var word = _words[w]; word != 0; word &= word - 1)
            {
                yield return (w * RowBits.WordRows) + BitOperations.TrailingZeroCount(word);
            }
        }
    }

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();

    /// <summary>The rows of this subset that pass a test.</summary>
    public RowSubset Where(Func<int, bool> test)
    {
        var passed = new RowBits(Bits.Rows);
        foreach (var row in this)
        {
            if (test(row))
            {
                passed.Set(row);
            }
        }

        return new RowSubset(passed);
    }

    /// <summary>The rows of this subset without the given ones.</summary>
    internal RowSubset Without(RowBits excluded)
    {
        var rest = Bits.Without(excluded);
        return rest.Words.AsSpan().SequenceEqual(_words) ? this : new RowSubset(rest);
    }

    private static RowBits BitsOf(IReadOnlyCollection<int> rows)
    {
        var bits = new RowBits(rows.Count == 0 ? 0 : rows.Max() + 1);
        foreach (var row in rows)
        {
            bits.Set(row);
        }

        return bits;
    }

    /// <summary>The word that holds a position's row, and how many of its rows come before it.</summary>
    private (int Word, int Skip) Find(int position)
    {
        var run = Array.BinarySearch(_before, position);
        run = run >= 0 ? run : ~run - 1;
        while (run + 1 < _before.Length && _before[run + 1] <= position)
        {
            run++;
        }

        var (word, left) = (run * RunWords, position - _before[run]);
        while (word < _words.Length && BitOperations.PopCount(_words[word]) is var rows && left >= rows)
        {
            left -= rows;
            word++;
        }

        return (word, left);
    }

    /// <summary>Copies the rows of one word but the first few; returns how many.</summary>
    private int CopyWord(int at, int skip, Span<int> into)
    {
        var (word, first, done) = (_words[at], at * RowBits.WordRows, 0);
        if (word == ulong.MaxValue)
        {
            var count = Math.Min(RowBits.WordRows - skip, into.Length);
            for (var i = 0; i < count; i++)
            {
                into[i] = first + skip + i;
            }

            return count;
        }

        for (; skip > 0; skip--)
        {
            word &= word - 1;
        }

        for (; word != 0 && done < into.Length; word &= word - 1)
        {
            into[done++] = first + BitOperations.TrailingZeroCount(word);
        }

        return done;
    }
}
