using System.Globalization;
using System.Text;

namespace Auditor.Tests.Reporting;

/// <summary>A page stays small enough to be filed and mailed whatever the number of rows.</summary>
public sealed class PageSizeTests(ITestOutputHelper output)
{
    private const int Rows = 50_000;
    private const int Groups = 30;
    private const int MostBytes = 1_500_000;

    [Fact]
    public void A_page_of_fifty_thousand_rows_and_thirty_groups_is_below_one_and_a_half_megabytes()
    {
        byte[] data = Encoding.UTF8.GetBytes(Data());

        var record = AuditRunner.Record(Declaration(), _ => new MemoryStream(data, writable: false));
        int bytes = Encoding.UTF8.GetByteCount(Pages.Render(record));

        output.WriteLine($"{bytes} bytes");
        Assert.Equal(Groups, record.Exclusions.Count);
        Assert.Equal(Rows, record.Rows.Used);
        Assert.InRange(bytes, 100_000, MostBytes);
    }

    private static string Declaration() =>
        "audit: 1\nmodel: {id: large, title: Large}\ndata: {source: large.csv}\nresponse: y\nfinal_model: {terms: [x]}\nleft_out:\n"
        + string.Concat(Enumerable.Range(1, Groups).Select(group => string.Create(CultureInfo.InvariantCulture, $"  - {{group: candidate {group}, terms: [z{group}]}}\n")));

    /// <summary>Columns that no culture, clock or library decides: a multiplicative congruence (Park and Miller 1988).</summary>
    private static string Data()
    {
        var text = new StringBuilder("y,x," + string.Join(',', Enumerable.Range(1, Groups).Select(group => "z" + group.ToString(CultureInfo.InvariantCulture))) + "\n");
        long state = 20_260_301;
        for (int row = 0; row < Rows; row++)
        {
            for (int column = 0; column < Groups + 2; column++)
            {
                state = state * 48_271 % int.MaxValue;
                text.Append(column == 0 ? "" : ",").Append(state % 10_000);
            }

            text.Append('\n');
        }

        return text.ToString();
    }
}
