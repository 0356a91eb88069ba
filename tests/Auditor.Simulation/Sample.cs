using Auditor.Numerics.Factor;
using Auditor.Numerics.Random;

namespace Auditor.Simulation;

/// <summary>
/// One simulated data set: the final model's columns (intercept, two normal numbers, a 30 % indicator), the group's (a normal number that correlates 0.5 with
/// the first of them, or every tenth row; for three columns also a skewed number and a 20 % indicator), errors by the cell's law. The effect stands in the
/// group's first column, on which unequal variances depend: the direction in which they matter most.
/// </summary>
internal sealed class Sample
{
    private const int FinalColumns = 4;

    private readonly Cell _cell;
    private readonly MemoryRows _design;
    private readonly MemoryRows _firstOnFinal;
    private readonly double[][] _columns;
    private readonly double[] _errors;
    private readonly double[] _response;
    private double _unit;

    public Sample(Cell cell)
    {
        _cell = cell;
        _design = new MemoryRows(new DesignLayout(true, FinalColumns, [new ColumnRange(FinalColumns, cell.Q)]), cell.N);
        _firstOnFinal = new MemoryRows(new DesignLayout(true, FinalColumns, []), cell.N);
        _columns = [.. Enumerable.Range(0, FinalColumns + cell.Q).Select(_ => new double[cell.N])];
        (_errors, _response) = (new double[cell.N], new double[cell.N]);
    }

    private double[] First => _columns[FinalColumns];

    /// <summary>New columns and new errors.</summary>
    public void Draw(Generator random)
    {
        var variances = 0.0;
        for (var i = 0; i < _cell.N; i++)
        {
            DrawRow(random, i);
            var variance = _cell.Law.Variance(First[i]);
            variances += variance;
            _errors[i] = Math.Sqrt(variance) * _cell.Law.Draw(random);
        }

        for (var c = 0; c < _columns.Length; c++)
        {
            _design.Set(c, _columns[c]);
            if (c <= FinalColumns)
            {
                _firstOnFinal.Set(c, _columns[c]);
            }
        }

        var residual = FinalFactor.Of(FactorBuilder.Build(_firstOnFinal)).Rss;
        _unit = Math.Sqrt(variances / _cell.N * (_cell.N - FinalColumns + 1) / residual);
    }

    /// <summary>The same columns and errors with the group's first coefficient set so that its true partial R² is this.</summary>
    /// <remarks>
    /// True partial R² = explained / (explained + error variance): explained is b² |M_F z|² / (n - rank F + 1), z the first column and n - rank F + 1 the tool's own
    /// divisor (a noncentrality is f² (df1 + df2 + 1)); the error variance is the mean over the rows.
    /// </remarks>
    public IDesignRows WithEffect(double partialRSquared)
    {
        var slope = _unit * Math.Sqrt(partialRSquared / (1 - partialRSquared));
        for (var i = 0; i < _cell.N; i++)
        {
            _response[i] = (slope * First[i]) + _errors[i];
        }

        _design.Set(_design.Layout.Response, _response);
        return _design;
    }

    private static double RareGroup(int i) => i % 10 == 0 ? 1 : 0;

    private void DrawRow(Generator random, int i)
    {
        _columns[0][i] = 1;
        _columns[1][i] = random.Normal();
        _columns[2][i] = random.Normal();
        _columns[3][i] = random.Uniform() < 0.3 ? 1 : 0;
        First[i] = _cell.Law.RareGroup ? RareGroup(i) : (0.5 * _columns[1][i]) + (Math.Sqrt(0.75) * random.Normal());
        if (_cell.Q > 1)
        {
            _columns[FinalColumns + 1][i] = Math.Exp(random.Normal());
            _columns[FinalColumns + 2][i] = random.Uniform() < 0.2 ? 1 : 0;
        }
    }
}
