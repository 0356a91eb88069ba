using System.Globalization;
using System.Text;
using Auditor.Reporting;

namespace Auditor.Tests.Analysis;

/// <summary>The number of threads changes nothing in the record, not one byte.</summary>
public sealed class ThreadsTests
{
    private const int Groups = 6;
    private const int Rows = 400;

    [Fact]
    public void One_thread_and_four_give_the_same_record_over_many_row_sets()
    {
        var inputs = AuditRunner.Inputs(Declaration(), _ => new MemoryStream(Encoding.UTF8.GetBytes(Data()))).Value!;
        var alone = Audit.Run(inputs).Value!;

        // Each group lacks other rows: the final model's rows, each group's own and the common ones are as many row sets.
        Assert.Equal(Groups, alone.Exclusions.Select(exclusion => exclusion.Rows).Distinct().Count());
        Assert.All(alone.Exclusions, exclusion => Assert.NotNull(exclusion.OtherRowSet));
        for (var repeat = 0; repeat < 5; repeat++)
        {
            var together = Audit.Run(inputs with { Threads = 4 }).Value!;
            Assert.Equal(JsonRecord.Write(alone), JsonRecord.Write(together));
        }
    }

    private static string Declaration()
    {
        var groups = Enumerable.Range(1, Groups).Select(g => $"  - {{group: group {g}, terms: [z{g}]}}");
        return "audit: 1\nmodel: {id: threads}\ndata: {source: data.csv}\nresponse: y\nfinal_model: {terms: [x]}\nleft_out:\n" + string.Join('\n', groups) + "\n";
    }

    /// <summary>Group g lacks every row whose number leaves no remainder by 3 + 2 g.</summary>
    private static string Data()
    {
        var text = new StringBuilder("y,x," + string.Join(',', Enumerable.Range(1, Groups).Select(g => "z" + g)) + "\n");
        for (var row = 1; row <= Rows; row++)
        {
            var cells = Enumerable.Range(1, Groups).Select(g => row % (3 + (2 * g)) == 0 ? "" : Wave(row, g));
            text.Append(Wave(row, 0.3)).Append(',').Append(Wave(row, 0.7)).Append(',').AppendJoin(',', cells).Append('\n');
        }

        return text.ToString();
    }

    private static string Wave(int row, double speed) => Math.Sin(row * (1 + speed) * speed).ToString("R", CultureInfo.InvariantCulture);
}
