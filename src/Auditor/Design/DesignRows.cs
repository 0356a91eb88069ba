using Auditor.Data;
using Auditor.Declaration;
using Auditor.Numerics.Factor;

namespace Auditor.Design;

/// <summary>Makes the columns of a plan for the rows of a subset, block by block: the whole design is never in memory.</summary>
/// <param name="withLowParts">Whether the blocks carry what rounding took off the columns.</param>
public sealed class DesignRows(BoundModel model, DesignPlan plan, RowSubset rows, bool withLowParts = false) : IDesignRows
{
    public DesignLayout Layout => plan.Layout;

    public IDesignRows? Extended => withLowParts ? this
        : plan.TermColumns().Any(entry => entry.Term.HasLowParts) ? new DesignRows(model, plan, rows, withLowParts: true)
        : null;

    public int Stripes => Cut.Count;

    private RowStripes Cut => new(rows.Count, Layout.Columns);

    public IEnumerable<RowBlock> Blocks() => Blocks(0, rows.Count);

    public IEnumerable<RowBlock> Blocks(int stripe)
    {
        var (first, end) = Cut[stripe];
        return Blocks(first, end);
    }

    private IEnumerable<RowBlock> Blocks(int from, int end)
    {
        var block = new RowBlock(Math.Min(RowBlock.DefaultCapacity, Math.Max(1, rows.Count)), Layout.Columns);
        block.Low = withLowParts ? new double[block.Values.Length] : null;
        var weights = model.Weights is null ? null : new double[block.Stride];
        var copies = model.Weights?.Kind == WeightKind.Frequency;
        block.Weights = copies ? null : weights;
        block.Copies = copies ? weights : null;
        for (var first = from; first < end; first += block.Stride)
        {
            Fill(block, first, weights);
            yield return block;
        }
    }

    private void Fill(RowBlock block, int first, double[]? weights)
    {
        block.FirstRow = first;
        block.Rows = Math.Min(block.Stride, rows.Count - first);
        Span<int> chosen = stackalloc int[block.Rows];
        rows.CopyTo(first, chosen);
        if (Layout.Intercept)
        {
            block.Column(0).Fill(1);
        }

        foreach (var (term, column) in plan.TermColumns())
        {
            term.Fill(chosen, block.Values.AsSpan(column * block.Stride), block.Stride);
            if (block.Low is { } low)
            {
                term.FillLow(chosen, low.AsSpan(column * block.Stride), block.Stride);
            }
        }

        if (weights is not null)
        {
            model.Weights!.Column.Values.Read(chosen, weights);
        }
    }
}
