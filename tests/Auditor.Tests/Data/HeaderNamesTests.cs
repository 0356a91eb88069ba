using System.Text;
using Auditor.Data;
using Auditor.Declaration;
using Auditor.Tests.Declaration;

namespace Auditor.Tests.Data;

/// <summary>Blank and repeated column names do no harm until someone asks for them.</summary>
public sealed class HeaderNamesTests
{
    [Fact]
    public void Row_numbers_without_a_name_are_let_pass()
    {
        var reading = CsvText.Read("\"\",\"price\",\"age\"\n\"1\",10,3\n\"2\",20,4\n", new ColumnRequest("price", null), new ColumnRequest("age", null));

        Assert.Empty(reading.Problems);
        Assert.Equal(["", "price", "age"], reading.Value!.SourceColumns);
        Assert.Equal([10, 20], reading.Value.Numbers("price"));
        Assert.Equal([3, 4], reading.Value.Numbers("age"));
    }

    [Fact]
    public void Names_that_stand_twice_are_let_pass_until_one_is_wanted()
    {
        const string Text = "note,price,note\na,10,b\n";

        Assert.Equal([10], CsvText.Read(Text, new ColumnRequest("price", null)).Value!.Numbers("price"));
        Assert.Equal(
            ["leases.csv:1: the header names 'note' more than once, in columns 1 and 3"],
            CsvText.Words(CsvText.Read(Text, new ColumnRequest("price", null), new ColumnRequest("note", null))));
    }

    [Fact]
    public void The_record_lists_a_column_without_a_name_by_its_place()
    {
        var declaration = Declared.With("response: loss", "final_model: {terms: [price]}");
        var data = "\"\",loss,price,  ,note,note\n" + string.Concat(Enumerable.Range(1, 9).Select(i => $"{i},{i * i % 7},{i},x,y,z\n"));
        var record = AuditRunner.Record(declaration, _ => new MemoryStream(Encoding.UTF8.GetBytes(data)));

        Assert.Equal(["column 1 (no name)", "column 4 (no name)", "note", "note"], record.Rows.ColumnsNobodyMentions);
    }

    [Fact]
    public void A_declaration_that_names_a_repeated_column_is_told_where_and_no_blank_name_is_suggested()
    {
        var reading = Declared.Read("response: loss", "final_model: {terms: [prise]}");

        Assert.Equal(
            [
                "lease.yaml:4: response: the header names 'loss' more than once, in columns 2 and 4; rename one of them in the data",
                "lease.yaml:5: final_model.terms: the data have no column 'prise'; known: loss, kilometres",
            ],
            ColumnCheck.Problems(Declared.File, reading.Mentions, ["", "loss", "kilometres", "loss"]).Select(problem => problem.ToString()));
    }
}
