using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;

namespace Auditor.Simulation.Bases;

/// <summary>One row a period; errors, two of the final model's columns and all of the group's are unrelated series with the same rho.</summary>
internal sealed class SeriesSetting(double rho, int periods, IReadOnlyList<int> widths, params IReadOnlyList<string> labels) : Setting(labels, periods, widths)
{
    public override DependenceStructure? Structure { get; } = new() { Period = new RowClasses([.. Enumerable.Range(0, periods)], periods) };

    public override double Draw(Generator random, DrawnRows into)
    {
        Array.Fill(into.Columns[0], 1);
        FillIndicator(random, into.Columns[3], 0.3);
        foreach (var column in into.Columns.Where((_, c) => c is not 0 and not 3).Append(into.Errors))
        {
            Series.Of(random, Rows, rho).CopyTo(column, 0);
        }

        return Series.Variance(Rows, rho);
    }
}
