using System.Globalization;
using System.Text;

namespace Auditor.Simulation;

/// <summary>The results of <see cref="EliminationStudy"/> as a plain table.</summary>
internal static class EliminationText
{
    public static string Of(IReadOnlyList<(EliminationCell Cell, EliminationTally Tally)> results, RunFacts run)
    {
        var text = new StringBuilder("# Groups that a rule of backward elimination left out: plain test and p given the rule\n\n");
        text.Append(CultureInfo.InvariantCulture, $"{run.Draws} data sets a cell, seed {run.Seed}. Written by `dotnet run -c Release --project tests/Auditor.Simulation -- elimination --write`; what is simulated: README.md.\n");
        text.Append("Shares in per cent at level 0.05, of the reports in which the rule dropped the tested group and kept the needed terms; Monte Carlo standard error in brackets.\n");
        text.Append("Effect: the group's first coefficient in standard errors of the largest model, about. Uniform: Kolmogorov and Smirnov's distance of the selective p from uniform, and its p.\n\n");
        text.Append("| rule | columns | effect | reports | plain F rejects | selective p rejects | distance from uniform | its p |\n|---|---|---|---|---|---|---|---|\n");
        foreach (var (cell, tally) in results)
        {
            var uniform = cell.Effect == 0
                ? string.Create(CultureInfo.InvariantCulture, $"{tally.Distance:0.0000} | {tally.DistanceP:0.00}")
                : " | ";
            text.Append(CultureInfo.InvariantCulture, $"| {cell.Rule.Name} | {cell.Columns} | {cell.Effect} | {tally.Reports} | {Percent(tally.Plain)} | {Percent(tally.Selective)} | {uniform} |\n");
        }

        return text.ToString();
    }

    private static string Percent(Share share) => string.Create(CultureInfo.InvariantCulture, $"{100 * share.Value:0.0} ({100 * share.Error:0.0})");
}
