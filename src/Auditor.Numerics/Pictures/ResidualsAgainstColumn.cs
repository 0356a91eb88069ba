using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Pictures;

/// <summary>e(F) times sqrt(w) against one column of the design as declared: what is left over, against what was left out.</summary>
/// <param name="column">The design's column.</param>
/// <param name="alone">Most rows drawn one by one.</param>
public sealed class ResidualsAgainstColumn(int column, int alone) : IAccumulator
{
    public int Column => column;

    public PointGrid Points { get; } = new(alone);

    public void Add(ResidualBlock block)
    {
        var shift = block.Final.Factor.Shifts[column];
        var values = block.Prepared.Column(column);
        var scale = block.Prepared.Scale;
        for (var i = 0; i < block.Rows; i++)
        {
            Points.Add((values[i] / scale[i]) + shift, block.Residuals[i], block.Copies?[i] ?? 1);
        }
    }
}
