using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Pictures;

/// <summary>
/// The added-variable picture of a group: e(F) up, and across what the group adds. For one column that is Z~, the column's part orthogonal to the final
/// model, and the least-squares line through the origin has the column's coefficient as its slope; for several it is their fitted part Qz u, and the
/// line has slope 1. Rows times sqrt(w).
/// </summary>
/// <remarks>Added-variable plot: Cook and Weisberg 1982; for several columns at once Sall 1990 (both from memory).</remarks>
public sealed class AddedVariable : IAccumulator
{
    private readonly AddedGroup _group;
    private readonly PointGrid _grid;
    private GroupRows? _rows;

    /// <param name="alone">Most rows drawn one by one.</param>
    public AddedVariable(AddedGroup group, int alone)
    {
        _group = group;
        _grid = new PointGrid(alone);
    }

    public PointGrid Points => _grid;

    /// <summary>Whether the group adds one direction, so that the picture is of the column itself.</summary>
    public bool OneColumn => _group.Rank == 1;

    /// <summary>Slope of the least-squares line through the origin.</summary>
    public double Slope => OneColumn ? _group.U[0] / _group.Triangle[0, 0] : 1;

    public void Add(ResidualBlock block)
    {
        if (_group.Rank == 0)
        {
            return;
        }

        _rows ??= new GroupRows(_group.Rank, block.Prepared.Stride);
        _rows.Load(block, _group);
        for (var i = 0; i < block.Rows; i++)
        {
            var across = OneColumn ? _rows.Column(0)[i] * _group.Triangle[0, 0] : _rows.Fitted[i];
            _grid.Add(across, block.Residuals[i], block.Copies?[i] ?? 1);
        }
    }
}
