using System.Text.Json;
using Auditor.Acceptances;
using Auditor.Findings;
using Auditor.Reporting;
using Auditor.Rules;
using Auditor.Tests.Reporting;
using Auditor.Tests.Rules;

namespace Auditor.Tests.Acceptances;

/// <summary>Acceptances within a whole audit: the data of the demo, which contradict the exclusion of "wear".</summary>
public sealed class AcceptedAuditTests
{
    private static readonly string Demo = Path.Combine(TestFolders.Root, "templates", "demo");

    private static readonly IReadOnlyList<Rule> Rules = RuleReader.Read(ShippedFiles.All(), ShippedFiles.Policy()).Value!;

    private static readonly AuditInputs Inputs =
        AuditRunner.Inputs(File.ReadAllText(Path.Combine(Demo, "declaration.yaml")), name => File.OpenRead(Path.Combine(Demo, name))).Value!;

    private static readonly AuditRecord Plain = Audited([]);

    private static readonly AcceptanceEntry Wear = new(
        "exclusion-not-supported", "wear", "tractor-resale-shortfall", "2026.1", Severity.High, new WorstAccepted(1e-12, 0.03), "R. Okafor",
        new DateOnly(2026, 3, 1), new DateOnly(2026, 12, 31), "Wear is not known when a lease is priced.", 3);

    [Fact]
    public void An_accepted_finding_changes_no_other_part_of_the_record()
    {
        var record = Audited([Wear]);

        Assert.Equal(["wear"], record.Findings.Where(finding => finding.Accepted is not null).Select(finding => finding.Subject));
        Assert.Equal(Plain.Outcome, record.Outcome);
        var without = record with { Findings = [.. record.Findings.Select(finding => finding with { Accepted = null })] };
        Assert.Equal(JsonRecord.Write(Plain), JsonRecord.Write(without));
        RecordSchema.AssertValid(JsonDocument.Parse(JsonRecord.Write(record)).RootElement);
    }

    [Fact]
    public void The_outcome_counts_accepted_findings()
    {
        var all = Plain.Findings.Select(finding => Wear with { Rule = finding.Rule, Subject = finding.Subject, Severity = finding.Severity, Worst = null }).ToList();
        var record = Audited(all);

        Assert.All(record.Findings, finding => Assert.NotNull(finding.Accepted));
        Assert.Equal(Outcomes.ExclusionsNotSupported, record.Outcome);
    }

    /// <summary>Each kind of finding about acceptances, and an entry that tries to accept it: the reader refuses such an entry, and matching never meets one.</summary>
    [Fact]
    public void Nothing_accepts_what_is_said_of_acceptances()
    {
        AcceptanceEntry[] said =
        [
            Wear with { Version = "2025.4" },
            Wear with { Rule = "exclusion-inconclusive", Subject = "no such group" },
            Wear with { Rule = "exclusion-untestable", Subject = "lease years", Severity = Severity.Medium, Worst = null, Expires = new DateOnly(2026, 6, 10) },
        ];
        var about = Rules.Where(rule => rule.About == Auditor.Facts.About.Acceptance).ToList();
        AcceptanceEntry[] loops = [.. from entry in said from rule in about select Wear with { Rule = rule.Id, Subject = entry.Rule + ": " + entry.Subject, Severity = rule.Severity, Worst = null }];
        var record = Audited([.. said, .. loops]);
        var spoken = record.Findings.Where(finding => about.Any(rule => rule.Id == finding.Rule)).ToList();

        // One rule speaks only where no acceptance is for this model.
        Assert.Equal(about.Select(rule => rule.Id).Where(id => id != "acceptance-for-another-model").Order(), spoken.Select(finding => finding.Rule).Distinct().Order());
        Assert.All(spoken, finding => Assert.Null(finding.Accepted));
        Assert.Equal(loops.Length + 1, spoken.Count(finding => finding.Rule == "acceptance-unmatched"));
    }

    /// <summary>A file may serve many models, so a near name is spoken of only where no entry is for this model.</summary>
    [Fact]
    public void A_misspelt_model_is_a_note_where_nothing_is_accepted_for_this_one()
    {
        var misspelt = Wear with { Model = Wear.Model + "s" };
        var note = Assert.Single(Audited([misspelt, Wear with { Model = "another model" }]).Findings, finding => finding.Rule.StartsWith("acceptance-", StringComparison.Ordinal));
        Assert.Equal(("acceptance-for-another-model", Severity.Note), (note.Rule, note.Severity));
        Assert.Contains(misspelt.Model, note.Message, StringComparison.Ordinal);
        Assert.DoesNotContain(Audited([misspelt, Wear]).Findings, finding => finding.Rule == note.Rule);
    }

    [Fact]
    public void Lapsed_and_unmatched_ones_are_medium_findings_among_the_others()
    {
        var record = Audited([Wear with { Severity = Severity.Medium }, Wear with { Subject = "wera" }]);

        Assert.Equal(record.Findings.OrderByDescending(finding => finding.Severity), record.Findings);
        Assert.Contains(record.Findings, finding => finding is { Rule: "acceptance-lapsed", Severity: Severity.Medium, Subject: "exclusion-not-supported: wear", Line: null });
        Assert.Contains(record.Findings, finding => finding is { Rule: "acceptance-unmatched", Severity: Severity.Medium, Subject: "exclusion-not-supported: wera" });
        Assert.All(record.Findings, finding => Assert.Null(finding.Accepted));
        Assert.Equal(Plain.Undecided, record.Undecided);
    }

    private static AuditRecord Audited(IReadOnlyList<AcceptanceEntry> entries) =>
        Audit.Run(Inputs with { Acceptances = new AcceptancesOfRun(entries, new DateOnly(2026, 6, 1)) }).Value!;
}
