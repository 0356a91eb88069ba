using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;

namespace Auditor.Simulation.Bases;

/// <summary>How a group's columns vary over loans and periods.</summary>
internal enum PanelColumns
{
    /// <summary>A random walk, the same for all loans.</summary>
    MacroWalk,

    /// <summary>Autoregressive with 0.8, the same for all loans.</summary>
    Macro,

    /// <summary>One value a loan.</summary>
    Loan,

    /// <summary>Autoregressive with 0.8 in each loan, independent between loans.</summary>
    Own,

    /// <summary>Half of the variance a macro series, half the loan's own.</summary>
    Follows,

    /// <summary>The first column macro, the others the loans' own.</summary>
    Mixture,
}

/// <summary>
/// Loans over the same periods. Of the errors' variance 0.3 is the loan's, 0.2 the period's (autoregressive with 0.8), 0.5 autoregressive with 0.5 in each loan.
/// Loan is declared as cluster and unit, period as time.
/// </summary>
internal sealed class PanelSetting : Setting
{
    private readonly PanelColumns _kind;
    private readonly int _loans;
    private readonly int _periods;

    public PanelSetting(PanelColumns kind, int loans, int periods, IReadOnlyList<int> widths, params IReadOnlyList<string> labels)
        : base(labels, loans * periods, widths)
    {
        (_kind, _loans, _periods) = (kind, loans, periods);
        var loan = new RowClasses([.. Enumerable.Range(0, Rows).Select(i => i / periods)], loans);
        Structure = new DependenceStructure
        {
            Cluster = loan,
            Unit = loan,
            Period = new RowClasses([.. Enumerable.Range(0, Rows).Select(i => i % periods)], periods),
        };
    }

    public override DependenceStructure? Structure { get; }

    public override double Draw(Generator random, DrawnRows into)
    {
        Array.Fill(into.Columns[0], 1);
        Array.Clear(into.Columns[1]);
        Array.Clear(into.Columns[2]);
        Add(into.Columns[1], 1, OfLoans(random, 0.8));
        Add(into.Columns[2], 1, Constant(random));
        FillIndicator(random, into.Columns[3], 0.3);
        foreach (var (column, position) in into.Groups)
        {
            Array.Clear(column);
            FillGroup(random, column, position);
        }

        Array.Clear(into.Errors);
        Add(into.Errors, 0.3, Constant(random));
        Add(into.Errors, 0.2, Common(random, 0.8));
        Add(into.Errors, 0.5, OfLoans(random, 0.5));
        return 1;
    }

    private void FillGroup(Generator random, double[] column, int position)
    {
        var follows = _kind == PanelColumns.Follows ? 0.5 : 1;
        if (_kind is PanelColumns.MacroWalk or PanelColumns.Macro or PanelColumns.Follows || (_kind == PanelColumns.Mixture && position == 0))
        {
            Add(column, follows, Common(random, _kind == PanelColumns.MacroWalk ? 1 : 0.8));
        }

        if (_kind == PanelColumns.Loan)
        {
            Add(column, 1, Constant(random));
        }

        if (_kind is PanelColumns.Own or PanelColumns.Follows || (_kind == PanelColumns.Mixture && position > 0))
        {
            Add(column, follows, OfLoans(random, 0.8));
        }
    }

    private void Add(double[] column, double variance, Func<int, int, double> part)
    {
        for (var i = 0; i < column.Length; i++)
        {
            column[i] += Math.Sqrt(variance) * part(i / _periods, i % _periods);
        }
    }

    private Func<int, int, double> Common(Generator random, double rho)
    {
        var series = Series.Of(random, _periods, rho);
        return (_, t) => series[t];
    }

    private Func<int, int, double> Constant(Generator random)
    {
        double[] values = [.. Enumerable.Range(0, _loans).Select(_ => random.Normal())];
        return (loan, _) => values[loan];
    }

    private Func<int, int, double> OfLoans(Generator random, double rho)
    {
        double[][] series = [.. Enumerable.Range(0, _loans).Select(_ => Series.Of(random, _periods, rho))];
        return (loan, t) => series[loan][t];
    }
}
