using System.Globalization;
using System.Text;
using Auditor.Declaration;
using Auditor.Reporting;
using Auditor.Starting;
using Auditor.Tests.Data;
using CsCheck;

namespace Auditor.Tests.Starting;

public sealed class FirstDeclarationTests
{
    private static readonly StartRequest Request = new("leases", CsvText.Name, new string('0', 64), "loss");

    [Fact]
    public void Every_kind_of_column_is_told_with_what_is_in_doubt() => Golden.Matches(Written(Motley()), "motley.yaml");

    [Fact]
    public void It_is_audited_as_it_stands()
    {
        var record = Audited(Written(Motley()), Motley());

        Assert.Equal(["price", "region", "half: empty", "yes"], record.Model.Terms);
        Assert.Equal("leases", record.Model.Id);
    }

    [Fact]
    public void Lines_in_doubt_can_be_taken_as_proposed()
    {
        var text = Written(Motley());
        foreach (var line in new[] { "columns:", "  plot: {kind: levels}", "  \"01\": {kind: levels}", "  prise: {kind: levels}" })
        {
            Assert.Contains("  # " + line, text, StringComparison.Ordinal);
            text = text.Replace("  # " + line, "  " + line, StringComparison.Ordinal);
        }

        foreach (var term in new[] { "plot", "\"01\"", "prise" })
        {
            text = text.Replace("    # - " + term + " ", "    - " + term + " ", StringComparison.Ordinal);
        }

        Assert.Equal(["price", "plot", "01", "region", "half: empty", "prise", "yes"], Audited(text, Motley()).Model.Terms);
    }

    [Fact]
    public void What_is_proposed_about_dependence_can_be_taken_as_proposed()
    {
        var text = Written(Motley());
        foreach (var line in new[] { "time: opened", "period: day", "unit: note", "cluster: note", "split: {column: opened, at: 2020-01-14}", "segments: [region]" })
        {
            Assert.Contains("\n  # " + line + " ", text, StringComparison.Ordinal);
            text = text.Replace("  # " + line + " ", "  " + line + " ", StringComparison.Ordinal);
        }

        Assert.Equal(["price", "region", "half: empty", "yes"], Audited(text, Motley()).Model.Terms);
    }

    /// <summary>Guessed from the days alone: the longest step that nearly always holds one and never two, else months, or what is shorter where they would be few.</summary>
    [Theory]
    [InlineData(366, 1, "year")]
    [InlineData(92, 1, "quarter")]
    [InlineData(31, 1, "month")]
    [InlineData(7, 1, "week")]
    [InlineData(1, 1, "day")]
    [InlineData(1, 2, "day")]
    [InlineData(92, 3, "quarter")]
    [InlineData(31, 4, "month")]
    [InlineData(9, 2, "month")]
    [InlineData(4, 2, "week")]
    [InlineData(4, 1, "month")]
    public void The_period_is_guessed_from_the_spacing(int apart, int rowsADay, string period)
    {
        var text = new StringBuilder("loss,opened,price\n");
        for (var row = 0; row < 120; row++)
        {
            text.Append(CultureInfo.InvariantCulture, $"{Wave(row)},{new DateOnly(2000, 1, 15).AddDays(row / rowsADay * apart):yyyy-MM-dd},{Wave(row * 3)}\n");
        }

        Assert.Contains($"\n  # period: {period} ", Written(text.ToString()), StringComparison.Ordinal);
    }

