using Auditor.Data;
using Auditor.Facts;

namespace Auditor.Tests.Facts;

public sealed class ColumnFactsTests
{
    private static readonly int[] FirstFive = [0, 1, 2, 3, 4];

    [Fact]
    public void Codes_in_a_number_column_are_whole_and_few()
    {
        var facts = Facts(new NumberColumn("district", [1, 2, 3, double.NaN, 2, 7.5]));

        Assert.Equal(new FactValue.Count(3), facts["distinct_values"]);
        Assert.Equal(new FactValue.Flag(true), facts["whole_numbers"]);
        Assert.Equal(new FactValue.Text("number"), facts["kind"]);
        Assert.Equal(new FactValue.Flag(false), facts["one_value"]);
    }

    [Fact]
    public void Only_the_kept_rows_count()
    {
        var facts = ColumnFacts.From(ColumnInputs.Of(new NumberColumn("district", [1, 1, 2.5]), [0, 1], true, true, null, 9));

        Assert.Equal(new FactValue.Flag(true), facts["one_value"]);
        Assert.Equal(new FactValue.Flag(true), facts["whole_numbers"]);
        Assert.Equal(9, facts.Line);
    }

    [Fact]
    public void Declared_levels_without_a_row_are_named_in_declared_order()
    {
        var column = new LevelsColumn("grade", [0, 1, -1, 0, 0], ["B", "A"]);
        var facts = ColumnFacts.From(ColumnInputs.Of(column, FirstFive, false, true, ["D", "A", "B", "C"], null));

        Assert.Equal(new FactValue.Text("D, C"), facts["absent_levels"]);
        Assert.Equal(new FactValue.Count(2), facts["distinct_values"]);
    }

    [Fact]
    public void Dates_and_text_are_counted_too()
    {
        Assert.Equal(new FactValue.Count(2), Facts(new DateColumn("opened", [5, 5, 6, DateColumn.Missing, 5]))["distinct_values"]);
        Assert.Equal(new FactValue.Count(2), Facts(new TextColumn("lease", ["a", null, "b", "a", "a"]))["distinct_values"]);
    }

    [Fact]
    public void Counting_stops_where_it_tells_nothing_more()
    {
        var facts = ColumnFacts.From(ColumnInputs.Of(
            new NumberColumn("price", [.. Enumerable.Range(0, 5000).Select(at => (double)at)]), [.. Enumerable.Range(0, 5000)], true, true, null, null));

        Assert.Equal(new FactValue.Count(ColumnInputs.MostDistinct), facts["distinct_values"]);
    }

    [Fact]
    public void A_column_nobody_mentions_was_not_read()
    {
        var facts = ColumnFacts.From(ColumnInputs.NobodyMentions("memo"));

        Assert.Equal(new FactValue.Flag(false), facts["mentioned"]);
        Assert.Equal(new FactValue.NotComputable("the column was not read: nobody mentions it"), facts["kind"]);
    }

    private static FactSet Facts(DataColumn column) => ColumnFacts.From(ColumnInputs.Of(column, FirstFive, true, true, null, null));
}
