using System.Globalization;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using Auditor.Reporting;

namespace Auditor.Tests.Reporting;

public sealed class JsonRecordTests
{

    [Fact]
    public void A_record_with_every_part_filled_satisfies_the_schema() => Assert.Empty(Faults(Parsed(SampleRecords.Full)));

    [Fact]
    public void A_record_of_nulls_satisfies_the_schema() => Assert.Empty(Faults(Parsed(SampleRecords.MostlyNull)));

    [Theory]
    [InlineData("findings", "severity", "severities")]
    [InlineData("exclusions", "p_adjusted", "adjusted_p")]
    [InlineData("checks", "rejects", "reject")]
    public void A_record_with_a_wrong_name_fails(string list, string name, string wrong)
    {
        JsonNode record = Parsed(SampleRecords.Full);
        JsonObject first = record[list]![0]!.AsObject();
        JsonNode? value = first[name]?.DeepClone();
        Assert.True(first.Remove(name));
        first[wrong] = value;

        Assert.NotEmpty(Faults(record));
    }

    [Theory]
    [InlineData("final_fit", "r_squared f_df1 f_df2 f_p log_likelihood condition_number trustworthy_digits")]
    [InlineData("exclusions/0/tests", "classical hc0 hc3 score cluster cr1 cr2 time newey_west permutation wild_bootstrap last_in largest_model_denominator")]
    [InlineData("exclusions/0/power", "at_bound smallest_detectable_f_squared rows_needed")]
    [InlineData("exclusions/0/partial_r_squared", "estimate lower upper basis_lower basis_upper")]
    [InlineData("influence/largest/0", "row label leverage studentised_residual cooks_distance dffits")]
    [InlineData("collinearity/terms/0", "term df gvif gvif_scaled")]
    [InlineData("rows", "read filtered_out zero_weight incomplete undefined used missing_by_column columns_nobody_mentions")]
    [InlineData("provenance", "data_sha256 declaration_sha256 rules_sha256 tool_version seed started")]
    [InlineData("final_fit/aliased/0", "column equals")]
    [InlineData("findings/1/accepted", "approved_by approved_on expires because")]
    public void Names_are_those_of_the_published_format(string path, string names)
    {
        JsonNode node = path.Split('/').Aggregate(Parsed(SampleRecords.Full), (at, step) =>
            int.TryParse(step, NumberStyles.None, CultureInfo.InvariantCulture, out int index) ? at[index]! : at[step]!);

        Assert.Empty(names.Split(' ').Except(node.AsObject().Select(pair => pair.Key)));
    }

    [Fact]
    public void Keys_of_dictionaries_stay_as_they_are() =>
        Assert.NotNull(Parsed(SampleRecords.Full)["rows"]!["undefined_by_term"]!["log(price)"]);

    [Fact]
    public void Severities_are_lower_case_and_dates_are_iso()
    {
        JsonNode accepted = Parsed(SampleRecords.Full)["findings"]![1]!;

        Assert.Equal("high", (string?)accepted["severity"]);
        Assert.Equal("2026-02-10", (string?)accepted["accepted"]!["approved_on"]);
    }

    [Fact]
    public void Every_double_comes_back_bit_for_bit()
    {
        const double awkward = 0.1 + 0.2;
        JsonNode record = Parsed(SampleRecords.Full with { FinalFit = SampleRecords.Full.FinalFit with { Rss = awkward, Sigma = 5e-324 } });

        Assert.Equal(awkward, (double)record["final_fit"]!["rss"]!);
        Assert.Equal(5e-324, (double)record["final_fit"]!["sigma"]!);
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void A_number_that_is_not_finite_is_a_fault_that_names_its_place(double value)
    {
        AuditRecord record = SampleRecords.Full with { FinalFit = SampleRecords.Full.FinalFit with { RSquared = value } };

        var fault = Assert.Throws<InvalidOperationException>(() => JsonRecord.Write(record));

        Assert.Contains("not finite", fault.Message, StringComparison.Ordinal);
        Assert.Contains("$.FinalFit.RSquared", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Lines_end_in_a_line_feed_alone_and_there_is_no_byte_order_mark()
    {
        byte[] bytes = JsonRecord.Write(SampleRecords.Full);

        Assert.Equal((byte)'{', bytes[0]);
        Assert.Equal((byte)'\n', bytes[^1]);
        Assert.DoesNotContain((byte)'\r', bytes);
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("tr-TR")]
    [InlineData("")]
    public void The_bytes_do_not_depend_on_the_culture(string culture)
    {
        byte[] here = JsonRecord.Write(SampleRecords.Full);

        Assert.Equal(here, Cultures.In(culture, () => JsonRecord.Write(SampleRecords.Full)));
    }

    private static JsonNode Parsed(AuditRecord record) => JsonNode.Parse(Encoding.UTF8.GetString(JsonRecord.Write(record)))!;

    private static List<string> Faults(JsonNode record) => RecordSchema.Faults(JsonSerializer.SerializeToElement(record));
}
