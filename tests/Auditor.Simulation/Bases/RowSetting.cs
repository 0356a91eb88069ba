using Auditor.Numerics.Random;

namespace Auditor.Simulation.Bases;

/// <summary>Independent rows. The group's first column z is normal and correlates 0.5 with the final model's, or is 1 in every tenth row.</summary>
internal sealed class RowSetting(ErrorLaw law, int rows, IReadOnlyList<int> widths, params IReadOnlyList<string> labels) : Setting(labels, rows, widths)
{
    public static IEnumerable<ErrorLaw> Laws => new[] { 0, 1, 5, 7, 8 }.Select(which => ErrorLaw.All[which]);

    public override double Draw(Generator random, DrawnRows into)
    {
        Array.Fill(into.Columns[0], 1);
        FillIndicator(random, into.Columns[3], 0.3);
        var variances = 0.0;
        for (var i = 0; i < Rows; i++)
        {
            DrawColumns(random, into, i);
            var variance = law.Variance(into.Columns[FinalColumns][i]);
            variances += variance;
            into.Errors[i] = Math.Sqrt(variance) * law.Draw(random);
        }

        return variances / Rows;
    }

    private void DrawColumns(Generator random, DrawnRows into, int i)
    {
        into.Columns[1][i] = random.Normal();
        into.Columns[2][i] = random.Normal();
        foreach (var (column, position) in into.Groups)
        {
            column[i] = position > 0 ? ByTurns(random, position)
                : law.RareGroup ? (i % 10 == 0 ? 1 : 0)
                : (0.5 * into.Columns[1][i]) + (Math.Sqrt(0.75) * random.Normal());
        }
    }
}
