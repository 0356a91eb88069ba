using System.Globalization;
using System.Text;
using Auditor.Policies;

namespace Auditor.Simulation;

/// <summary>The results as plain tables.</summary>
internal static class ResultText
{
    /// <summary>Most that the share wrongly called supported may be, under normal errors of equal or unequal variance.</summary>
    private const double SupportGoal = 0.08;

    private static readonly (string Heading, Event Event)[] Tests =
    [
        ("partial F", Event.PartialFRejects), ("HC0", Event.Hc0Rejects), ("HC1", Event.Hc1Rejects),
        ("HC2", Event.Hc2Rejects), ("HC3", Event.Hc3Rejects), ("score form", Event.ScoreRejects),
    ];

    public static string Of(IReadOnlyDictionary<Cell, IReadOnlyList<Tally>> results, RunFacts run, Policy policy)
    {
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"# Simulation results\n\nWritten by the program, not by hand: {run.Draws} draws a cell, seed {run.Seed}, ");
        text.Append(CultureInfo.InvariantCulture, $"{run.Moment:yyyy-MM-dd}, {run.Took.TotalMinutes:F1} minutes on {Environment.ProcessorCount} processors. ");
        text.Append("README.md says what is simulated.\n\nShares are in per cent with their Monte Carlo standard errors; a cell above its goal is marked `above`.\n");
        var (level, bound) = (policy.Significance, Index(policy.NegligiblePartialRSquared));
        Table(text, Invariant($"Level: rejections at {level} when the group has no effect"), results, (0, Tests));
        Table(
            text,
            Invariant($"Wrongly called supported: true partial R² exactly at the bound {policy.NegligiblePartialRSquared}; goal at most {100 * SupportGoal} under normal errors"),
            results,
            (bound, [("verdict on HC3", Event.SupportedOnHc3), ("verdict on classical", Event.SupportedOnClassical)]));
        Table(text, "Rightly called supported: no effect", results, (0, [("verdict on HC3", Event.SupportedOnHc3), ("verdict on classical", Event.SupportedOnClassical)]));
        Table(text, "Power of the test that the verdict rests on (HC3)", results, [.. Larger.Select(e => (e, new[] { (Invariant($"R² {Cell.Effects[e]}"), Event.Hc3Rejects) }))]);
        Table(text, "Power of the partial F", results, [.. Larger.Select(e => (e, new[] { (Invariant($"R² {Cell.Effects[e]}"), Event.PartialFRejects) }))]);
        Table(
            text,
            Invariant($"Coverage of the interval for partial R² at {100 * (1 - (2 * level))} per cent"),
            results,
            [.. Larger.Select(e => (e, new[] { (Invariant($"HC3, R² {Cell.Effects[e]}"), Event.Hc3IntervalCovers), (Invariant($"classical, R² {Cell.Effects[e]}"), Event.ClassicalIntervalCovers) }))]);
        return text.ToString();
    }

    private static IEnumerable<int> Larger => Enumerable.Range(1, Cell.Effects.Count - 1);

    private static int Index(double effect) => Enumerable.Range(0, Cell.Effects.Count).First(e => Cell.Effects[e] == effect);

    private static void Table(
        StringBuilder text,
        string title,
        IReadOnlyDictionary<Cell, IReadOnlyList<Tally>> results,
        params IReadOnlyList<(int Effect, (string Heading, Event Event)[] Columns)> parts)
    {
        var columns = parts.SelectMany(part => part.Columns.Select(column => (part.Effect, column.Heading, column.Event))).ToList();
        text.Append(CultureInfo.InvariantCulture, $"\n## {title}\n\n| errors | q | n | {string.Join(" | ", columns.Select(column => column.Heading))} |\n");
        text.Append(CultureInfo.InvariantCulture, $"|---|--:|--:|{string.Concat(columns.Select(_ => "--:|"))}\n");
        foreach (var cell in Cell.All)
        {
            var shares = columns.Select(column => Shown(cell, column.Effect, column.Event, results[cell][column.Effect].Of(column.Event)));
            text.Append(CultureInfo.InvariantCulture, $"| {cell.Law.Name} | {cell.Q} | {cell.N} | {string.Join(" | ", shares)} |\n");
        }
    }

    private static string Shown(Cell cell, int effect, Event what, Share share)
    {
        var above = what == Event.SupportedOnHc3 && effect > 0 && cell.Law.HasGoal && share.Value > SupportGoal;
        return Invariant($"{100 * share.Value:F1} ± {100 * share.Error:F1}{(above ? " above" : "")}");
    }

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
