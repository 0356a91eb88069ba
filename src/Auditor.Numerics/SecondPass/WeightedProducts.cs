using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>One q x q sum over the rows, sum_i w_i qz_i qz_i', block by block. Only the lower triangle is right until <see cref="Finish"/>.</summary>
internal sealed class WeightedProducts(double[,] into, int capacity)
{
    private readonly PanelColumns _scaled = new(capacity, 2);
    private readonly int _q = into.GetLength(0);

    public void Add(PanelColumns qz, int rows, ReadOnlySpan<double> weights)
    {
        _scaled.Begin(rows);
        if (_q < PanelColumns.Width)
        {
            AddEach(qz, weights);
            return;
        }

        for (var first = 0; first < _q; first += PanelColumns.Tile)
        {
            AddTile(qz, weights, first, Math.Min(first + PanelColumns.Tile, _q));
        }
    }

    /// <summary>Makes the matrix symmetric.</summary>
    public void Finish()
    {
        for (var a = 0; a < _q; a++)
        {
            for (var b = 0; b < a; b++)
            {
                into[b, a] = into[a, b];
            }
        }
    }

    private void AddEach(PanelColumns qz, ReadOnlySpan<double> weights)
    {
        for (var a = 0; a < _q; a++)
        {
            BlockKernels.Multiply(qz.Column(a), weights, _scaled.Column(0));
            for (var b = 0; b <= a; b++)
            {
                into[a, b] += BlockKernels.Dot(_scaled.Column(0), qz.Column(b));
            }
        }
    }

    /// <summary>Columns first to end - 1 of the lower triangle.</summary>
    private void AddTile(PanelColumns qz, ReadOnlySpan<double> weights, int first, int end)
    {
        for (var a = first; a < _q; a += 2)
        {
            var two = a + 1 < _q;
            BlockKernels.Multiply(qz.Column(a), weights, _scaled.Column(0));
            if (two)
            {
                BlockKernels.Multiply(qz.Column(a + 1), weights, _scaled.Column(1));
            }

            for (var p = first; p < Math.Min(end, a + 2); p += PanelColumns.Width)
            {
                var (withA, withB) = PanelKernels.Dots(ref qz.First(p), qz.Stride, ref _scaled.First(0), ref _scaled.First(1), qz.Steps);
                AddRow(a, p, withA);
                if (two)
                {
                    AddRow(a + 1, p, withB);
                }
            }
        }
    }

    private void AddRow(int row, int first, Vector512<double> values)
    {
        var target = MemoryMarshal.CreateSpan(ref into[row, first], Math.Min(PanelColumns.Width, _q - first));
        for (var b = 0; b < target.Length; b++)
        {
            target[b] += values[b];
        }
    }
}
