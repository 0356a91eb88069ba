using System.Globalization;
using System.Text;
using Auditor.Numerics.Random;
using Auditor.Reporting;
using Auditor.Reporting.Html;
using Auditor.Results;

namespace Auditor.Tests.Analysis;

/// <summary>What the record says of the basis under declared dependence, in whole audits of made-up panels: dealers observed over quarters.</summary>
public sealed class DependenceOfGroupsTests
{
    [Fact]
    public void A_group_that_does_not_vary_within_a_unit_names_the_unit_as_its_clusters()
    {
        var exclusion = Panel("time: quarter, unit: dealer", "size").Exclusions[0];
        Assert.Equal(("cluster", "unit", "dealer"), (exclusion.Basis, exclusion.Level, exclusion.BasisClustersOn));
        Assert.Null(exclusion.Tests.Cluster);
        Assert.Equal(exclusion.P, exclusion.BasisTest!.P);
        Assert.Equal((1, 23), (exclusion.BasisTest.Df1, exclusion.BasisTest.Df2));
        Assert.Equal(24, exclusion.EffectiveClusters!.Value, 24 * 0.9);
        Assert.Contains("test over 24 units: F = ", exclusion.Reason, StringComparison.Ordinal);
        Assert.Contains("Score form by dealer (the verdict rests on it)", Text(TestTable.Of(exclusion, 0.05)), StringComparison.Ordinal);
    }

    [Fact]
    public void A_declared_cluster_names_itself_and_its_test_is_the_one_beside()
    {
        var exclusion = Panel("time: quarter, unit: dealer, cluster: dealer", "z").Exclusions[0];
        Assert.Equal(("cluster", "row", "dealer"), (exclusion.Basis, exclusion.Level, exclusion.BasisClustersOn));
        Assert.Equal(exclusion.Tests.Cluster, exclusion.BasisTest);
        Assert.Null(Panel("time: quarter", "z").Exclusions[0].BasisClustersOn);
    }

    [Fact]
    public void Clusters_that_cut_units_apart_are_a_finding_and_coarser_ones_are_not()
    {
        var apart = Panel("time: quarter, unit: dealer, cluster: office", "z");
        Assert.Contains(apart.Findings, finding => finding.Rule == "structure-clusters-split-units" && finding.Message.StartsWith("24 of the 24 units", StringComparison.Ordinal));
        Assert.DoesNotContain(Panel("time: quarter, unit: dealer, cluster: region", "z").Findings, finding => finding.Rule == "structure-clusters-split-units");
    }

    [Theory]
    [InlineData("time: day", true)]
    [InlineData("time: day, period: month", false)]
    [InlineData("time: day, period: day", false)]
    [InlineData("time: quarter", false)]
    [InlineData("cluster: dealer", false)]
    public void Dates_without_a_period_are_a_finding(string data, bool found)
    {
        var record = Panel(data, "z");
        var finding = record.Findings.SingleOrDefault(finding => finding.Rule == "structure-days-as-periods");
        Assert.Equal(found, finding is not null);
        Assert.True(finding is null || finding.Message.Contains("each of the 144 days", StringComparison.Ordinal), finding?.Message);
    }

