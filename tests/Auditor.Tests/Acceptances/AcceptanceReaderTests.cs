using Auditor.Acceptances;
using Auditor.Findings;
using Auditor.Rules;
using Auditor.Tests.Rules;

namespace Auditor.Tests.Acceptances;

/// <summary>What an acceptances file may hold. Whole files of problems stand in the golden messages of the command line.</summary>
public sealed class AcceptanceReaderTests
{
    private const string Good =
        "rule: exclusion-not-supported, subject: engine condition, model: tractor-lease-loss, version: 2026.20, severity: high, worst: {p: 0.001, partial_r_squared: 0.03}, "
        + "approved_by: R. Okafor, approved_on: 2026-03-01, expires: 2026-12-31, because: Known.";

    private static readonly IReadOnlyList<Rule> Rules = RuleReader.Read(ShippedFiles.All(), ShippedFiles.Policy()).Value!;

    [Fact]
    public void Every_field_is_read_as_written() => Assert.Equal(
        new AcceptanceEntry(
            "exclusion-not-supported", "engine condition", "tractor-lease-loss", "2026.20", Severity.High, new WorstAccepted(0.001, 0.03), "R. Okafor",
            new DateOnly(2026, 3, 1), new DateOnly(2026, 12, 31), "Known.", 3),
        Read(Good).Value!.Single());

    [Theory]
    [InlineData("accept:\n")]
    [InlineData("accept: []\n")]
    public void No_acceptance_is_none(string accept) => Assert.Empty(AcceptanceReader.Read("acceptances: 1\n" + accept, "accepted.yaml", Rules).Value!);

    [Theory]
    [InlineData("worst: {p: 0.001, partial_r_squared: 0.03}, ", "")]
    [InlineData("{p: 0.001, partial_r_squared: 0.03}", "{p: 0}")]
    [InlineData("{p: 0.001, partial_r_squared: 0.03}", "{partial_r_squared: 1}")]
    [InlineData("expires: 2026-12-31", "expires: 2026-03-01")]
    public void These_are_fine(string text, string instead) => Assert.Empty(Read(Replaced(text, instead)).Problems);

    [Theory]
    [InlineData("rule: exclusion-not-supported, ", "", "accept: 'rule' is missing; expected the id of a rule")]
    [InlineData("subject: engine condition, ", "", "accept: 'subject' is missing; expected the finding's subject, such as the name of a left-out group")]
    [InlineData("model: tractor-lease-loss, ", "", "accept: 'model' is missing; expected the id of the model")]
    [InlineData("version: 2026.20, ", "", "accept: 'version' is missing; expected the version of the model that was looked at")]
    [InlineData("severity: high, ", "", "accept: 'severity' is missing; expected the severity of the finding, high, medium, low or note")]
    [InlineData("approved_by: R. Okafor, ", "", "accept: 'approved_by' is missing; expected the name of the approver")]
    [InlineData("approved_on: 2026-03-01, ", "", "accept: 'approved_on' is missing; expected a date as YYYY-MM-DD")]
    [InlineData("expires: 2026-12-31, ", "", "accept: 'expires' is missing; expected a date as YYYY-MM-DD")]
    [InlineData(", because: Known.", "", "accept: 'because' is missing; expected the reason for accepting the finding")]
    [InlineData("exclusion-not-supported", "exclusion-not-suported", "accept.rule: no rule has the id 'exclusion-not-suported'; did you mean 'exclusion-not-supported'?")]
    [InlineData("exclusion-not-supported", "acceptance-lapsed", "accept.rule: 'acceptance-lapsed' is about acceptances themselves; such a finding cannot be accepted")]
    [InlineData("exclusion-not-supported", "rows-zero-weight", "accept.worst.p: a finding of 'rows-zero-weight' has no p to compare this with; leave it out")]
    [InlineData("severity: high", "severity: hihg", "accept.severity: expected high, medium, low or note, found 'hihg'; did you mean 'high'?")]
    [InlineData("p: 0.001", "p: 1.5", "accept.worst.p: expected a number from 0 to 1, found '1.5'")]
    [InlineData("{p: 0.001, partial_r_squared: 0.03}", "{}", "accept.worst: expected p or partial_r_squared or both, found none")]
    [InlineData("{p: 0.001, partial_r_squared: 0.03}", "{p_adjusted: 0.001}", "accept.worst: unknown key 'p_adjusted'; the keys are p, partial_r_squared")]
    [InlineData("expires: 2026-12-31", "expires: 2026-02-28", "accept: expires 2026-02-28 is before approved_on 2026-03-01")]
    [InlineData("2026-12-31", "31.12.2026", "accept.expires: expected a date as YYYY-MM-DD, found '31.12.2026'")]
    [InlineData("approved_by: R. Okafor", "approved_by: \" \"", "accept.approved_by: expected the name of the approver, found ' '")]
    [InlineData("because:", "becuase:", "accept: unknown key 'becuase'; did you mean 'because'?")]
    public void These_are_not(string text, string instead, string message) =>
        Assert.Contains("accepted.yaml:3: " + message, Read(Replaced(text, instead)).Problems.Select(problem => problem.ToString()));

    [Fact]
    public void The_same_finding_cannot_be_accepted_twice()
    {
        Assert.Equal(
            ["accepted.yaml:4: accept: the finding 'exclusion-not-supported' on 'engine condition' of this model and version is accepted twice, first on line 3; keep one"],
            Read(Good, Replaced("2026-12-31", "2027-12-31")).Problems.Select(problem => problem.ToString()));
        Assert.Empty(Read(Good, Replaced("2026.20", "2026.3")).Problems);
        Assert.Empty(Read(Good, Replaced("tractor", "combine")).Problems);
    }

    private static string Replaced(string text, string instead)
    {
        Assert.Contains(text, Good, StringComparison.Ordinal);
        return Good.Replace(text, instead, StringComparison.Ordinal);
    }

    private static Reading<IReadOnlyList<AcceptanceEntry>> Read(params string[] entries) =>
        AcceptanceReader.Read("acceptances: 1\naccept:\n" + string.Concat(entries.Select(entry => $"  - {{{entry}}}\n")), "accepted.yaml", Rules);
}
