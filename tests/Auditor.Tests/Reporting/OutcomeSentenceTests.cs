using Auditor.Findings;
using Auditor.Reporting;
using Auditor.Reporting.Html;
using Auditor.Results;

namespace Auditor.Tests.Reporting;

public sealed class OutcomeSentenceTests
{
    [Fact]
    public void A_rejection_shown_negligible_is_not_counted_and_is_named_apart()
    {
        Assert.Equal("2 of 6 exclusions are not supported by the data.", OutcomeSentence.Of(SampleRecords.Full));
        Assert.Contains("Rejected, but shown to be negligible and so not counted: previous owners.", OutcomeSentence.Beside(SampleRecords.Full));
    }

    [Theory]
    [InlineData(Outcomes.ExclusionsNotSupported, "0", "The only exclusion is not supported by the data.")]
    [InlineData(Outcomes.ExclusionsNotSupported, "0 3", "1 of 2 exclusions is not supported by the data.")]
    [InlineData(Outcomes.Findings, "2 3", "No exclusion is contradicted by the data beyond the negligible, but there are findings to look at.")]
    [InlineData(Outcomes.NothingFound, "3", "The only exclusion is supported by the data, and no rule found anything to raise.")]
    [InlineData(Outcomes.NothingFound, "3 3", "All 2 exclusions are supported by the data, and no rule found anything to raise.")]
    [InlineData(Outcomes.NothingFound, "", "No group is declared as left out, and no rule found anything to raise.")]
    [InlineData(Outcomes.Findings, "", "No group is declared as left out; other findings need attention.")]
    public void The_sentence_follows_the_outcome_and_the_count(string outcome, string samples, string sentence)
    {
        Exclusion[] exclusions = [.. samples.Split(' ', StringSplitOptions.RemoveEmptyEntries).Select(sample => SampleExclusions.All[sample[0] - '0'])];

        Assert.Equal(sentence, OutcomeSentence.Of(SampleRecords.Full with { Outcome = outcome, Exclusions = exclusions }));
    }

    [Fact]
    public void Accepted_findings_are_not_open_and_are_counted_apart()
    {
        Assert.Equal("1 high, 2 medium, 1 low, 1 note", OutcomeSentence.Findings(SampleRecords.Full));
        Assert.Equal("1 finding accepted as of 2026-03-01", OutcomeSentence.Accepted(SampleRecords.Full));
        Assert.Contains("Findings: 1 high, 2 medium, 1 low, 1 note; 1 finding accepted as of 2026-03-01.\n", ConsoleSummary.Of(SampleRecords.Full), StringComparison.Ordinal);
        Assert.Equal("6 findings accepted as of 2026-03-01", OutcomeSentence.Accepted(AllAccepted));
        Assert.Equal("none open", OutcomeSentence.Findings(AllAccepted));
        Assert.Null(OutcomeSentence.Accepted(SampleRecords.WithoutFindings));
    }

    [Fact]
    public void Acceptance_changes_no_verdict_and_no_count_of_exclusions()
    {
        Assert.Equal(OutcomeSentence.Of(SampleRecords.Full), OutcomeSentence.Of(AllAccepted));
        Assert.Equal(
            "No exclusion is contradicted by the data beyond the negligible, but there are findings, all of them accepted.",
            OutcomeSentence.Of(AllAccepted with { Outcome = Outcomes.Findings, Exclusions = [SampleExclusions.All[2], SampleExclusions.All[3]] }));
    }

    private static AuditRecord AllAccepted { get; } = SampleRecords.Full with
    {
        Findings =
        [
            .. SampleRecords.Full.Findings.Select(finding => finding with
            {
                Accepted = new Acceptance("R. Okafor", new DateOnly(2026, 2, 10), new DateOnly(2026, 12, 31), "Known."),
            }),
        ],
    };

    [Fact]
    public void Without_exclusions_the_page_says_on_what_the_outcome_rests() =>
        Assert.Equal(["The outcome rests on the checks and on the report's own figures alone."], OutcomeSentence.Beside(SampleRecords.MostlyNull));
}
