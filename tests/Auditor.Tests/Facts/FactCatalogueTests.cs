using Auditor.Facts;
using Auditor.Results;

namespace Auditor.Tests.Facts;

public sealed class FactCatalogueTests
{
    [Fact]
    public void Names_are_snake_case_and_unique_within_a_family_and_every_fact_has_a_meaning()
    {
        Assert.True(FactCatalogue.All.Count > 90, $"{FactCatalogue.All.Count} facts");
        Assert.Equal(FactCatalogue.All.Count, FactCatalogue.All.Select(fact => (fact.About, fact.Name)).Distinct().Count());
        Assert.All(FactCatalogue.All, fact => Assert.Matches("^[a-z][a-z0-9_]*$", fact.Name));
        Assert.All(FactCatalogue.All, fact => Assert.EndsWith(".", fact.Meaning, StringComparison.Ordinal));
    }

    [Fact]
    public void Every_kind_of_subject_has_its_word()
    {
        Assert.Equal(Enum.GetValues<About>().Length, AboutWords.All.Count);
        Assert.All(Enum.GetValues<About>(), about => Assert.Equal(about, AboutWords.Parse(about.Word())));
        Assert.Null(AboutWords.Parse("exclusions"));
        Assert.Equal("all_left_out", About.AllLeftOut.Word());
    }

    [Fact]
    public void A_fact_set_gives_exactly_the_listed_facts_with_the_listed_types()
    {
        FactSet[] sets =
        [
            ExclusionFacts.From(Samples.Tested with { OtherRowSet = new OtherRowSetFigures(1, 1, 1, 1, 1, "supported") }, new ExclusionInputs([], []), Samples.Policy()),
            AllLeftOutFacts.From(Samples.Tested, [], 480, Samples.Policy()),
            FitFacts.From("m", Samples.Fit, new FitInputs(false, 1, Samples.Influence, Samples.Collinearity)),
            RowFacts.From("m", Samples.Rows, Samples.Structure),
            ColumnFacts.From(ColumnInputs.NobodyMentions("memo")),
            CheckFacts.From(new CheckResult("reset", 2, 2, 400, 0.1, "form", false, null)),
            ClaimFacts.From(new ClaimResult("reported.f", "F of the whole model", "2.1", 2.1, ClaimOutcomes.Agrees) { Kind = ClaimKinds.F }, []),
            StepFacts.From(new StepResult(1, "engine condition", 1.2, 2, 400, 0.3, false, null)),
            CoefficientFacts.From(new CoefficientFigures("price", 1, 1, 1, 0.3, null, -1, 3, null)),
            AcceptanceFacts.From(Samples.Standing),
            SegmentFacts.From([Samples.Divided], [true]).Last(),
        ];

        Assert.Equal(FactCatalogue.All.Count, sets.Sum(set => set.Values.Count));
        Assert.All(sets, set => Assert.Equal(FactCatalogue.Of(set.About).Select(fact => fact.Name), set.Values.Keys));
        Assert.All(sets, set => Assert.All(set.Values, pair => AssertType(FactCatalogue.Find(set.About, pair.Key)!.Type, pair.Value)));
    }

    [Fact]
    public void A_value_that_is_not_finite_is_no_value() =>
        Assert.Equal(new FactValue.NotComputable("the value is not finite"), FactValue.Of(double.NaN, "why"));

    private static void AssertType(FactType type, FactValue value) => Assert.True(
        value is FactValue.NotComputable || type == value switch
        {
            FactValue.Number => FactType.Number,
            FactValue.Count => FactType.Count,
            FactValue.Text => FactType.Text,
            _ => FactType.Flag,
        });
}
