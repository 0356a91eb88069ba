using System.Buffers;
using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// The columns of White's auxiliary regression: the final model's, and their squares and cross products without those that are known beforehand to add
/// nothing (the square of a 0/1 column is itself; a product of two 0/1 columns that are never 1 together is zero). Numbers are moved and scaled to lie between -1 and 1
/// before they are multiplied, which changes no span and keeps digits.
/// </summary>
internal sealed class WhiteColumns
{
    /// <summary>The most columns, the intercept included, of the regression in full.</summary>
    private const int Widest = 100;

    private readonly ColumnShapes _shapes;
    private readonly (int A, int B)[] _products;

    private WhiteColumns(ColumnShapes shapes)
    {
        _shapes = shapes;
        _products = [.. shapes.Products()];
    }

    /// <summary>All columns, the intercept included.</summary>
    public int Count => 1 + _shapes.Columns.Length + _products.Length;

    /// <returns>Null when there would be more than 100 columns.</returns>
    public static WhiteColumns? Of(CheckedFit fit)
    {
        if (fit.Slopes.Length >= Widest)
        {
            return null;
        }

        var shapes = new ColumnShapes(fit.Slopes);
        foreach (var block in fit.Design.Blocks())
        {
            shapes.Add(block);
            if (1 + shapes.Columns.Length + shapes.Products().Count() > Widest)
            {
                return null;
            }
        }

        return new WhiteColumns(shapes);
    }

    /// <summary>Several threads may fill blocks of their own. Fills columns 1 to <see cref="Count"/> - 1 of the derived block.</summary>
    public void Fill(RowBlock source, RowBlock derived)
    {
        var next = 1;
        foreach (var column in _shapes.Columns)
        {
            source.Column(column).CopyTo(derived.Column(next++));
        }

        var scaled = ArrayPool<double>.Shared.Rent(_shapes.Columns.Length * source.Rows);
        Span<double> Scaled(int place) => scaled.AsSpan(place * source.Rows, source.Rows);
        for (var place = 0; place < _shapes.Columns.Length; place++)
        {
            _shapes.Scale(source, place, Scaled(place));
        }

        foreach (var (a, b) in _products)
        {
            BlockKernels.Multiply(Scaled(a), Scaled(b), derived.Column(next++));
        }

        ArrayPool<double>.Shared.Return(scaled);
    }
}
