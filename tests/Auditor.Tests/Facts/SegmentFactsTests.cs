using Auditor.Facts;
using Auditor.Results;

namespace Auditor.Tests.Facts;

public sealed class SegmentFactsTests
{
    private static readonly IReadOnlyList<FactSet> Sets = [.. SegmentFacts.From([Samples.Divided, Samples.Divided with { Group = "slope" }], [true, false])];

    [Fact]
    public void A_division_is_spoken_of_once_and_each_group_by_part_and_difference() => Assert.Equal(
        [
            "dealer", "region",
            "engine condition by region: coast", "engine condition by region: hills", "engine condition by region",
            "slope by region: coast", "slope by region: hills", "slope by region",
        ],
        Sets.Select(set => set.Subject));

    [Fact]
    public void What_was_not_computed_says_why()
    {
        Assert.Equal([false, true, true, false, false, true, false, false], Sets.Select(set => ((FactValue.Flag)set["computed"]).Value));
        Assert.Equal(new FactValue.Text("too many dealers"), Sets[0]["why_not"]);
        Assert.Equal(new FactValue.NotComputable("7 rows"), Sets[3]["p_adjusted"]);
        Assert.Equal(new FactValue.NotComputable("one part"), Sets[4]["p"]);
        Assert.Equal(new FactValue.NotComputable("it speaks of a division of the rows, not of a group"), Sets[1]["group_verdict"]);
    }

    [Fact]
    public void The_groups_own_verdict_stands_beside_each_part()
    {
        Assert.All(Sets.Skip(2), set => Assert.Equal(new FactValue.Text(Verdicts.Inconclusive), set["group_verdict"]));
        Assert.Equal([true, true, true, false, false, false], Sets.Skip(2).Select(set => ((FactValue.Flag)set["group_p_stands"]).Value));
        Assert.Equal((new FactValue.Number(0.003), new FactValue.Number(0.006), new FactValue.Count(300)), (Sets[2]["p"], Sets[2]["p_adjusted"], Sets[2]["rows"]));
        Assert.Equal([null, null, 12, 12, 12, 12, 12, 12], Sets.Select(set => set.Line));
    }

    [Fact]
    public void Findings_name_what_the_results_name() => Assert.Equal(
        Sets.Skip(2).Take(3).Select(set => set.Subject).Order(StringComparer.Ordinal),
        Divisions.Subjects(Samples.Divided).Where(subject => subject.Contains("region", StringComparison.Ordinal)).Order(StringComparer.Ordinal));

    [Fact]
    public void Without_a_group_nothing_is_said() => Assert.Empty(SegmentFacts.From([], []));
}
