using System.Globalization;
using System.Text.Json;
using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>Against the critical values of R 4.2.2 (qf) in reference/tables.json, printed there to 17 digits.</summary>
public sealed class CriticalValueTableTests
{
    // R's own qf is good to about 1e-12 in this range (seen against the 80-digit values); the table has up to 17 digits.
    private const double Printed = 1e-11;

    [Fact]
    public void Every_printed_critical_value_is_met()
    {
        using JsonDocument file = JsonDocument.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "reference", "tables.json")));
        int looked = 0;
        foreach (JsonElement table in file.RootElement.GetProperty("F_critical_values").GetProperty("tables").EnumerateArray())
        {
            double alpha = table.GetProperty("upper_tail_probability").GetDouble();
            foreach (JsonElement row in table.GetProperty("rows").EnumerateArray())
            {
                double df2 = Degrees(row.GetProperty("denominator_df").GetString());
                foreach (JsonProperty cell in row.GetProperty("critical_values").EnumerateObject())
                {
                    double df1 = Degrees(cell.Name);
                    if (double.IsInfinity(df1) && double.IsInfinity(df2))
                    {
                        continue; // a point mass at 1, no distribution
                    }

                    looked++;
                    double expected = cell.Value.GetDouble();
                    double actual = FisherF.UpperQuantile(alpha, df1, df2);
                    Assert.True(Math.Abs((actual / expected) - 1) < Printed, string.Create(CultureInfo.InvariantCulture, $"{alpha} {df1} {df2}: {actual:R}, table {expected:R}"));
                }
            }
        }

        Assert.True(looked > 2000, $"{looked} values");
    }

    private static double Degrees(string? text) =>
        text == "inf" ? double.PositiveInfinity : double.Parse(text!, CultureInfo.InvariantCulture);
}
