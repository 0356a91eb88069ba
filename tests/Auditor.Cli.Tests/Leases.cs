using System.Globalization;
using System.Text;

namespace Auditor.Cli.Tests;

/// <summary>A small table of leases and declarations of models of it.</summary>
internal static class Leases
{
    public const string Declaration = """
        audit: 1
        model:
          id: lease-loss
        data:
          source: leases.csv
          row_label: lease_no
        response: loss
        final_model:
          terms: [price, region]
        left_out:
          - group: engine condition
            terms: [engine_hours, age]
        """;

    /// <summary>Loss depends on price and region; on nothing else when <paramref name="hours"/> is 0.</summary>
    public static string Csv(int rows = 120, double hours = 0)
    {
        var text = new StringBuilder("lease_no,loss,price,region,engine_hours,age,note\n");
        for (var row = 1; row <= rows; row++)
        {
            var price = 40 + (row * 37 % 53);
            var south = row % 3 == 0;
            var engine = 500 + (row * 61 % 89 * 10);
            var age = row * 29 % 13;
            var loss = (0.1 * price) + (south ? 1 : 0) + (hours * engine) + Noise(row);
            text.Append(CultureInfo.InvariantCulture, $"L{row},{loss:R},{price},{(south ? "south" : "north")},{engine},{age},n{row}\n");
        }

        return text.ToString();
    }

    /// <summary>From -1 to 1, made of whole numbers so that it is the same on every machine.</summary>
    private static double Noise(int row) => ((row * 7919 % 1009) - 504) / 504.0;

    /// <summary>A folder with the declaration lease.yaml and the data leases.csv.</summary>
    public static TemporaryFolder Folder(string? declaration = null, string? data = null) =>
        new TemporaryFolder().With("lease.yaml", declaration ?? Declaration).With("leases.csv", data ?? Csv());
}
