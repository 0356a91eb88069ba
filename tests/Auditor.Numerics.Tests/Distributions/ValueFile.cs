using System.Globalization;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>A file of 80-digit values made by values/make_values.py: a comment line, a line of names, then rows.</summary>
internal static class ValueFile
{
    public const double Tolerance = 1e-10;

    /// <summary>The rows by column name; fails when there are fewer than expected, so that an empty file cannot pass.</summary>
    public static List<Dictionary<string, string>> Rows(string name, int atLeast)
    {
        string[] lines = File.ReadAllLines(Path.Combine(AppContext.BaseDirectory, "Distributions", "values", name));
        string[] names = lines[1].Split(',');
        var rows = lines.Skip(2).Select(line => names.Zip(line.Split(',')).ToDictionary(p => p.First, p => p.Second)).ToList();
        Assert.True(rows.Count >= atLeast, $"{name} has {rows.Count} rows");
        return rows;
    }

    public static double Number(this Dictionary<string, string> row, string column) =>
        double.Parse(row[column], NumberStyles.Float, CultureInfo.InvariantCulture);

    /// <summary>Asserts every row at once and names the worst, so that a failure shows its pattern.</summary>
    public static void AllClose(IEnumerable<Dictionary<string, string>> rows, string column, Func<Dictionary<string, string>, double> computed, double tolerance = Tolerance)
    {
        var bad = new List<string>();
        int looked = 0;
        foreach (Dictionary<string, string> row in rows)
        {
            double expected = row.Number(column);
            if (Math.Abs(expected) < 1e-305 && expected != 0)
            {
                continue; // a subnormal number has no 10 digits to compare
            }

            looked++;
            double actual = computed(row);
            double error = Math.Abs(actual - expected) / Math.Max(Math.Abs(expected), 1e-305);
            if (!(error <= tolerance))
            {
                bad.Add(string.Create(CultureInfo.InvariantCulture, $"{error:E1} {actual:R} for {string.Join(' ', row.Select(p => p.Key + "=" + p.Value))}"));
            }
        }

        Assert.True(looked > 0);
        Assert.True(bad.Count == 0, $"{bad.Count} of {looked} differ in {column}:\n{string.Join('\n', bad.Take(40))}");
    }
}
