using System.Globalization;
using System.Text;
using Auditor.Numerics.Random;
using Auditor.Reporting;
using Auditor.Results;

namespace Auditor.Tests.Analysis.Parts;

/// <summary>How rows are divided and what is said where a part cannot be tested, in whole audits of made-up rows.</summary>
public sealed class DivisionTests
{
    private const int Rows = 240;

    [Fact]
    public void A_column_with_more_values_than_the_policy_allows_is_not_divided_by()
    {
        var record = Record("segments: [many, region]");
        var (many, region) = (record.Exclusions[0].InParts[0], record.Exclusions[0].InParts[1]);
        Assert.Equal("many has 24 values in the rows that are used, more than the 12 parts that the policy allows (most_parts)", many.Why);
        Assert.Empty(many.Parts);
        Assert.Equal(many.Why, many.Difference.Why);
        Assert.Null(region.Why);
        Assert.Equal(["segment-not-divided"], record.Findings.Where(finding => finding.Subject == "many").Select(finding => finding.Rule));
        Assert.Equal(24, Record("segments: [many]", "most_parts: 24\npart_rows: 5").Exclusions[0].InParts[0].Parts.Count);
    }

    [Fact]
    public void A_part_with_few_rows_and_rows_without_a_value_are_left_aside()
    {
        var division = Record("segments: [uneven]").Exclusions[0].InParts[0];
        Assert.Equal([("a", 100), ("b", 19), ("c", 101)], division.Parts.Select(part => (part.Part, part.Rows)));
        Assert.Equal("19 rows of the group's test lie in this part, fewer than the 20 that the policy asks for (part_rows)", division.Parts[1].Why);
        Assert.Equal(2, division.Difference.PartsCompared);
        Assert.Equal(220, division.Parts.Sum(part => part.Rows));
        Assert.Equal(3, Record("segments: [uneven]", "part_rows: 19").Exclusions[0].InParts[0].Difference.PartsCompared);
    }

    [Fact]
    public void A_group_that_does_not_vary_in_a_part_has_no_test_there()
    {
        var division = Record("segments: [region]").Exclusions[1].InParts[0];
        Assert.Equal("in this part the group's columns are constant, or combinations of the final model's", division.Parts[0].Why);
        Assert.NotNull(division.Parts[1].Test);
        Assert.Equal("in fewer than two parts can the group's effect be told apart", division.Difference.Why);
    }

    [Theory]
    [InlineData("time: month", "up to month 2", "after month 2", 150)]
    [InlineData("time: {file_order: true}", "up to place 120", "after place 120", 120)]
    public void The_span_is_cut_between_periods_where_the_rows_are_nearest_to_equal(string time, string first, string second, int rows)
    {
        var division = Record(time).Exclusions[0].InParts[0];
        Assert.Equal([first, second], division.Parts.Select(part => part.Part));
        Assert.Equal([rows, Rows - rows], division.Parts.Select(part => part.Rows));
    }

    [Fact]
    public void Nothing_is_divided_where_nothing_asks_for_it() => Assert.All(Record("row_label: region").Exclusions, exclusion => Assert.Empty(exclusion.InParts));

    [Fact]
    public void The_parts_of_all_groups_are_one_family()
    {
        var parts = Record("segments: [uneven]").Exclusions.SelectMany(exclusion => exclusion.InParts[0].Parts).Where(part => part.Test is not null).ToList();
        var least = parts.MinBy(part => part.Test!.P)!;
        Assert.Equal(4, parts.Count);
        Assert.Equal(Math.Min(1, 4 * least.Test!.P!.Value), least.PAdjusted!.Value, 1e-12);
        var differences = Record("segments: [uneven]").Exclusions.Select(exclusion => exclusion.InParts[0].Difference).ToList();
        Assert.Equal(Math.Min(1, 2 * differences.Min(one => one.Test!.P!.Value)), differences.Min(one => one.PAdjusted!.Value), 1e-12);
    }

    [Fact]
    public void Sampling_weights_leave_the_robust_test_only()
    {
        var division = Record("segments: [uneven], weights: {column: w, kind: sampling}").Exclusions[0].InParts[0];
        Assert.Equal("hc3", division.Difference.Basis);
        Assert.Null(division.Difference.Classical);
        Assert.All(division.Parts.Where(part => part.Why is null), part => Assert.Null(part.Classical));
        Assert.NotNull(division.Difference.Test);
    }

    [Fact]
    public void A_part_never_changes_the_verdict()
    {
        var (with, without) = (Record("segments: [region, uneven]"), Record("row_label: region"));
        Assert.Equal(without.Exclusions.Select(exclusion => (exclusion.Verdict, exclusion.PAdjusted)), with.Exclusions.Select(exclusion => (exclusion.Verdict, exclusion.PAdjusted)));
    }

    [Fact]
    public void A_group_supported_on_all_rows_whose_effects_cancel_is_found()
    {
        var record = Record("segments: [region]", "negligible_partial_r_squared: 0.05");
        Assert.Equal(Verdicts.Supported, record.Exclusions[0].Verdict);
        Assert.Equal(
            ["segment-effect-differs-although-supported", "segment-rejected-although-supported", "segment-rejected-although-supported"],
            record.Findings.Where(finding => finding.Subject.StartsWith("opposed by region", StringComparison.Ordinal)).Select(finding => finding.Rule).Order(StringComparer.Ordinal));
        Assert.All(record.Exclusions[0].InParts[0].Parts, part => Assert.True(part.PAdjusted < 0.05));
    }

    private static AuditRecord Record(string data, string policy = "") => AuditRunner.Record(
        "audit: 1\nmodel: {id: parts}\ndata: {source: data.csv, columns: {many: {kind: levels}}, " + data + "}\nresponse: y\nfinal_model: {terms: [x]}\n"
        + "left_out:\n  - {group: opposed, terms: [z]}\n  - {group: south only, terms: [only]}\n",
        _ => new MemoryStream(Encoding.UTF8.GetBytes(Csv())),
        policy);

    /// <summary>z has an effect of +1 in the north and -1 in the south; only is 0 in the north.</summary>
    private static string Csv()
    {
        var (random, text) = (new Generator(11), new StringBuilder("y,x,z,only,region,many,uneven,month,w\n"));
        for (var i = 0; i < Rows; i++)
        {
            var (north, x, z, noise, other) = (i % 2 == 0, random.Normal(), random.Normal(), random.Normal(), random.Normal());
            var month = i < 60 ? 1 : i < 150 ? 2 : i < 190 ? 3 : 4;
            var uneven = i < 100 ? "a" : i < 119 ? "b" : i < 220 ? "c" : "";
            text.AppendLine(CultureInfo.InvariantCulture, $"{x + (north ? z : -z) + noise:R},{x:R},{z:R},{(north ? 0 : other):R},{(north ? "north" : "south")},{i % 24},{uneven},{month},{1 + (i % 3)}");
        }

        return text.ToString();
    }
}
