using System.Text;

namespace Auditor.Tests.Reporting;

/// <summary>A page stays small enough to be filed and mailed whatever the number of rows.</summary>
public sealed class PageSizeTests(ITestOutputHelper output)
{
    private const int MostBytes = 1_500_000;

    [Fact]
    public void A_page_of_fifty_thousand_rows_and_thirty_groups_is_below_one_and_a_half_megabytes()
    {
        var record = LargeAudit.Record();
        int bytes = Encoding.UTF8.GetByteCount(Pages.Render(record));

        output.WriteLine($"{bytes} bytes");
        Assert.Equal(LargeAudit.Groups, record.Exclusions.Count);
        Assert.Equal(LargeAudit.Rows, record.Rows.Used);
        Assert.InRange(bytes, 100_000, MostBytes);
    }
}
