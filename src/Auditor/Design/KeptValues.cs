using Auditor.Data;

namespace Auditor.Design;

/// <summary>What a data-dependent transform takes from the kept rows: figures of the values that exist there, unweighted.</summary>
internal static class KeptValues
{
    private const int BlockRows = 1024;

    /// <summary>The values of a one-column term on the kept rows that have one.</summary>
    public static double[] Of(BoundTerm term, RowSubset keptRows)
    {
        var (found, rows, values) = (new List<double>(), new int[BlockRows], new double[BlockRows]);
        for (var first = 0; first < keptRows.Count; first += BlockRows)
        {
            var block = rows.AsSpan(0, Math.Min(BlockRows, keptRows.Count - first));
            keptRows.CopyTo(first, block);
            term.Fill(block, values, BlockRows);
            for (var i = 0; i < block.Length; i++)
            {
                if (double.IsFinite(values[i]) && !IsMissing(term, block[i]))
                {
                    found.Add(values[i]);
                }
            }
        }

        return [.. found];
    }

    private static bool IsMissing(BoundTerm term, int row)
    {
        foreach (var source in term.Sources)
        {
            if (source.IsMissing(row))
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>The mean, summed with compensation (Neumaier 1974) so that it does not depend on the number of rows how many digits are right.</summary>
    public static double Mean(double[] values)
    {
        double sum = 0, lost = 0;
        foreach (var value in values)
        {
            var next = sum + value;
            lost += Math.Abs(sum) >= Math.Abs(value) ? sum - next + value : value - next + sum;
            sum = next;
        }

        return (sum + lost) / values.Length;
    }

    /// <summary>Linear interpolation of the order statistics at (n - 1) p: type 7 of Hyndman and Fan (1996).</summary>
    /// <param name="sorted">Rising, at least one.</param>
    public static double Quantile(double[] sorted, double p)
    {
        var place = (sorted.Length - 1) * p;
        var below = (int)Math.Floor(place);
        var above = Math.Min(below + 1, sorted.Length - 1);
        return sorted[below] + ((place - below) * (sorted[above] - sorted[below]));
    }
}
