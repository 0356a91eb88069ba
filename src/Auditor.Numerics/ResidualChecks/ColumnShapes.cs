using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>What the rows seen so far show of some columns: range, whether they hold only 0 and 1, which of those are 1 in the same row.</summary>
/// <param name="columns">Design columns.</param>
internal sealed class ColumnShapes(int[] columns)
{
    private readonly bool[] _isBinary = [.. columns.Select(_ => true)];
    private readonly bool[,] _meet = new bool[columns.Length, columns.Length];
    private readonly double[] _least = [.. columns.Select(_ => double.PositiveInfinity)];
    private readonly double[] _greatest = [.. columns.Select(_ => double.NegativeInfinity)];

    public int[] Columns => columns;

    public void Add(RowBlock block)
    {
        for (var k = 0; k < columns.Length; k++)
        {
            var values = block.Column(columns[k]);
            _isBinary[k] = _isBinary[k] && !values.ContainsAnyExcept(0, 1);
            (_least[k], _greatest[k]) = BlockKernels.Range(values, _least[k], _greatest[k]);
        }

        MarkMeetings(block);
    }

    /// <summary>Pairs of places in <see cref="Columns"/> whose product can add something; more rows can only make them more.</summary>
    public IEnumerable<(int A, int B)> Products()
    {
        for (var a = 0; a < columns.Length; a++)
        {
            for (var b = 0; b <= a; b++)
            {
                if (!(_isBinary[a] && _isBinary[b]) || (a != b && _meet[a, b]))
                {
                    yield return (a, b);
                }
            }
        }
    }

    /// <summary>The column at that place, a number moved and scaled to lie between -1 and 1.</summary>
    public void Scale(RowBlock block, int place, Span<double> into)
    {
        block.Column(columns[place]).CopyTo(into);
        var half = (_greatest[place] - _least[place]) / 2;
        if (_isBinary[place] || half == 0)
        {
            return;
        }

        var centre = _least[place] + half;
        foreach (ref var value in into)
        {
            value = (value - centre) / half;
        }
    }

    private void MarkMeetings(RowBlock block)
    {
        for (var a = 0; a < columns.Length; a++)
        {
            for (var b = 0; b < a; b++)
            {
                _meet[a, b] = _meet[a, b] || (_isBinary[a] && _isBinary[b] && BlockKernels.Dot(block.Column(columns[a]), block.Column(columns[b])) > 0);
            }
        }
    }
}
