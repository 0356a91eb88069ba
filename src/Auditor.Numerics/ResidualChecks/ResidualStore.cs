using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>Keeps residual and leverage of every row: what the checks need beside the design. Two numbers a row, never the design.</summary>
public sealed class ResidualStore : IAccumulator
{
    private readonly List<double> _residuals = [];
    private readonly List<double> _leverages = [];
    private readonly List<double> _copies = [];

    /// <summary>sqrt(w) e, one a row of the row set.</summary>
    public IReadOnlyList<double> Residuals => _residuals;

    /// <summary>h, one a row.</summary>
    public IReadOnlyList<double> Leverages => _leverages;

    /// <summary>How many equal rows each row stands for; all one without frequency weights.</summary>
    public IReadOnlyList<double> Copies => _copies;

    /// <summary>Greatest less least residual.</summary>
    public double Spread => _residuals.Count > 0 ? _residuals.Max() - _residuals.Min() : 0;

    public void Add(ResidualBlock block)
    {
        for (var i = 0; i < block.Rows; i++)
        {
            _residuals.Add(block.Residuals[i]);
            _leverages.Add(block.Leverages[i]);
            _copies.Add(block.Copies?[i] ?? 1);
        }
    }

    /// <summary>Every observation's residual: a row that stands for several gives as many.</summary>
    public double[] Expanded()
    {
        var expanded = new List<double>(_residuals.Count);
        for (var i = 0; i < _residuals.Count; i++)
        {
            for (var copy = 0; copy < _copies[i]; copy++)
            {
                expanded.Add(_residuals[i]);
            }
        }

        return [.. expanded];
    }
}
