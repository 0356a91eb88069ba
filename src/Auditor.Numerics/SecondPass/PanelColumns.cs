using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>Some columns of a block of rows, each filled up with zeros to whole row steps, so that <see cref="PanelKernels"/> work on them eight at a time.</summary>
/// <param name="capacity">Most rows of a block.</param>
/// <param name="columns">Columns in use; as many more as make whole panels stay zero.</param>
internal sealed class PanelColumns(int capacity, int columns)
{
    public const int Width = PanelKernels.Width;

    /// <summary>So many columns of a block stay in the cache while all others pass by.</summary>
    public const int Tile = 64;

    private readonly int _stride = StackedPanels.WholeSteps(capacity) + Width;
    private readonly double[] _values = new double[(StackedPanels.WholeSteps(capacity) + Width) * (((columns + Width - 1) / Width * Width) + Width)];
    private int _rows;

    public int Count => columns;

    public nuint Stride => (nuint)_stride;

    /// <summary>Rows in whole steps.</summary>
    public nuint Steps => (nuint)StackedPanels.WholeSteps(_rows);

    public Span<double> Column(int k) => _values.AsSpan(k * _stride, _rows);

    public Memory<double> Memory(int k) => _values.AsMemory(k * _stride, _rows);

    /// <summary>The first element of a column.</summary>
    public ref double First(int k) => ref MemoryMarshal.GetReference(_values.AsSpan(k * _stride));

    /// <summary>To be called before the columns of a block are written.</summary>
    public void Begin(int rows)
    {
        _rows = rows;
        var tail = StackedPanels.WholeSteps(rows) - rows;
        for (var k = 0; k < columns && tail > 0; k++)
        {
            _values.AsSpan((k * _stride) + rows, tail).Clear();
        }
    }

    /// <summary>
    /// Every column less the given columns of another block: column k -= sum_j t[j, k] other_j, t's column k given by its number. In this order of j, whatever the tiles.
    /// </summary>
    public void Subtract(PanelColumns other, Func<int, ReadOnlyMemory<double>> factors)
    {
        for (var k = 0; k < columns; k++)
        {
            var t = factors(k).Span;
            SubtractPanels(other, 0, other.Count / Width * Width, k, 1, t, default);
            SubtractEach(other, other.Count / Width * Width, other.Count, k, t);
        }
    }

    /// <summary>Every row times the inverse of the triangle: column k = (column k - sum of t[j, k] column j over j below k) / t[k, k].</summary>
    public void Solve(ColumnMatrix t)
    {
        for (var first = 0; first < columns; first += Tile)
        {
            var end = Math.Min(first + Tile, columns);
            SolveTile(t, first, end);
            for (var k = end; k < columns; k += 2)
            {
                SubtractPanels(this, first, end, k, Math.Min(2, columns - k), t.Column(k), k + 1 < columns ? t.Column(k + 1) : default);
            }
        }
    }

    private void SolveTile(ColumnMatrix t, int first, int end)
    {
        for (var k = first; k < end; k++)
        {
            var whole = first + ((k - first) / Width * Width);
            SubtractPanels(this, first, whole, k, 1, t.Column(k), default);
            SubtractEach(this, whole, k, k, t.Column(k));
            BlockKernels.Scale(Column(k), 1 / t[k, k]);
        }
    }

    private void SubtractEach(PanelColumns other, int first, int end, int k, ReadOnlySpan<double> t)
    {
        for (var j = first; j < end; j++)
        {
            BlockKernels.AddScaled(Column(k), -t[j], other.Column(j));
        }
    }

    /// <summary>Whole panels of the other block, first to end - 1, off one or two columns.</summary>
    private void SubtractPanels(PanelColumns other, int first, int end, int k, int count, ReadOnlySpan<double> t, ReadOnlySpan<double> next)
    {
        for (var p = first; p < end; p += Width)
        {
            var forA = Vector512.Create(t.Slice(p, Width));
            if (count == 1)
            {
                PanelKernels.Subtract(ref other.First(p), Stride, ref First(k), Steps, forA);
            }
            else
            {
                PanelKernels.Subtract(ref other.First(p), Stride, ref First(k), ref First(k + 1), Steps, forA, Vector512.Create(next.Slice(p, Width)));
            }
        }
    }
}