    /// <summary>Years step by 1 and need no period; a column that names units comes again and has many values; one for segments has few.</summary>
    [Fact]
    public void Columns_are_proposed_for_what_they_look_like()
    {
        var text = new StringBuilder("loss,year,dealer,region,exposure\n");
        for (var row = 0; row < 120; row++)
        {
            text.Append(CultureInfo.InvariantCulture, $"{Wave(row)},{2000 + (row % 9)},d{row / 9},r{row / 27},{1 + (row % 5)}\n");
        }

        var written = Written(text.ToString());
        string[] lines = ["time: year", "unit: dealer", "cluster: dealer", "split: {column: year, at: 2004}", "segments: [region]", "weights: {column: exposure, kind: precision}"];
        Assert.All(lines, line => Assert.Contains("\n  # " + line + " ", written, StringComparison.Ordinal));
        Assert.DoesNotContain("# period:", written, StringComparison.Ordinal);
        var none = Written("loss,price\n1,2\n2,4\n3,5\n4,1\n5,9\n6,3\n7,7\n8,8\n9,2\n10,4\n");
        Assert.All(["time: opened", "period: month", "unit: dealer", "split: {row: 5}"], line => Assert.Contains("\n  # " + line + " ", none, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("lose", "leases.csv: the data have no column 'lose'; did you mean 'loss'?")]
    [InlineData("region", "leases.csv: column 'region' cannot be the response: its cells are no numbers but texts such as 'north'")]
    [InlineData("always", "leases.csv: column 'always' cannot be the response: the same value, '7', in every row that has one")]
    [InlineData("never", "leases.csv: column 'never' cannot be the response: no value in any row")]
    [InlineData("prise", "leases.csv: column 'prise' cannot be the response: not all numbers: 'n/a'; put it under missing if it means no value")]
    [InlineData("twice", "leases.csv: more than one column is called 'twice'")]
    public void A_column_that_cannot_be_the_response_is_a_problem(string response, string words) =>
        Assert.Equal([words], CsvText.Words(FirstDeclaration.Of(CsvText.Source(Motley()), Request with { Response = response })));

    [Fact]
    public void Unreadable_data_are_a_problem() =>
        Assert.Equal(["leases.csv:2: row 1: found 1 field, expected 2 as in the header"], CsvText.Words(FirstDeclaration.Of(CsvText.Source("loss,price\n1\n"), Request)));

    [Theory]
    [InlineData("leases.csv", "leases")]
    [InlineData("Leases 2024 (final).csv.gz", "Leases-2024-final")]
    [InlineData("__été__.tsv", "t")]
    [InlineData("-.csv", "model")]
    public void The_id_is_made_of_the_files_name(string file, string id)
    {
        Assert.Equal(id, StartRequest.IdOf(file));
        Declared($"model: {{id: {id}}}");
    }

    [Fact]
    public void Every_reference_data_set_starts_with_a_declaration_that_is_audited()
    {
        var folders = Directory.GetDirectories(TestFolders.Reference).Where(folder => File.Exists(Path.Combine(folder, "data.csv"))).ToList();

        Assert.InRange(folders.Count, 23, int.MaxValue);
        Assert.All(folders, folder =>
        {
            var response = DeclarationReader.Read(File.ReadAllText(Path.Combine(folder, "declaration.yaml")), "").Declaration!.Response.Columns.First().Column;
            var data = File.ReadAllBytes(Path.Combine(folder, "data.csv"));
            Audited(Value(FirstDeclaration.Of(CsvText.Source(data), Request with { Response = response })), data);
        });
    }

    /// <summary>Column names and texts of any characters, any pattern of missing cells.</summary>
    [Fact]
    public void Whatever_the_table_it_is_read_and_audited() => Gen.Select(
        Gen.Char.Array[1, 6].Select(name => new string(name)).Where(IsText).Array[3],
        Gen.Int[1, 25],
        Gen.Select(Gen.Int[0, 3], Gen.Int[1, 4], Gen.Int[1, 9]).Array[3]).Sample(
        (names, rows, kinds) =>
        {
            var columns = names.Zip(kinds).DistinctBy(pair => pair.First).Where(pair => pair.First is not ("loss" or "intercept")).ToList();
            var text = new StringBuilder("loss," + string.Join(',', columns.Select(column => Quoted(column.First))) + "\n0.5" + string.Concat(columns.Select(column => ",1")) + "\n");
            for (var row = 1; row <= rows; row++)
            {
                text.Append(Wave(row)).Append(',').AppendJoin(',', columns.Select(column => Quoted(Cell(row, column.Second, column.First)))).Append('\n');
            }

            Audited(Written(text.ToString()), text.ToString());
        },
        iter: 200);

    private static string Cell(int row, (int Kind, int Values, int Gap) column, string name) =>
        row % column.Gap == 1 ? ""
        : column.Kind switch { 0 => Wave(row * column.Values), 1 => (row % column.Values).ToString(CultureInfo.InvariantCulture), 2 => name + (row % column.Values), _ => "2020-01-0" + (1 + (row % column.Values)) };

    private static string Wave(int row) => Math.Sin(row * 12.9898).ToString("R", CultureInfo.InvariantCulture);

    private static bool IsText(string name) => !name.Any(char.IsSurrogate) && !string.IsNullOrWhiteSpace(name);

    private static string Quoted(string text) => "\"" + text.Replace("\"", "\"\"", StringComparison.Ordinal) + "\"";

    /// <summary>60 leases with a column of each kind that is told apart.</summary>
    private static string Motley()
    {
        var text = new StringBuilder("\"\",lease_no,loss,price,plot,\"01\",region,opened,always,never,seldom,\"half: empty\",prise,note,twice,twice,yes,intercept\n");
        for (var row = 1; row <= 60; row++)
        {
            string[] cells =
            [
                row.ToString(CultureInfo.InvariantCulture), $"L{row}", Wave(row), Wave(row * 3), (1 + (row % 5)).ToString(CultureInfo.InvariantCulture), "0" + (row % 7),
                row % 3 == 0 ? "south" : "north", $"2020-01-{1 + (row % 28):D2}", "7", "NA", row % 4 == 0 ? Wave(row) : "", row % 6 == 0 ? "" : Wave(row * 5),
                row == 9 ? "n/a" : (10 * (row % 4)).ToString(CultureInfo.InvariantCulture), "free text " + (row % 20), "1", "2", (row % 2).ToString(CultureInfo.InvariantCulture), Wave(row * 7),
            ];
            text.AppendJoin(',', cells).Append('\n');
        }

        return text.ToString();
    }

    private static string Written(string csv) => Value(FirstDeclaration.Of(CsvText.Source(csv), Request));

    private static AuditRecord Audited(string declaration, string csv) => Audited(declaration, Encoding.UTF8.GetBytes(csv));

    private static AuditRecord Audited(string declaration, byte[] csv) =>
        AuditRunner.Record(declaration, name => name == CsvText.Name ? new MemoryStream(csv) : throw new FileNotFoundException(name));

    private static void Declared(string model) => Auditor.Tests.Declaration.Declared.Good(model);

    private static string Value(Reading<string> reading) => reading.Value ?? throw new InvalidOperationException(string.Join('\n', reading.Problems));
}
