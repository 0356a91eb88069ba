using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;

namespace Auditor.Simulation.Bases;

/// <summary>One way in which rows, columns and errors come about: a row of a table.</summary>
/// <param name="labels">What the table says of it, in the order of the world's headings.</param>
/// <param name="rows">n.</param>
/// <param name="widths">Columns of each left-out group.</param>
internal abstract class Setting(IReadOnlyList<string> labels, int rows, IReadOnlyList<int> widths)
{
    /// <summary>Intercept and three more.</summary>
    public const int FinalColumns = 4;

    public IReadOnlyList<string> Labels { get; } = labels;

    public int Rows { get; } = rows;

    public IReadOnlyList<int> Widths { get; } = widths;

    /// <summary>What is declared; null for independent rows.</summary>
    public virtual DependenceStructure? Structure => null;

    /// <summary>New columns and errors.</summary>
    /// <returns>Mean over the rows of the errors' variances.</returns>
    public abstract double Draw(Generator random, DrawnRows into);

    protected static void FillIndicator(Generator random, double[] column, double share)
    {
        for (var i = 0; i < column.Length; i++)
        {
            column[i] = random.Uniform() < share ? 1 : 0;
        }
    }

    /// <summary>Kinds of column by turns: normal, log-normal (high leverage), a 30 % indicator.</summary>
    protected static double ByTurns(Generator random, int position) => (position % 3) switch
    {
        0 => random.Normal(),
        1 => Math.Exp(random.Normal()),
        _ => random.Uniform() < 0.3 ? 1 : 0,
    };
}

/// <summary>Columns of the final model (the intercept first) and of the groups, and the errors.</summary>
internal sealed class DrawnRows(int rows, int columns)
{
    public double[][] Columns { get; } = [.. Enumerable.Range(0, columns).Select(_ => new double[rows])];

    public double[] Errors { get; } = new double[rows];

    public IEnumerable<(double[] Column, int Position)> Groups =>
        Columns.Skip(Setting.FinalColumns).Select((column, position) => (column, position));
}
