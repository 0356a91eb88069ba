using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Tests.Factor;

/// <summary>A constant, the powers 1 to degree of x with what rounding took off them, and y.</summary>
internal sealed class PowerRows(double[] x, int degree, double[] y) : IDesignRows
{
    public DesignLayout Layout { get; } = new(true, degree + 1, []);

    public IDesignRows Extended => this;

    public IEnumerable<RowBlock> Blocks()
    {
        const int Capacity = 7;
        for (var first = 0; first < x.Length; first += Capacity)
        {
            var block = new RowBlock(Capacity, Layout.Columns) { FirstRow = first, Rows = Math.Min(Capacity, x.Length - first) };
            block.Low = new double[block.Values.Length];
            block.Column(0).Fill(1);
            for (var i = 0; i < block.Rows; i++)
            {
                Fill(block, i, x[first + i]);
                block.Column(Layout.Response)[i] = y[first + i];
            }

            yield return block;
        }
    }

    private void Fill(RowBlock block, int row, double value)
    {
        for (var power = 1; power <= degree; power++)
        {
            block.Column(power)[row] = Powers.Of(value, power);
            block.LowColumn(power)[row] = Powers.LowOf(value, power);
        }
    }
}
