using System.Globalization;
using System.Text;
using System.Text.Json;
using Auditor.Reporting;
using Auditor.Tests.Reporting;
using CsCheck;

namespace Auditor.Tests;

/// <summary>
/// Whole audits of random small data with everything that goes wrong in practice (constant, repeated and missing columns, few rows, one level, zero
/// weights): each ends in problems or in a valid record whose rows add up. Common practice, no source.
/// </summary>
public sealed class AuditFuzzTests(ITestOutputHelper output)
{
    private static readonly string[] Terms =
    [
        "a", "b", "c", "d", "g", "h", "k", "{log: a}", "{square: b}", "{inverse: c}", "{center: a}", "{polynomial: {of: a, degree: 3}}",
        "{product: [a, g]}", "{product: [a, b]}", "{product: [g, h]}", "{indicator: {of: g, equals: x}}", "{exp: b}", "{spline: {of: a, knots: [-1, 0, 1]}}",
        "{bins: {of: b, cuts: [-1, 1]}}", "{winsorise: {of: a, lower: 0.1, upper: 0.9}}", "{ratio: [a, b]}", "{minus: [a, b]}", "{sqrt: {abs: a}}",
    ];

    private static readonly string[] WeightLines = ["", "", "", ", weights: {column: w, kind: precision}", ", weights: {column: w, kind: frequency}", ", weights: {column: w, kind: sampling}"];

    private static readonly string[] Policies = ["", "row_set: common", "basis_without_structure: classical", "adjustment: benjamini_yekutieli", "adjustment: none"];

    private static Gen<(string Declaration, string Data, string Policy)> Any =>
        from rows in Gen.Int[1, 28]
        from cells in Gen.Int[0, 1_000_000].Array[rows * 9]
        from shuffled in Gen.Shuffle(Terms)
        from final in Gen.Int[0, 4]
        from groups in Gen.Int[0, 4]
        from intercept in Gen.Bool
        from weights in Gen.Int[0, WeightLines.Length - 1].Select(i => WeightLines[i])
        from policy in Gen.Int[0, Policies.Length - 1].Select(i => Policies[i])
        select (Declare(shuffled, final, groups, intercept || final == 0, weights), Csv(rows, cells), policy);

    [Fact]
    public void Every_audit_ends_in_problems_or_in_a_valid_record()
    {
        var (records, refused) = (0, 0);
        Any.Sample(
            input =>
            {
                var reading = AuditRunner.Try(input.Declaration, _ => new MemoryStream(Encoding.UTF8.GetBytes(input.Data)), input.Policy);
                if (reading.Value is { } record)
                {
                    Check(record);
                    Interlocked.Increment(ref records);
                }
                else
                {
                    Assert.NotEmpty(reading.Problems);
                    Interlocked.Increment(ref refused);
                }
            },
            iter: 500);
        output.WriteLine($"{records} records, {refused} refused");
        Assert.True(records > 150, $"only {records} of the audits gave a record");
    }

    private static void Check(AuditRecord record)
    {
        var rows = record.Rows;
        Assert.Equal(rows.Read, rows.FilteredOut + rows.ZeroWeight + rows.Incomplete + rows.Undefined + rows.Used);
        using var json = JsonDocument.Parse(JsonRecord.Write(record));
        RecordSchema.AssertValid(json.RootElement);
        Assert.All(record.Exclusions.Select(exclusion => exclusion.P).OfType<double>(), p => Assert.InRange(p, 0, 1));
        Assert.All(record.Exclusions, exclusion => Assert.True(exclusion.PAdjusted is null || exclusion.PAdjusted >= exclusion.P));
        Assert.All(record.Exclusions, exclusion => Assert.NotEmpty(exclusion.Reason));
        Pages.Render(record);
    }

    private static string Declare(string[] terms, int final, int groups, bool intercept, string weights)
    {
        var text = new StringBuilder("audit: 1\nmodel: {id: fuzz}\n");
        text.Append("data: {source: data.csv, columns: {g: {kind: levels}, h: {kind: levels}, k: {kind: levels}}").Append(weights).Append("}\n");
        text.Append("response: y\nfinal_model:\n  intercept: ").Append(intercept ? "true" : "false").Append('\n');
        text.Append("  terms: [").AppendJoin(", ", terms.Take(final)).Append("]\nleft_out:");
        if (groups == 0)
        {
            text.Append(" []");
        }

        for (var g = 0; g < groups; g++)
        {
            text.Append(CultureInfo.InvariantCulture, $"\n  - {{group: g{g}, terms: [{string.Join(", ", terms.Skip(final + (2 * g)).Take(2))}]}}");
        }

        return text.Append('\n').ToString();
    }

    private static string Csv(int rows, int[] cells)
    {
        var text = new StringBuilder("y,a,b,c,d,g,h,k,w\n");
        for (var row = 0; row < rows; row++)
        {
            var c = cells.AsSpan(row * 9, 9);
            double a = Number(c[1]);
            text.AppendJoin(',', Text(Number(c[0])), Missing(c[1], Text(a)), Text(Math.Round(Number(c[2]))), "2.5", Text((2 * a) + 1),
                "xyz"[c[5] % 3], Missing(c[6], c[6] % 2 == 0 ? "left" : "right"), "only", (c[8] % 4).ToString(CultureInfo.InvariantCulture)).Append('\n');
        }

        return text.ToString();
    }

    private static double Number(int cell) => ((cell % 8000) - 4000) / 1000.0;

    private static string Missing(int cell, string text) => cell % 11 == 0 ? "" : text;

    private static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
