using System.Text;
using Auditor.Data;
using Auditor.Design;

namespace Auditor.Tests.Design;

/// <summary>The declared structure bound to the data. Expected codes by hand, from a calendar.</summary>
public sealed class StructureBindingTests
{
    private const string Csv = """
        y,x,opened,year,dealer,branch,region,grade
        1,5,2008-03-31,2010,17,b,south,A
        2,4,2008-09-01,2008,4,a,north,
        4,6,2007-12-31,2009,17,a,north,B
        3,9,2008-01-01,2008,4,b,south,B
        6,1,2008-09-30,2010,23,c,north,A
        5,2,,2011,4,c,south,A
        7,7,2008-02-29,2012,,a,north,C
        8,3,2008-07-01,2012,17,,south,C
        """;

    [Fact]
    public void Clusters_units_and_periods_are_numbered_in_order_of_their_values()
    {
        var structure = Bound("time: opened, period: quarter, unit: dealer, cluster: branch").Among(new RowSubset([0, 1, 2, 3, 4]));

        Assert.Equal([1, 0, 0, 1, 2], structure.Clusters!.Classes.Codes);
        Assert.Equal(["a", "b", "c"], Labels(structure.Clusters));
        Assert.Equal([1, 0, 1, 0, 2], structure.Units!.Classes.Codes);
        Assert.Equal(["4", "17", "23"], Labels(structure.Units));
        Assert.Equal([1, 2, 0, 1, 2], structure.Periods!.Classes.Codes);
        Assert.Equal(["2007-Q4", "2008-Q1", "2008-Q3"], Labels(structure.Periods));
        Assert.Equal([2, 2, 1], structure.Clusters.Sizes());
    }

    [Fact]
    public void Codes_are_made_anew_for_every_set_of_rows()
    {
        var structure = Bound("time: opened, period: quarter, cluster: branch").Among(new RowSubset([1, 4]));

        Assert.Equal([0, 1], structure.Clusters!.Classes.Codes);
        Assert.Equal(["a", "c"], Labels(structure.Clusters));
        Assert.Equal([0, 0], structure.Periods!.Classes.Codes);
        Assert.Equal(["2008-Q3"], Labels(structure.Periods));
    }

    [Theory]
    [InlineData("day", new[] { "2007-12-31", "2008-01-01", "2008-03-31", "2008-09-01", "2008-09-30" }, new[] { 2, 3, 0, 1, 4 })]
    [InlineData("week", new[] { "2008-W01", "2008-W14", "2008-W36", "2008-W40" }, new[] { 1, 2, 0, 0, 3 })]
    [InlineData("month", new[] { "2007-12", "2008-01", "2008-03", "2008-09" }, new[] { 2, 3, 0, 1, 3 })]
    [InlineData("year", new[] { "2007", "2008" }, new[] { 1, 1, 0, 1, 1 })]
    public void Periods_are_calendar_periods(string period, string[] labels, int[] codes)
    {
        var periods = Bound($"time: opened, period: {period}").Among(new RowSubset([0, 1, 2, 3, 4])).Periods!;

        Assert.Equal(labels, Labels(periods));
        Assert.Equal(codes, periods.Classes.Codes);
    }

    [Fact]
    public void Without_a_period_each_date_and_each_number_is_one()
    {
        Assert.Equal([2, 3, 0, 1, 4], Bound("time: opened").Among(new RowSubset([0, 1, 2, 3, 4])).Periods!.Classes.Codes);
        var years = Bound("time: year").Among(new RowSubset([0, 1, 2, 3, 4])).Periods!;
        Assert.Equal([2, 0, 1, 0, 2], years.Classes.Codes);
        Assert.Equal(["2008", "2009", "2010"], Labels(years));
    }

    [Fact]
    public void The_files_own_order_is_the_place_within_the_unit()
    {
        Assert.Equal([0, 1, 2], Bound("time: {file_order: true}").Among(new RowSubset([1, 4, 6])).Periods!.Classes.Codes);
        var structure = Bound("time: {file_order: true}, unit: dealer").Among(new RowSubset([0, 1, 2, 3, 4, 5, 7]));
        Assert.Equal([0, 0, 1, 1, 0, 2, 2], structure.Periods!.Classes.Codes);
        Assert.Equal(["1", "2", "3"], Labels(structure.Periods));
        Assert.Equal([1, 3, 5, 0, 2, 6, 4], structure.Order!.Positions);
    }

    [Fact]
    public void Rows_in_time_order_stand_by_unit_then_time_then_place_in_the_file()
    {
        var quarters = Bound("time: opened, period: quarter").Among(new RowSubset([0, 1, 2, 3, 4])).Order!;
        Assert.Equal([2, 3, 0, 1, 4], quarters.Positions);
        Assert.Equal((1, 2, 1L), (quarters.Series, quarters.TiedRows, quarters.MissingPeriods));

        var units = Bound("time: year, unit: dealer").Among(new RowSubset([0, 1, 2, 3, 4, 5])).Order!;
        Assert.Equal([1, 3, 5, 2, 0, 4], units.Positions);
        Assert.Equal((3, 1, 2L), (units.Series, units.TiedRows, units.MissingPeriods));

        var days = Bound("time: opened").Among(new RowSubset([0, 1, 2])).Order!;
        Assert.Equal([2, 0, 1], days.Positions);
        Assert.Null(days.MissingPeriods);
    }