    [Fact]
    public void More_clusters_than_CR2_is_computed_for_are_said_in_the_reason()
    {
        var text = new StringBuilder("y,x,z,pair\n");
        var random = new Generator(3);
        for (var i = 0; i < 10_002; i++)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"{random.Normal():R},{random.Normal():R},{random.Normal():R},{i / 2}");
        }

        var exclusion = Record("cluster: pair", "z", text.ToString()).Exclusions[0];
        Assert.Equal("more clusters than this form is computed for", exclusion.TestsNotComputed["cr2"]);
        Assert.EndsWith("rest on CR1, because clusters and columns, over all groups together, are more than CR2 is computed for", exclusion.BasisReason, StringComparison.Ordinal);
        Assert.NotNull(exclusion.PartialRSquared.BasisUpper);
        Assert.DoesNotContain("CR1", Panel("cluster: dealer", "z").Exclusions[0].BasisReason, StringComparison.Ordinal);
    }

    [Fact]
    public void On_few_degrees_of_freedom_no_effect_is_called_negligible()
    {
        var few = Panel("time: quarter", "z", "negligible_partial_r_squared: 0.9").Exclusions[0];
        Assert.Equal((2.0, Verdicts.Inconclusive, null), (few.BasisTest!.Df2, few.Verdict, few.Negligible.P));
        const string why = "the covariance rests on 2 degrees of freedom, and on fewer than 5 no effect is called negligible (policy negligible_df)";
        Assert.Equal(why, few.Negligible.Why);
        Assert.Contains(why, few.Reason, StringComparison.Ordinal);
        Assert.Equal(Materialities.NotShown, few.Materiality);
        var allowed = Panel("time: quarter", "z", "negligible_partial_r_squared: 0.9\nnegligible_df: 2").Exclusions[0];
        Assert.Equal((Verdicts.Supported, Materialities.ShownNegligible), (allowed.Verdict, allowed.Materiality));
    }

    /// <summary>Two forms stand behind a mixture; the fewer degrees of freedom count whichever of them sizes the effect.</summary>
    [Fact]
    public void A_mixture_is_held_to_the_form_with_fewer_degrees_of_freedom()
    {
        var exclusion = Record("time: quarter, unit: dealer", "size, macro", LargePanel()).Exclusions[0];
        Assert.Equal("several", exclusion.Level);
        Assert.Equal("clusters", exclusion.Power.CountedIn);
        Assert.Null(exclusion.Negligible.P);
        Assert.NotEqual(Materialities.ShownNegligible, exclusion.Materiality);
        Assert.Contains("no effect is called negligible", exclusion.Negligible.Why, StringComparison.Ordinal);
        var difference = exclusion.InParts[0].Difference;
        Assert.Equal(difference.Test!.Df2 > 100 ? "cluster" : "time", difference.Basis);
    }

    [Fact]
    public void A_group_that_cannot_be_rejected_in_a_part_is_no_member_of_the_family_there()
    {
        var halves = Panel("time: quarter, unit: dealer, cluster: dealer", "macro").Exclusions[0].InParts[0];
        Assert.Contains(halves.Parts, part => part.Test!.CeilingP > 0.05);
        Assert.All(halves.Parts.Where(part => part.Test!.CeilingP > 0.05), part =>
        {
            Assert.Null(part.PAdjusted);
            Assert.Null(part.PartialRSquared.BasisUpper);
            Assert.StartsWith("the test cannot reach the level 0.05 here: as the effect grows without limit, it ends at p = ", part.Why, StringComparison.Ordinal);
        });
    }

    [Fact]
    public void A_rejection_that_the_number_of_groups_takes_back_is_not_called_no_effect()
    {
        const string groups = "{group: first, terms: [z]}, {group: second, terms: [other]}";
        var least = Record("cluster: dealer", groups, Csv(), named: true).Exclusions.Min(exclusion => exclusion.P!.Value);
        var level = FormattableString.Invariant($"significance: {least * 1.2}\nnegligible_partial_r_squared: 0.00001");
        var exclusion = Record("cluster: dealer", groups, Csv(), level, named: true).Exclusions.MinBy(one => one.P)!;
        Assert.Equal(Verdicts.Inconclusive, exclusion.Verdict);
        Assert.StartsWith("Its test rejects by itself, but not once the number of groups is allowed for", exclusion.InShort, StringComparison.Ordinal);
    }

    [Fact]
    public void A_groups_resampling_does_not_depend_on_the_other_groups()
    {
        double P(string groups, string name) => Record("cluster: dealer", groups, Csv(), named: true).Exclusions.Single(exclusion => exclusion.Group == name).Tests.WildBootstrap!.P!.Value;
        var both = P("{group: first, terms: [z]}, {group: second, terms: [other]}", "second");
        Assert.Equal(both, P("{group: second, terms: [other]}, {group: first, terms: [z]}", "second"));
        Assert.Equal(both, P("{group: second, terms: [other]}", "second"));
        Assert.NotEqual(both, P("{group: third, terms: [other]}", "third"));
    }

    private static AuditRecord Panel(string data, string term, string policy = "") => Record(data, term, Csv(), policy);

    private static AuditRecord Record(string data, string left, string csv, string policy = "", bool named = false) => AuditRunner.Record(
        "audit: 1\nmodel: {id: panel}\ndata: {source: data.csv, columns: {pair: {kind: levels}}, " + data + "}\nresponse: y\nfinal_model: {terms: [x]}\nleft_out: ["
            + (named ? left : $"{{group: added, terms: [{left}]}}") + "]\n",
        _ => new MemoryStream(Encoding.UTF8.GetBytes(csv)),
        policy);

    /// <summary>400 dealers over 30 quarters, errors independent; size belongs to the dealer, macro to the quarter.</summary>
    private static string LargePanel()
    {
        var (random, text) = (new Generator(11), new StringBuilder("y,x,size,macro,dealer,quarter,pair\n"));
        double[] sizes = [.. Enumerable.Range(0, 400).Select(_ => random.Normal())], macro = [.. Enumerable.Range(0, 30).Select(_ => random.Normal())];
        for (var i = 0; i < 12_000; i++)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"{random.Normal():R},{random.Normal():R},{sizes[i / 30]:R},{macro[i % 30]:R},d{i / 30},{i % 30},{i}");
        }

        return text.ToString();
    }

    private static string Text(ReportTable table) => string.Join('\n', table.Rows.SelectMany(row => row).Select(cell => cell.Text));

    /// <summary>24 dealers over 12 quarters; size belongs to the dealer, an office to dealer and half of the span, a region to dealers; two dealers share a day.</summary>
    private static string Csv()
    {
        var (random, text) = (new Generator(7), new StringBuilder("y,x,z,other,size,dealer,office,region,quarter,pair,day,macro\n"));
        double[] sizes = [.. Enumerable.Range(0, 24).Select(_ => random.Normal())];
        for (var i = 0; i < 288; i++)
        {
            var (dealer, quarter) = (i / 12, i % 12);
            text.AppendLine(CultureInfo.InvariantCulture, $"{random.Normal():R},{random.Normal():R},{random.Normal():R},{random.Normal():R},{sizes[dealer]:R},d{dealer},o{dealer}-{quarter / 6},r{dealer % 6},{quarter},{i},2020-{1 + quarter:00}-{1 + (dealer / 2):00},{Math.Sin(quarter * quarter):R}");
        }

        return text.ToString();
    }
}
