using System.Security.Cryptography;
using System.Text.Json;

namespace Auditor.Cli.Tests;

/// <summary>Findings that a named approver has accepted, through the command line: exit status, day, record. The data contradict the exclusion.</summary>
public sealed class AcceptanceTests
{
    private const string Good = """
        acceptances: 1
        accept:
          - {rule: exclusion-not-supported, subject: engine condition, model: lease-loss, version: "7", severity: high,
             approved_by: R. Okafor, approved_on: 2025-12-01, expires: 2026-06-30, because: Hours are not known at signing.}
          - {rule: exclusion-not-supported, subject: engine condition, model: combine-loss, version: "7", severity: high,
             approved_by: R. Okafor, approved_on: 2025-12-01, expires: 2026-06-30, because: Hours are not known at signing.}

        """;

    [Fact]
    public void An_accepted_finding_does_not_count_and_is_not_hidden()
    {
        using var folder = Folder();
        ProgramRun.In(folder, "lease.yaml").Ends(1);
        var run = ProgramRun.In(folder, "lease.yaml", "--acceptances", "accepted.yaml", "--verbose").Ends(0);

        Assert.Contains("The only exclusion is not supported by the data.", run.Output, StringComparison.Ordinal);
        Assert.Contains("; 1 finding accepted as of ", run.Output, StringComparison.Ordinal);
        Assert.Contains("2 acceptances, 1 of them for other models", run.Errors, StringComparison.Ordinal);
        using var record = Record(folder);
        Assert.Equal("exclusions_not_supported", record.RootElement.GetProperty("outcome").GetString());
        Assert.Equal(
            """{"approved_by":"R. Okafor","approved_on":"2025-12-01","expires":"2026-06-30","because":"Hours are not known at signing."}""",
            JsonSerializer.Serialize(Finding(record, "exclusion-not-supported").GetProperty("accepted")));
        var page = folder.Text("audit-out/lease-loss.html");
        Assert.Contains("id=\"accepted\"", page, StringComparison.Ordinal);
        Assert.Contains("Accepted by R. Okafor on 2025-12-01, until 2026-06-30:</strong> Hours are not known at signing.", page, StringComparison.Ordinal);
    }

    /// <summary>The fixed moment of these runs is 2026-01-01.</summary>
    [Theory]
    [InlineData(null, 0)]
    [InlineData("2026-06-30", 0)]
    [InlineData("2026-07-01", 1)]
    [InlineData("2025-12-01", 0)]
    [InlineData("2025-11-30", 1)]
    public void The_day_decides(string? asOf, int status)
    {
        using var folder = Folder();
        string[] day = asOf is null ? [] : ["--as-of", asOf];
        ProgramRun.In(folder, ["lease.yaml", "--acceptances", "accepted.yaml", .. day]).Ends(status);

        using var record = Record(folder);
        Assert.Equal(asOf ?? "2026-01-01", record.RootElement.GetProperty("provenance").GetProperty("as_of").GetString());
        Assert.Equal(status == 1, Rules(record).Contains("acceptance-lapsed"));
    }

    [Theory]
    [InlineData("version: \"7\"", "version: \"6\"", "acceptance-lapsed")]
    [InlineData("severity: high", "severity: medium", "acceptance-lapsed")]
    [InlineData("severity: high,", "severity: high, worst: {partial_r_squared: 0.02},", "acceptance-lapsed")]
    [InlineData("severity: high,", "severity: high, worst: {p: 0.04},", "acceptance-lapsed")]
    [InlineData("subject: engine condition", "subject: engine", "acceptance-unmatched")]
    public void One_that_does_not_hold_is_a_medium_finding_and_the_other_stays_open(string text, string instead, string rule)
    {
        using var folder = Folder(Good.Replace(text, instead, StringComparison.Ordinal));
        ProgramRun.In(folder, "lease.yaml", "--acceptances", "accepted.yaml").Ends(1);

        using var record = Record(folder);
        Assert.Equal("medium", Finding(record, rule).GetProperty("severity").GetString());
        Assert.Equal(JsonValueKind.Null, Finding(record, "exclusion-not-supported").GetProperty("accepted").ValueKind);
    }

