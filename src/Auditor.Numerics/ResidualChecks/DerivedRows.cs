using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// A second design made row by row from a first one: the auxiliary regressions of the checks. Each block of the first is handed over with the position of
/// its first row; the derived block has as many rows.
/// </summary>
/// <param name="fill">Fills the derived block (its rows are set) from the source block; several threads may do so at once, each with blocks of its own.</param>
/// <param name="keepWeights">Whether the rows keep their weights; copies are always kept.</param>
internal sealed class DerivedRows(IDesignRows source, DesignLayout layout, bool keepWeights, Action<RowBlock, RowBlock> fill) : IDesignRows
{
    public DesignLayout Layout => layout;

    public int Stripes => source.Stripes;

    public IEnumerable<RowBlock> Blocks() => Derive(source.Blocks());

    public IEnumerable<RowBlock> Blocks(int stripe) => Derive(source.Blocks(stripe));

    private IEnumerable<RowBlock> Derive(IEnumerable<RowBlock> blocks)
    {
        RowBlock? derived = null;
        foreach (var block in blocks)
        {
            derived ??= new RowBlock(block.Stride, layout.Columns);
            derived.FirstRow = block.FirstRow;
            derived.Rows = block.Rows;
            derived.Weights = keepWeights ? block.Weights : null;
            derived.Copies = block.Copies;
            if (layout.Intercept)
            {
                derived.Column(0).Fill(1);
            }

            fill(block, derived);
            yield return derived;
        }
    }
}
