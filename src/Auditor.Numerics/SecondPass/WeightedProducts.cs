using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>q x q sums over the rows, sum_i w_i qz_i qz_i', block by block. Only the lower triangle is right until <see cref="Finish"/>.</summary>
internal sealed class WeightedProducts(int capacity)
{
    private readonly PanelColumns _scaled = new(capacity, 2);

    public void Add(double[,] into, PanelColumns qz, int rows, ReadOnlySpan<double> weights)
    {
        var q = into.GetLength(0);
        _scaled.Begin(rows);
        if (q < PanelColumns.Width)
        {
            AddEach(into, qz, weights);
            return;
        }

        for (var first = 0; first < q; first += PanelColumns.Tile)
        {
            AddTile(into, qz, weights, first, Math.Min(first + PanelColumns.Tile, q));
        }
    }

    /// <summary>Makes the matrix symmetric.</summary>
    public static void Finish(double[,] into)
    {
        for (var a = 0; a < into.GetLength(0); a++)
        {
            for (var b = 0; b < a; b++)
            {
                into[b, a] = into[a, b];
            }
        }
    }

    private void AddEach(double[,] into, PanelColumns qz, ReadOnlySpan<double> weights)
    {
        for (var a = 0; a < into.GetLength(0); a++)
        {
            BlockKernels.Multiply(qz.Column(a), weights, _scaled.Column(0));
            for (var b = 0; b <= a; b++)
            {
                into[a, b] += BlockKernels.Dot(_scaled.Column(0), qz.Column(b));
            }
        }
    }

    /// <summary>Columns first to end - 1 of the lower triangle.</summary>
    private void AddTile(double[,] into, PanelColumns qz, ReadOnlySpan<double> weights, int first, int end)
    {
        var q = into.GetLength(0);
        for (var a = first; a < q; a += 2)
        {
            var two = a + 1 < q;
            BlockKernels.Multiply(qz.Column(a), weights, _scaled.Column(0));
            if (two)
            {
                BlockKernels.Multiply(qz.Column(a + 1), weights, _scaled.Column(1));
            }

            for (var p = first; p < Math.Min(end, a + 2); p += PanelColumns.Width)
            {
                var (withA, withB) = PanelKernels.Dots(ref qz.First(p), qz.Stride, ref _scaled.First(0), ref _scaled.First(1), qz.Steps);
                AddRow(into, a, p, withA);
                if (two)
                {
                    AddRow(into, a + 1, p, withB);
                }
            }
        }
    }

    private static void AddRow(double[,] into, int row, int first, Vector512<double> values)
    {
        var target = MemoryMarshal.CreateSpan(ref into[row, first], Math.Min(PanelColumns.Width, into.GetLength(0) - first));
        for (var b = 0; b < target.Length; b++)
        {
            target[b] += values[b];
        }
    }
}
