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

    private static string Record(TemporaryFolder folder, (string, string)[] variables, string threads)
    {
        ProgramRun.With(folder, variables, "lathes.yaml", "--threads", threads, "--fail-on", "never").Ends(0);
        return folder.Text(Path.Combine("audit-out", "lathes.json"));
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
