using Auditor.Numerics.Factor;

namespace Auditor.Simulation.Bases;

/// <summary>The same rows with all columns in the final model: the fit of F + group on its own.</summary>
internal sealed class Regrouped(MemoryRows rows) : IDesignRows
{
    public DesignLayout Layout { get; } = new(true, rows.Layout.Response, []);

    public IEnumerable<RowBlock> Blocks() => rows.Blocks();
}