    /// <summary>An acceptance of a finding that is not there any more: nothing else is medium, so it alone decides.</summary>
    [Theory]
    [InlineData("high", 0)]
    [InlineData("medium", 1)]
    public void An_unmatched_one_counts_as_the_medium_finding_it_is(string failOn, int status)
    {
        using var folder = new TemporaryFolder()
            .With("lease.yaml", Declaration.Replace("  - group: engine condition\n    terms: [engine_hours, age]", "  []", StringComparison.Ordinal))
            .With("leases.csv", Leases.Csv())
            .With("accepted.yaml", Good);
        ProgramRun.In(folder, "lease.yaml", "--fail-on", "medium").Ends(0);
        ProgramRun.In(folder, "lease.yaml", "--acceptances", "accepted.yaml", "--fail-on", failOn).Ends(status);
    }

    [Fact]
    public void The_record_says_which_file_and_day_and_is_the_same_byte_for_byte()
    {
        using var folder = Folder();
        ProgramRun.In(folder, "lease.yaml", "--acceptances", "accepted.yaml", "--threads", "1", "--out", "one").Ends(0);
        ProgramRun.In(folder, "lease.yaml", "--acceptances", "accepted.yaml", "--threads", "2", "--out", "two").Ends(0);
        ProgramRun.In(folder, "lease.yaml", "--out", "none").Ends(1);

        Assert.Equal(folder.Text("one/lease-loss.json"), folder.Text("two/lease-loss.json"));
        Assert.Equal(folder.Text("one/lease-loss.html"), folder.Text("two/lease-loss.html"));
        var provenance = Provenance(folder, "one");
        Assert.Equal("accepted.yaml", provenance.GetProperty("acceptances").GetString());
        Assert.Equal(Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(folder.At("accepted.yaml")))), provenance.GetProperty("acceptances_sha256").GetString());
        Assert.All(["acceptances", "acceptances_sha256", "as_of"], name => Assert.Equal(JsonValueKind.Null, Provenance(folder, "none").GetProperty(name).ValueKind));
        Assert.Contains("./run-audit.sh lease.yaml --seed 1 --acceptances accepted.yaml --as-of 2026-01-01", folder.Text("one/lease-loss.html"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("yesterday")]
    [InlineData("-1")]
    [InlineData("1767225600.5")]
    [InlineData("99999999999999999")]
    public void A_moment_that_is_none_is_told_and_nothing_is_written(string moment)
    {
        using var folder = Folder();
        foreach (var arguments in new[] { new[] { "lease.yaml" }, ["demo"], ["self-test"] })
        {
            var run = ProgramRun.Of(ProgramRun.Built, folder.Root, moment, arguments).Ends(2);
            Assert.StartsWith($"error: SOURCE_DATE_EPOCH: '{moment}' is not a whole number of seconds since 1970-01-01", run.Errors, StringComparison.Ordinal);
        }

        Assert.Equal(["accepted.yaml", "lease.yaml", "leases.csv"], folder.Files());
    }

    private static string Declaration => Leases.Declaration.Replace("id: lease-loss", "id: lease-loss\n  version: \"7\"", StringComparison.Ordinal);

    private static TemporaryFolder Folder(string acceptances = Good) => Leases.Folder(Declaration, Leases.Csv(hours: 0.01)).With("accepted.yaml", acceptances);

    private static JsonDocument Record(TemporaryFolder folder) => JsonDocument.Parse(folder.Text("audit-out/lease-loss.json"));

    private static JsonElement Provenance(TemporaryFolder folder, string output) =>
        JsonDocument.Parse(folder.Text(output + "/lease-loss.json")).RootElement.GetProperty("provenance");

    private static IEnumerable<string?> Rules(JsonDocument record) =>
        record.RootElement.GetProperty("findings").EnumerateArray().Select(finding => finding.GetProperty("rule").GetString());

    private static JsonElement Finding(JsonDocument record, string rule) =>
        record.RootElement.GetProperty("findings").EnumerateArray().Single(finding => finding.GetProperty("rule").GetString() == rule);
}
