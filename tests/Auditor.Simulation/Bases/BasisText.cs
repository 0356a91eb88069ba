using System.Globalization;
using System.Text;

namespace Auditor.Simulation.Bases;

/// <summary>The results of <see cref="BasisStudy"/> as plain tables, a summary of levels and the cells over their goal in words.</summary>
internal sealed class BasisText(IReadOnlyList<World> worlds, IReadOnlyList<IReadOnlyList<IReadOnlyList<Counted>>> counts, RunFacts run)
{
    private const double SummaryGoal = 0.08;

    private readonly StringBuilder _text = new();

    public string Write(double level, double bound)
    {
        Append($"# By which test an exclusion can be judged\n\nWritten by the program, not by hand: {run.Draws} data sets a cell, seed {run.Seed}, {run.Moment:yyyy-MM-dd}, ");
        Append($"{run.Took.TotalMinutes:F1} minutes. README.md says what is simulated.\n\n");
        Append($"Shares are in per cent with their Monte Carlo standard errors, of the data sets in which the test has a value; a dash: it has none in most. Without other words a column ");
        Append($"is the share of rejections at {level} when the group has no effect. Wrongly supported: true partial R² exactly at the bound {bound}. Power: true partial R² {Worlds.Effect}. ");
        Append($"Cannot reject: in data with that effect the null-imposed form's ceiling is above the level (untestable, so never called supported; the column \"ceiling ignored\" leaves that out).\nGoals: level of the basis at most 8, wrongly supported at most 8, families at most 5 ");
        Append($"(one group: 8). `above`: over the goal by more than two standard errors; `above?`: by less.\n");
        Summary();
        for (var w = 0; w < worlds.Count; w++)
        {
            Table(w);
        }

        OverGoal();
        return _text.ToString();
    }

    private static string Shown(Measure measure, Counted counted) =>
        counted.Share is { } share ? Invariant($"{100 * share.Value:F1} ± {100 * share.Error:F1}{Mark(measure, share)}") : "–";

    private static string Mark(Measure measure, Share share) =>
        measure.Goal is not double goal || share.Value <= goal ? ""
        : share.Value - (2 * share.Error) > goal ? " above" : " above?";

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);

    private void Summary()
    {
        Append($"\n## Where each test keeps its level\n\nRejections without an effect over the settings of a table: least, median, most; and in how many more than {100 * SummaryGoal} per cent.\n\n");
        Append($"| world | test | least | median | most | settings above {100 * SummaryGoal} |\n|---|---|--:|--:|--:|--:|\n");
        for (var w = 0; w < worlds.Count; w++)
        {
            for (var m = 0; m < worlds[w].Measures.Count; m++)
            {
                if (worlds[w].Measures[m].Summed)
                {
                    SummaryLine(worlds[w], m, [.. counts[w].Select(row => row[m].Share).OfType<Share>().Select(share => share.Value).Order()]);
                }
            }
        }
    }

    private void SummaryLine(World world, int m, double[] shares)
    {
        var basis = world.Measures[m].Goal is null ? "" : " (basis)";
        Append($"| {world.Name} | {world.Measures[m].Heading}{basis} | {100 * shares[0]:F1} | {100 * shares[shares.Length / 2]:F1} | {100 * shares[^1]:F1} | ");
        Append($"{shares.Count(share => share > SummaryGoal)} of {shares.Length} |\n");
    }

    private void Table(int w)
    {
        var world = worlds[w];
        Append($"\n## {char.ToUpperInvariant(world.Name[0])}{world.Name[1..]}\n\n{world.Says}\n\n");
        Append($"| {string.Join(" | ", world.Headings.Concat(world.Measures.Select(measure => measure.Heading)))} |\n");
        Append($"|{string.Concat(world.Headings.Select(_ => "---|"))}{string.Concat(world.Measures.Select(_ => "--:|"))}\n");
        for (var s = 0; s < world.Settings.Count; s++)
        {
            var shares = world.Measures.Select((measure, m) => Shown(measure, counts[w][s][m]));
            Append($"| {string.Join(" | ", world.Settings[s].Labels.Concat(shares))} |\n");
        }
    }

    private void OverGoal()
    {
        Append($"\n## Cells over their goal\n\n");
        string[] lines = [.. from w in Enumerable.Range(0, worlds.Count)
                             from s in Enumerable.Range(0, worlds[w].Settings.Count)
                             from m in Enumerable.Range(0, worlds[w].Measures.Count)
                             where counts[w][s][m].Share is { } share && Mark(worlds[w].Measures[m], share).Length > 0
                             select Line(worlds[w], worlds[w].Settings[s], worlds[w].Measures[m], counts[w][s][m])];
        Append($"{(lines.Length == 0 ? "None.\n" : string.Concat(lines))}");
    }

    private static string Line(World world, Setting setting, Measure measure, Counted counted)
    {
        var labels = world.Headings.Zip(setting.Labels, (heading, label) => heading + " " + label);
        return Invariant($"- {world.Name}; {string.Join(", ", labels)}: {measure.Heading}, {Shown(measure, counted)} (goal {100 * measure.Goal:F0})\n");
    }

    private void Append(FormattableString text) => _text.Append(Invariant(text));
}