    [Fact]
    public void The_first_part_of_a_split_goes_up_to_and_includes_the_row_or_the_value()
    {
        var all = new RowSubset([0, 1, 2, 3, 4, 5, 6, 7]);

        Assert.Equal([true, true, true, false, false, false, false, false], Bound("split: {row: 3}").Among(all).Split!.InFirst);
        var dates = Bound("split: {column: opened, at: 2008-03-31}").Among(all).Split!;
        Assert.Equal([true, false, true, true, false, false, true, false], dates.InFirst);
        Assert.Equal((4, 3, 1), (dates.First, dates.Second, dates.WithoutPlace));
        Assert.Equal([false, true, true, true, false, false, false, false], Bound("split: {column: year, at: 2009}").Among(all).Split!.InFirst);
        Assert.Equal([true, false], Bound("split: {row: 3}").Among(new RowSubset([2, 7])).Split!.InFirst);
    }

    [Fact]
    public void Segments_are_coded_and_a_row_without_a_value_is_in_none()
    {
        var segments = Bound("segments: [region, grade]").Among(new RowSubset([0, 1, 2, 3])).Segments;

        Assert.Equal(["region", "grade"], segments.Select(segment => segment.Name));
        Assert.Equal([1, 0, 0, 1], segments[0].Codes);
        Assert.Equal([0, -1, 1, 1], segments[1].Codes);
        Assert.Equal(["A", "B"], Labels(segments[1]));
        Assert.Equal([1, 2], segments[1].Sizes());
        var one = Assert.Single(Bound("segments: region").Among(new RowSubset([0, 1, 2, 3])).Segments);
        Assert.Equal(segments[0].Codes, one.Codes);
    }

    [Fact]
    public void Nothing_declared_is_nothing_bound()
    {
        var structure = Bound("row_label: region").Among(new RowSubset([0, 1]));

        Assert.Equal((null, null, null, null, null), (structure.Clusters, structure.Units, structure.Periods, structure.Order, structure.Split));
        Assert.Empty(structure.Segments);
    }

    [Fact]
    public void A_row_without_time_unit_or_cluster_is_incomplete_and_counted_by_column()
    {
        var record = AuditRunner.Record(Yaml("time: opened, unit: dealer, cluster: branch, segments: [grade], split: {column: x, at: 4}", "x"), Open(Csv));

        Assert.Equal((8, 3, 5), (record.Rows.Read, record.Rows.Incomplete, record.Rows.Used));
        Assert.Equal(
            ["y 0", "x 0", "opened 1", "dealer 1", "branch 1"],
            record.Rows.MissingByColumn.Select(pair => $"{pair.Key} {pair.Value}"));
        Assert.Empty(record.Rows.ColumnsNobodyMentions.Except(["year", "region"]));
    }

    [Fact]
    public void A_gap_before_a_row_makes_it_incomplete_by_the_terms_own_name()
    {
        var rows = AuditRunner.Record(Yaml("time: year, keep: [{column: year, from: 2009}]", "{lag: {of: x, by: 1}}"), Open("y,x,year\n1,5,2008\n2,4,2009\n4,6,2010\n3,9,2012\n6,1,2013\n5,0,2014\n7,3,2015\n")).Rows;

        Assert.Equal((7, 1, 1, 0, 5), (rows.Read, rows.FilteredOut, rows.Incomplete, rows.Undefined, rows.Used));
        Assert.Equal(["y 0", "year 0", "lag(x, 1) 1"], rows.MissingByColumn.Select(pair => $"{pair.Key} {pair.Value}"));
        var logs = AuditRunner.Record(Yaml("time: year", "{lag: {of: {log: x}, by: 1}}"), Open("y,x,year\n1,5,2008\n2,4,2009\n4,6,2010\n3,9,2012\n6,1,2013\n5,0,2014\n7,3,2015\n")).Rows;
        Assert.Equal((2, 1, 4), (logs.Incomplete, logs.Undefined, logs.Used));
        Assert.Equal(["lag(log(x), 1) 1"], logs.UndefinedByTerm.Select(pair => $"{pair.Key} {pair.Value}"));
    }

