using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// The columns of White's auxiliary regression: the final model's, and their squares and cross products without those that are known beforehand to add
/// nothing (the square of a 0/1 column is itself; a product of two 0/1 columns that are never 1 together is zero).
/// </summary>
/// <param name="Linear">Design columns.</param>
/// <param name="Products">Pairs of design columns to be multiplied.</param>
/// <param name="Origins">What is taken off each design column before it is multiplied, so that large values lose no digits; the space spanned stays.</param>
internal sealed record WhiteColumns(IReadOnlyList<int> Linear, IReadOnlyList<(int A, int B)> Products, IReadOnlyDictionary<int, double> Origins)
{
    /// <summary>All columns, the intercept included.</summary>
    public int Count => 1 + Linear.Count + Products.Count;

    public static WhiteColumns Of(CheckedFit fit)
    {
        var slopes = fit.Slopes;
        var (isBinary, meet) = Scan(fit.Design, slopes);
        var products = new List<(int, int)>();
        for (var a = 0; a < slopes.Length; a++)
        {
            for (var b = 0; b <= a; b++)
            {
                if (!(isBinary[a] && isBinary[b]) || (a != b && meet[a, b]))
                {
                    products.Add((slopes[a], slopes[b]));
                }
            }
        }

        var first = fit.Design.Blocks().First();
        return new WhiteColumns(slopes, products, Enumerable.Range(0, slopes.Length).ToDictionary(k => slopes[k], k => isBinary[k] ? 0 : first.Values[slopes[k] * first.Stride]));
    }

    /// <summary>Which columns hold only 0 and 1, and which of them are 1 in the same row.</summary>
    private static (bool[] IsBinary, bool[,] Meet) Scan(IDesignRows design, int[] slopes)
    {
        var isBinary = Enumerable.Repeat(true, slopes.Length).ToArray();
        var meet = new bool[slopes.Length, slopes.Length];
        var ones = new List<int>(slopes.Length);
        foreach (var block in design.Blocks())
        {
            for (var k = 0; k < slopes.Length; k++)
            {
                isBinary[k] = isBinary[k] && !block.Column(slopes[k]).ContainsAnyExcept(0, 1);
            }

            for (var i = 0; i < block.Rows; i++)
            {
                ones.Clear();
                ones.AddRange(Enumerable.Range(0, slopes.Length).Where(k => isBinary[k] && block.Values[(slopes[k] * block.Stride) + i] != 0));
                Mark(meet, ones);
            }
        }

        return (isBinary, meet);
    }

    private static void Mark(bool[,] meet, List<int> ones)
    {
        foreach (var a in ones)
        {
            foreach (var b in ones)
            {
                meet[a, b] = true;
            }
        }
    }
}
