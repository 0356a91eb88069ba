using Auditor.Numerics.Factor;
using Auditor.Numerics.Random;

namespace Auditor.Simulation.Bases;

/// <summary>One simulated data set of a setting, with an effect in the first group's first column, as in <see cref="Sample"/>.</summary>
internal sealed class BasisSample
{
    private readonly Setting _setting;
    private readonly DrawnRows _rows;
    private readonly MemoryRows _firstOnFinal;
    private readonly double[] _response;
    private double _unit;

    public BasisSample(Setting setting)
    {
        _setting = setting;
        _rows = new DrawnRows(setting.Rows, Setting.FinalColumns + setting.Widths.Sum());
        Design = new MemoryRows(new DesignLayout(true, Setting.FinalColumns, Ranges(setting.Widths)), setting.Rows);
        _firstOnFinal = new MemoryRows(new DesignLayout(true, Setting.FinalColumns, []), setting.Rows);
        _response = new double[setting.Rows];
    }

    public MemoryRows Design { get; }

    private double[] First => _rows.Columns[Setting.FinalColumns];

    public void Draw(Generator random)
    {
        var variance = _setting.Draw(random, _rows);
        for (var c = 0; c < _rows.Columns.Length; c++)
        {
            Design.Set(c, _rows.Columns[c]);
            if (c <= Setting.FinalColumns)
            {
                _firstOnFinal.Set(c, _rows.Columns[c]);
            }
        }

        var residual = FinalFactor.Of(FactorBuilder.Build(_firstOnFinal)).Rss;
        _unit = Math.Sqrt(variance * (_setting.Rows - Setting.FinalColumns + 1) / residual);
    }

    /// <summary>The same columns and errors; the true partial R² is explained / (explained + mean error variance), explained b² |M_F z|² / (n - rank F + 1).</summary>
    public void SetEffect(double partialRSquared)
    {
        var slope = _unit * Math.Sqrt(partialRSquared / (1 - partialRSquared));
        for (var i = 0; i < _response.Length; i++)
        {
            _response[i] = (slope * First[i]) + _rows.Errors[i];
        }

        Design.Set(Design.Layout.Response, _response);
    }

    private static List<ColumnRange> Ranges(IReadOnlyList<int> widths)
    {
        var ranges = new List<ColumnRange>();
        foreach (var width in widths)
        {
            ranges.Add(new ColumnRange(Setting.FinalColumns + ranges.Sum(range => range.Count), width));
        }

        return ranges;
    }
}
