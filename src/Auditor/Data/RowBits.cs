using System.Numerics;

namespace Auditor.Data;

/// <summary>One bit for each row of a table. Words may be written by several threads, each its own.</summary>
internal sealed class RowBits
{
    /// <summary>Rows of a word.</summary>
    public const int WordRows = 64;

    private readonly ulong[] _words;

    public RowBits(int rows) => (Rows, _words) = (rows, new ulong[(rows + WordRows - 1) / WordRows]);

    private RowBits(int rows, ulong[] words) => (Rows, _words) = (rows, words);

    /// <summary>Rows of the table.</summary>
    public int Rows { get; }

    /// <summary>Row 64 w + b is bit b of word w; no bit is set beyond the last row.</summary>
    public ulong[] Words => _words;

    public bool this[int row] => (_words[row / WordRows] >> (row % WordRows) & 1) != 0;

    public bool IsEmpty => !_words.AsSpan().ContainsAnyExcept(0UL);

    /// <summary>Rows whose bit is set.</summary>
    public int Count
    {
        get
        {
            var count = 0;
            foreach (var word in _words)
            {
                count += BitOperations.PopCount(word);
            }

            return count;
        }
    }

    public static RowBits All(int rows)
    {
        var bits = new RowBits(rows);
        bits._words.AsSpan().Fill(ulong.MaxValue);
        if (rows % WordRows is > 0 and var rest)
        {
            bits._words[^1] = (1UL << rest) - 1;
        }

        return bits;
    }

    public void Set(int row) => _words[row / WordRows] |= 1UL << (row % WordRows);

    public RowBits And(RowBits other) => Combine(other, (a, b) => a & b);

    public RowBits Or(RowBits other) => Combine(other, (a, b) => a | b);

    public RowBits Without(RowBits other) => Combine(other, (a, b) => a & ~b);

    private RowBits Combine(RowBits other, Func<ulong, ulong, ulong> of)
    {
        if (other.Rows != Rows)
        {
            throw new ArgumentException("rows of different tables have nothing in common", nameof(other));
        }

        var words = new ulong[_words.Length];
        for (var w = 0; w < words.Length; w++)
        {
            words[w] = of(_words[w], other._words[w]);
        }

        return new RowBits(Rows, words);
    }
}
