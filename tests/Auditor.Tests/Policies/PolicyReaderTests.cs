using System.Globalization;
using Auditor.Policies;

namespace Auditor.Tests.Policies;

public sealed class PolicyReaderTests
{
    private const string Base = """
        significance: 0.05
        adjustment: holm
        negligible_partial_r_squared: 0.01
        power: 0.8
        basis_without_structure: hc3
        row_set: own
        few_rows: 10
        lost_share: 0.2
        digits: 4.5
        strict: false
        """;

    public static readonly TheoryData<string, string> Refused = new()
    {
        { "signifcance: 0.01", "firm.yaml:1: unknown policy name 'signifcance'; did you mean 'significance'?" },
        { "power: 0.9\nsignificance: high", "firm.yaml:2: significance must be a number with a decimal point, found 'high'" },
        { "significance: 0,01", "firm.yaml:1: significance must be a number with a decimal point, found '0,01'" },
        { "significance: \"0.01\"", "firm.yaml:1: significance must be a number with a decimal point, found the text \"0.01\"" },
        { "significance: .nan", "firm.yaml:1: significance must be a number with a decimal point, found '.nan'" },
        { "significance: 1e400", "firm.yaml:1: significance must be a number with a decimal point, found '1e400'" },
        { "significance: 0", "firm.yaml:1: significance must be above 0 and below 0.5, found 0" },
        { "significance: 0.5", "firm.yaml:1: significance must be above 0 and below 0.5, found 0.5" },
        { "negligible_partial_r_squared: 1", "firm.yaml:1: negligible_partial_r_squared must be above 0 and below 1, found 1" },
        { "power: 1.0", "firm.yaml:1: power must be above 0 and below 1, found 1.0" },
        { "power: 0.04", "firm.yaml: power 0.04 must be above significance 0.05" },
        { "adjustment: max_t", "firm.yaml:1: adjustment 'max_t' is not built yet; use one of holm, hochberg, benjamini_hochberg, benjamini_yekutieli, none" },
        { "adjustment: closed", "firm.yaml:1: adjustment 'closed' is not built yet; use one of holm, hochberg, benjamini_hochberg, benjamini_yekutieli, none" },
        { "adjustment: holms", "firm.yaml:1: adjustment must be one of holm, hochberg, benjamini_hochberg, benjamini_yekutieli, none; found 'holms'; did you mean 'holm'?" },
        { "row_set: all", "firm.yaml:1: row_set must be one of own, common; found 'all'" },
        { "basis_without_structure: HC3", "firm.yaml:1: basis_without_structure must be one of hc3, classical; found 'HC3'; did you mean 'hc3'?" },
        { "lost_share: 1.5", "firm.yaml:1: lost_share must be from 0 to 1, found 1.5" },
        { "few_rows: 2.5", "firm.yaml:1: few_rows must be a whole number of 0 or more, found 2.5" },
        { "digits: -1", "firm.yaml:1: digits must be 0 or more, found -1" },
        { "strict: yes", "firm.yaml:1: strict must be true or false, found 'yes'" },
        { "row_set:", "firm.yaml:1: row_set must be one value" },
        { "row_set: [own]", "firm.yaml:1: row_set must be one value" },
        { "- row_set", "firm.yaml:1: a policy is lines of 'name: value'" },
        { "# nothing", "firm.yaml:1: the file is empty" },
        { "row_set: own\n---\nrow_set: common", "firm.yaml:2: a second document starts here; expected one document a file" },
        { "significance: 0.05\nsignificance: 0.1", "firm.yaml:2: the key 'significance' stands twice, first on line 1" },
    };

    [Fact]
    public void Shipped_values_hold_when_the_firm_has_no_file()
    {
        var policy = Read(null);

        Assert.Equal(0.05, policy.Significance);
        Assert.Equal(AdjustmentMethod.Holm, policy.Adjustment);
        Assert.Equal(0.01, policy.NegligiblePartialRSquared);
        Assert.Equal(0.8, policy.Power);
        Assert.Equal(BasisWithoutStructure.Hc3, policy.BasisWithoutStructure);
        Assert.Equal(RowSet.Own, policy.RowSet);
    }

