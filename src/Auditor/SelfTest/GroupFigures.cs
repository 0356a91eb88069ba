using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>Every test of one left-out group and of all groups together that the reference holds.</summary>
internal static class GroupFigures
{
    private static readonly string[] Covariances = ["HC0", "HC1", "HC2", "HC3"];

    public static IEnumerable<Figure> Of(CaseRun run) => run.IsLargest ? [] : run.Case.Groups.SelectMany(group => OfGroup(run, group)).Concat(OfAll(run));

    private static IEnumerable<Figure> OfGroup(CaseRun run, JsonElement group)
    {
        string name = group.Text("group");
        JsonElement? exact = run.Case.Exact is { } values ? values.GetProperty("group_tests").Find("group", name) : null;
        JsonElement actual = run.Record.Exclusion(name);
        return Added(name, group, exact, actual).Concat(LastInFigures.Of(run, group, actual));
    }

    private static IEnumerable<Figure> OfAll(CaseRun run) =>
        Added("all", run.Case.Values.GetProperty("all_dropped"), run.Case.Exact.Optional("all_dropped"), run.Record.AllLeftOut);

    private static IEnumerable<Figure> Added(string name, JsonElement expected, JsonElement? exact, JsonElement actual)
    {
        yield return new Figure("group df1", name, expected.Number("df1"), exact.Number("df1"), actual.Number("df1"));
        if (expected.Number("F") is null)
        {
            yield break;
        }

        yield return new Figure("group df2", name, expected.Number("df2"), exact.Number("df2"), actual.Number("df2"));
        yield return new Figure("group rss_without", name, expected.Number("rss_reduced"), exact.Number("rss_reduced"), actual.Number("rss_without"));
        yield return new Figure("group rss_with", name, expected.Number("rss_full"), exact.Number("rss_full"), actual.Number("rss_with"));
        Quantity? share = actual.GetProperty("partial_r_squared").Number("estimate");
        yield return new Figure("group partial_r_squared", name, expected.Number("partial_r2"), exact.Number("partial_r2"), share, Scales.Share);
        foreach (Figure figure in Tests(name, expected, exact, actual))
        {
            yield return figure;
        }
    }

    private static IEnumerable<Figure> Tests(string name, JsonElement expected, JsonElement? exact, JsonElement actual) =>
        TestFigures("classical", name, expected, exact, RecordView.Test(actual, "classical"))
            .Concat(Covariances.SelectMany(covariance => Robust(covariance, name, expected, exact, actual)));

    private static IEnumerable<Figure> Robust(string covariance, string name, JsonElement expected, JsonElement? exact, JsonElement actual)
    {
        JsonElement? found = RecordView.Test(actual, covariance.ToLowerInvariant());
        JsonElement robust = expected.GetProperty("robust_wald");
        JsonElement? exactTest = exact.Optional("robust_wald").Optional(covariance);
        if (robust.TryGetProperty(covariance, out JsonElement test))
        {
            return test.TryGetProperty("F", out _) ? TestFigures(covariance.ToLowerInvariant(), name, test, exactTest, found) : [Absent(covariance, name, found)];
        }

        // Too ill-conditioned for double precision: only the 100-digit values are worth comparing with.
        return exactTest is null ? [] : TestFigures(covariance.ToLowerInvariant(), name, null, exactTest, found);
    }

    /// <summary>The statistic does not exist (a row of leverage one): the record must have no test.</summary>
    private static Figure Absent(string covariance, string name, JsonElement? found) =>
        new(covariance.ToLowerInvariant() + " absent", name, null, null, found.Number("f"));

    private static IEnumerable<Figure> TestFigures(string test, string name, JsonElement? expected, JsonElement? exact, JsonElement? actual)
    {
        yield return new Figure(test + " f", name, expected.Number("F"), exact.Number("F"), actual.Number("f"), Scales.Share);
        yield return new Figure(test + " p", name, expected.Number("p", "log10_p"), exact.Number("p"), actual.Number("p", "log10_p"));
    }
}
