using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The computed tests of one group, each with the question it answers.</summary>
internal static class TestTable
{
    public static ReportTable Of(Exclusion exclusion, double level) => ReportTable.Of(
        $"Tests of {exclusion.Group}",
        Lines(exclusion),
        new("Test", "text", line => Cell.Words(line.IsBasis ? line.Words.Title + " (the verdict rests on it)" : line.Words.Title)),
        new("F", "number", line => Cell.Number(line.Test.F, line.Test.Why)),
        new("on df", "number", line => Cell.Df(line.Test.Df1, line.Test.Df2, line.Why)),
        new("p", "number", line => Cell.Probability(line.Test.P, line.Test.Log10P, level, line.Test.Why)),
        new("What it answers", "text", line => Cell.Words(line.Words.Answers + line.Accuracy)));

    private static Line[] Lines(Exclusion exclusion)
    {
        Line[] named = [.. Named(exclusion)];
        return BasisApart(exclusion) is { } apart ? [.. named.Take(1).Append(apart).Concat(named.Skip(1)).Select(line => line with { IsBasis = line == apart })] : named;
    }

    /// <summary>The basis where it sums over another variable than the declared cluster, and so is none of the tests that have names.</summary>
    private static Line? BasisApart(Exclusion exclusion) =>
        exclusion is { Basis: "cluster", BasisTest: { } test, BasisClustersOn: { } variable } && exclusion.Tests.Cluster?.F != test.F
            ? new(new TestWords("cluster", $"Score form by {variable}", "The same, when the group does not vary within one value of it."), test, "", test.Why)
            : null;

    private static IEnumerable<Line> Named(Exclusion exclusion) =>
        from words in TestWords.All
        let line = words.Name switch
        {
            "permutation" => Resampled(exclusion.Tests.Permutation, words),
            "wild_bootstrap" => Resampled(exclusion.Tests.WildBootstrap, words),
            _ => Plain(exclusion.Tests, words),
        }
        where line is not null
        select line with { IsBasis = words.Name == exclusion.Basis };

    private static Line? Plain(GroupTests tests, TestWords words) =>
        Figures(tests, words.Name) is { } test ? new(words, test, "", test.Why) : null;

    private static Line? Resampled(PermutationFigures? test, TestWords words) => test is null ? null : new(
        words,
        new TestFigures(test.F, null, null, test.P),
        $" p lies between {NumberText.Number(test.PLower ?? 0)} and {NumberText.Number(test.PUpper ?? 1)} after {NumberText.Count(test.Draws)} draws.",
        "Resampling has no degrees of freedom.");

    private static TestFigures? Figures(GroupTests tests, string name) => name switch
    {
        "classical" => tests.Classical,
        "hc0" => tests.Hc0,
        "hc1" => tests.Hc1,
        "hc2" => tests.Hc2,
        "hc3" => tests.Hc3,
        "score" => tests.Score,
        "cluster" => tests.Cluster,
        "cr1" => tests.Cr1,
        "cr2" => tests.Cr2,
        "time" => tests.Time,
        "newey_west" => tests.NeweyWest,
        "time_unrestricted" => tests.TimeUnrestricted,
        "last_in" => tests.LastIn,
        "largest_model_denominator" => tests.LargestModelDenominator,
        _ => throw new ArgumentOutOfRangeException(nameof(name), name, "not a test"),
    };

    private sealed record Line(TestWords Words, TestFigures Test, string Accuracy, string? Why)
    {
        public bool IsBasis { get; init; }
    }
}