    [Fact]
    public void A_firm_overrides_single_values_and_the_order_stays_that_of_the_shipped_file()
    {
        var policy = Read("few_rows: 25\nsignificance: 1e-2\nadjustment: benjamini_yekutieli\nrow_set: common\nbasis_without_structure: classical");

        Assert.Equal(
            ["significance", "adjustment", "negligible_partial_r_squared", "power", "basis_without_structure", "row_set", "few_rows", "lost_share", "digits", "strict", "negligible_df", "most_parts", "part_rows"],
            policy.Effective.Keys);
        Assert.Equal([0.01, "benjamini_yekutieli", 0.01, 0.8, "classical", "common", 25L, 0.2, 4.5, false, 5L, 12L, 20L], policy.Effective.Values);
        Assert.Equal(AdjustmentMethod.BenjaminiYekutieli, policy.Adjustment);
        Assert.Equal(RowSet.Common, policy.RowSet);
        Assert.Equal(BasisWithoutStructure.Classical, policy.BasisWithoutStructure);
    }

    [Theory]
    [MemberData(nameof(Refused))]
    public void A_value_that_cannot_be_used_is_a_problem_in_exact_words(string firm, string message)
    {
        var reading = PolicyReader.Read(Base, "policy.yaml", firm, "firm.yaml");

        Assert.Null(reading.Value);
        Assert.Equal([message], reading.Problems.Select(problem => problem.ToString()));
    }

    [Fact]
    public void All_problems_are_listed()
    {
        var reading = PolicyReader.Read(Base, "policy.yaml", "significance: 2\nrow_set: mine\nzeal: 1", "firm.yaml");

        Assert.Equal([1, 2, 3], reading.Problems.Select(problem => problem.Line ?? 0));
    }

    [Fact]
    public void Deep_nesting_is_refused_and_not_followed()
    {
        var problem = Assert.Single(PolicyReader.Read(Base, "policy.yaml", "power: " + new string('[', 100_000), "firm.yaml").Problems);

        Assert.Equal("firm.yaml:1: nested more than 64 levels deep", problem.ToString());
    }

    [Fact]
    public void A_fixed_name_the_base_file_lacks_has_its_default()
    {
        var policy = PolicyReader.Read("few_rows: 10", "policy.yaml", null, null).Value!;

        Assert.Equal(["few_rows", "significance", "adjustment", "negligible_partial_r_squared", "power", "basis_without_structure", "row_set", "negligible_df", "most_parts", "part_rows"], policy.Names);
        Assert.Equal((0.05, AdjustmentMethod.Holm, 0.01, 0.8), (policy.Significance, policy.Adjustment, policy.NegligiblePartialRSquared, policy.Power));
        Assert.Equal((BasisWithoutStructure.Hc3, RowSet.Own), (policy.BasisWithoutStructure, policy.RowSet));
    }

    [Fact]
    public void Every_further_threshold_is_found_by_name_with_its_type()
    {
        var policy = Read("lost_share: 0.5");

        Assert.True(policy.TryGet("lost_share", out var share));
        Assert.Equal(PolicyValue.Of(PolicyType.Share, 0.5), share);
        Assert.True(policy.TryGet("few_rows", out var count));
        Assert.Equal(PolicyType.Count, count.Type);
        Assert.False(policy.TryGet("Few_Rows", out _));
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("tr-TR")]
    public void The_culture_changes_nothing(string culture)
    {
        var before = Thread.CurrentThread.CurrentCulture;
        try
        {
            Thread.CurrentThread.CurrentCulture = new CultureInfo(culture);
            Assert.Equal(0.025, Read("significance: 0.025").Significance);
            Assert.Equal(
                "firm.yaml:1: significance must be above 0 and below 0.5, found 0.75",
                PolicyReader.Read(Base, "policy.yaml", "significance: 0.75", "firm.yaml").Problems[0].ToString());
        }
        finally
        {
            Thread.CurrentThread.CurrentCulture = before;
        }
    }

    private static Policy Read(string? firm)
    {
        var reading = PolicyReader.Read(Base, "policy.yaml", firm, "firm.yaml");
        Assert.Empty(reading.Problems);
        return reading.Value!;
    }
}