    [Theory]
    [InlineData("time: region", "data.time: column region holds levels, time is dates (YYYY-MM-DD) or numbers: declare kind: date or kind: number for it, or say {file_order: true}")]
    [InlineData("time: year, period: month", "data.period: column year holds numbers, which step by 1; a period is for dates: leave it out, or declare kind: date for the column")]
    [InlineData("cluster: region, keep: [{column: region, equals: north}]", "data.cluster: every kept row has region north, and rows of one cluster cannot be compared with others: leave cluster out, or name another column")]
    [InlineData("time: year, unit: half", "data.unit: column half has 2.5 in row 2, which looks like a measurement; if such numbers are names, declare kind: levels for it under data.columns")]
    [InlineData("cluster: half", "data.cluster: column half has 2.5 in row 2, which looks like a measurement; if such numbers are names, declare kind: levels for it under data.columns")]
    [InlineData("segments: [half]", "data.segments: column half has 2.5 in row 2, which looks like a measurement; if such numbers are names, declare kind: levels for it under data.columns")]
    [InlineData("cluster: late, keep: [{column: year, to: 2002}]", "data.cluster: column late has no value on the kept rows")]
    [InlineData("time: late, keep: [{column: year, to: 2002}]", "data.time: column late has no value on the kept rows")]
    [InlineData("split: {row: 4}", "data.split: the first part ends at row 4, and the data have 4 rows: nothing is left for the second part")]
    [InlineData("split: {row: 3}, keep: [{column: year, to: 2003}]", "data.split: the first part ends at row 3, which leaves no kept row in the second part")]
    [InlineData("split: {column: year, at: 1999}", "data.split: the first part ends at year 1999, which leaves no kept row in the first part; year runs from 2001 to 2004 there")]
    [InlineData("split: {column: opened, at: 2008-09-30}", "data.split: the first part ends at opened 2008-09-30, which leaves no kept row in the second part; opened runs from 2008-01-01 to 2008-09-30 there")]
    [InlineData("split: {column: region, at: 3}", "data.split: column region holds levels, a split needs dates or numbers, or a row; to test every group in each of its values, use data.segments: [region]")]
    [InlineData("split: {column: year, at: 2008-09-30}", "data.split: column year holds numbers, found '2008-09-30'")]
    [InlineData("split: {column: opened, at: 2008}", "data.split: column opened holds dates, found '2008', expected YYYY-MM-DD")]
    [InlineData("time: year, serial_lag: 4", "data.serial_lag: 4 periods back, and the kept rows have 4 periods; expected at most 3")]
    public void What_cannot_be_is_said_with_its_line(string structure, string message)
    {
        const string csv = "y,x,opened,year,half,region,late\n1,5,2008-01-01,2001,1,north,\n2,4,2008-03-01,2002,2.5,south,\n4,6,2008-06-01,2003,3,north,a\n3,9,2008-09-30,2004,4,south,b\n";

        Assert.Equal(["declaration.yaml:3: " + message], Problems(structure, csv));
    }

    [Fact]
    public void Everything_wrong_with_the_structure_is_said_at_once_and_a_lag_adds_nothing()
    {
        var reading = AuditRunner.Try(
            "audit: 1\nmodel: {id: s}\ndata:\n  source: data.csv\n  time: region\n  split: {row: 99}\n  cluster: half\nresponse: y\nfinal_model: {terms: [{lag: {of: x, by: 1}}]}\n",
            Open("y,x,region,half\n1,2,a,0.5\n2,3,b,1\n"));

        Assert.Equal(["5: data.time", "6: data.split", "7: data.cluster"], reading.Problems.Select(problem => $"{problem.Line}: {problem.Message.Split(':')[0]}"));
    }

    [Fact]
    public void Two_rows_of_one_period_stop_terms_that_look_back_and_nothing_else()
    {
        const string csv = "y,x,year\n1,5,2001\n2,4,2001\n4,6,2002\n3,9,2003\n6,2,2004\n";

        Assert.Equal(
            ["declaration.yaml:3: data.time: rows 1 and 2 both lie in 2001; lag, change and moving_average need one row for each period (or is data.unit missing?)"],
            [.. AuditRunner.Try(Yaml("time: year, keep: [{column: year, from: 2002}]", "{lag: {of: x, by: 1}}, {change: {of: x, by: 1}}"), Open(csv)).Problems.Select(problem => problem.ToString())]);
        Assert.Empty(Problems("time: year", csv));
    }

    private static string[] Problems(string structure, string csv) =>
        [.. AuditRunner.Try(Yaml(structure, "x"), Open(csv)).Problems.Select(problem => problem.ToString())];

    private static string Yaml(string structure, string terms) =>
        $"audit: 1\nmodel: {{id: s}}\ndata: {{source: data.csv, {structure}}}\nresponse: y\nfinal_model: {{terms: [{terms}]}}\n";

    private static Func<string, Stream> Open(string csv) => _ => new MemoryStream(Encoding.UTF8.GetBytes(csv));

    private static BoundStructure Bound(string structure)
    {
        var inputs = AuditRunner.Inputs(Yaml(structure, "x"), Open(Csv)).Value!;
        var reading = ModelBinder.Bind(inputs.Declaration, inputs.Table);
        Assert.Empty(reading.Problems);
        return reading.Value!.Model.Structure;
    }

    private static IEnumerable<string> Labels(RowGroups groups) => Enumerable.Range(0, groups.Count).Select(groups.Label);
}
