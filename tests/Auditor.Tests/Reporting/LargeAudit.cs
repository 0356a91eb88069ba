using System.Globalization;
using System.Text;
using Auditor.Reporting;

namespace Auditor.Tests.Reporting;

/// <summary>An audit of 50,000 rows and 30 groups. Invented.</summary>
internal static class LargeAudit
{
    public const int Rows = 50_000;
    public const int Groups = 30;

    public static AuditRecord Record()
    {
        byte[] data = Encoding.UTF8.GetBytes(Data());
        return AuditRunner.Record(Declaration(), _ => new MemoryStream(data, writable: false));
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
