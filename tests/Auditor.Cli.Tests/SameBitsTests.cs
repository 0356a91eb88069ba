using System.Globalization;
using System.Text;
using Auditor.Numerics.Random;

namespace Auditor.Cli.Tests;

/// <summary>The same record byte for byte whatever the threads and the processor's vectors, on a case whose factor is made in two stripes of rows and with panels.</summary>
public sealed class SameBitsTests
{
    private const int Rows = 20_000;
    private const int Numbers = 12;

    [Fact]
    public void Threads_and_the_width_of_vectors_change_no_byte()
    {
        using var folder = new TemporaryFolder().With("lathes.yaml", Declaration()).With("lathes.csv", Data());
        var alone = Record(folder, [], "1");
        Assert.Equal(alone, Record(folder, [], "2"));

        // Switches of the runtime: without 512-bit vectors the same eight lanes are carried out in halves, without AVX2 in quarters and with fused products by function.
        Assert.Equal(alone, Record(folder, [("DOTNET_EnableAVX512", "0")], "1"));
        Assert.Equal(alone, Record(folder, [("DOTNET_EnableAVX2", "0")], "2"));
    }

    /// <summary>Columns in memory or in files beside the output, which leave nothing behind; numbers, levels, dates, texts and empty cells.</summary>
    [Fact]
    public void Data_larger_than_the_memory_allowed_give_the_same_record_and_page()
    {
        using var folder = new TemporaryFolder().With("leases.yaml", MixedDeclaration()).With("leases.csv", MixedData());
        var inMemory = Outputs(folder, "1", "1G");
        Assert.Equal(inMemory, Outputs(folder, "1", "1K"));
        Assert.Equal(inMemory, Outputs(folder, "2", "1K"));
        Assert.Equal(["leases.html", "leases.json"], Directory.GetFileSystemEntries(folder.At("audit-out")).Select(Path.GetFileName).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Columns_that_cannot_be_kept_beside_the_output_are_said_and_nothing_is_written()
    {
        using var folder = new TemporaryFolder().With("leases.yaml", MixedDeclaration()).With("leases.csv", MixedData()).With("taken", "a file stands in the folder's place");
        var run = ProgramRun.In(folder, "leases.yaml", "--memory", "1K", "--out", "taken").Ends(2);
        Assert.Contains("take more memory than they may (--memory)", run.Errors, StringComparison.Ordinal);
        Assert.False(Directory.Exists(folder.At("audit-out")));
    }

    private static string Record(TemporaryFolder folder, (string, string)[] variables, string threads)
    {
        ProgramRun.With(folder, variables, "lathes.yaml", "--threads", threads, "--fail-on", "never").Ends(0);
        return folder.Text(Path.Combine("audit-out", "lathes.json"));
    }

    private static string Outputs(TemporaryFolder folder, string threads, string memory)
    {
        ProgramRun.With(folder, [], "leases.yaml", "--threads", threads, "--memory", memory, "--fail-on", "never").Ends(0);
        return folder.Text(Path.Combine("audit-out", "leases.json")) + folder.Text(Path.Combine("audit-out", "leases.html"));
    }

    private static string MixedDeclaration() =>
        "audit: 1\nmodel: {id: leases}\ndata:\n  source: leases.csv\n  row_label: lease\n  time: opened\n  period: month\n  unit: dealer\n  cluster: dealer\n"
        + "  columns: {dealer: {kind: levels}}\n  keep: [{column: status, equals: closed}]\nresponse: loss\nfinal_model: {terms: [price, region]}\nleft_out:\n"
        + "  - {group: age, terms: [{log: age}]}\n  - {group: grade, terms: [grade, {product: [price, grade]}]}\n  - {group: season, terms: [{season: {of: opened, by: quarter}}]}\n";

    private static string MixedData()
    {
        var (random, text) = (new Generator(21), new StringBuilder("lease,dealer,opened,status,loss,price,region,age,grade\n"));
        string Cell(double share, string value) => random.Uniform() < share ? "" : value;
        for (var row = 0; row < Rows; row++)
        {
            var (price, dealer) = (random.Uniform(), row % 97);
            var day = new DateOnly(2020, 1, 1).AddDays((int)(random.Uniform() * 900)).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
            var region = new[] { "north", "south", "\"west, upper\"" }[row % 3];
            var loss = (price + random.Uniform()).ToString("R", CultureInfo.InvariantCulture);
            text.Append(CultureInfo.InvariantCulture, $"{Cell(0.1, "L-" + row)},{dealer},{day},{(row % 11 == 0 ? "open" : "closed")},{Cell(0.01, loss)},");
            text.Append(CultureInfo.InvariantCulture, $"{price:R},{region},{Cell(0.03, (row % 40).ToString(CultureInfo.InvariantCulture))},{"ABCD"[row % 4]}\n");
        }

        return text.ToString();
    }

    private static string Declaration()
    {
        var left = string.Join(", ", Enumerable.Range(3, Numbers - 2).Select(c => "z" + c));
        return "audit: 1\nmodel: {id: lathes}\ndata: {source: lathes.csv}\nresponse: y\nfinal_model: {terms: [z1, z2]}\nleft_out:\n"
            + "  - {group: square, terms: [{square: z1}]}\n  - {group: others, terms: [" + left + "]}\n";
    }

    private static string Data()
    {
        var (random, text) = (new Generator(20), new StringBuilder("y"));
        text.AppendJoin("", Enumerable.Range(1, Numbers).Select(c => ",z" + c)).Append('\n');
        for (var row = 0; row < Rows; row++)
        {
            double[] z = [.. Enumerable.Range(0, Numbers).Select(_ => random.Uniform() - 0.5)];
            text.Append((z[0] + (0.2 * z[4]) + random.Uniform()).ToString("R", CultureInfo.InvariantCulture)).Append(',');
            text.AppendJoin(',', z.Select(value => value.ToString("R", CultureInfo.InvariantCulture))).Append('\n');
        }

        return text.ToString();
    }
}
