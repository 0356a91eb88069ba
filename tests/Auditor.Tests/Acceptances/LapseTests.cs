using System.Globalization;
using Auditor.Acceptances;
using Auditor.Facts;
using Auditor.Findings;
using Auditor.Rules;
using Auditor.Tests.Facts;
using Auditor.Tests.Rules;

namespace Auditor.Tests.Acceptances;

/// <summary>An acceptance holds for what was looked at and no worse: each limit on both sides.</summary>
public sealed class LapseTests
{
    private static readonly IReadOnlyList<Rule> Rules = RuleReader.Read(ShippedFiles.All(), ShippedFiles.Policy()).Value!;

    /// <summary>p_adjusted 0.06, p 0.03, partial R² 0.032, severity medium.</summary>
    private static readonly FactSet Group = ExclusionFacts.From(Samples.Tested, new([], []), Samples.Policy());

    private static readonly Finding Found = new("exclusion-inconclusive", Severity.Medium, "engine condition", "m", "a", null, 12);

    private static readonly AcceptanceEntry Entry = Samples.Acceptance with { Worst = null };

    [Theory]
    [InlineData("2026-12-31", true)]
    [InlineData("2027-01-01", false)]
    [InlineData("2026-03-01", true)]
    [InlineData("2026-02-28", false)]
    public void It_holds_from_the_day_of_approval_to_the_last_day(string asOf, bool holds) => Assert.Equal(holds, Holds(Entry, asOf: DateOnly.Parse(asOf, CultureInfo.InvariantCulture)));

    [Theory]
    [InlineData("2026.2", true)]
    [InlineData("2026.20", false)]
    [InlineData(null, false)]
    public void It_holds_for_its_version(string? version, bool holds) => Assert.Equal(holds, Holds(Entry, version));

    [Theory]
    [InlineData(Severity.Note, false)]
    [InlineData(Severity.Low, false)]
    [InlineData(Severity.Medium, true)]
    [InlineData(Severity.High, false)]
    public void It_holds_for_its_severity(Severity severity, bool holds) => Assert.Equal(holds, Holds(Entry with { Severity = severity }));

    [Theory]
    [InlineData(0.06, null, true)]
    [InlineData(0.0600001, null, false)]
    [InlineData(0.0599999, null, true)]
    [InlineData(null, 0.032, true)]
    [InlineData(null, 0.0319999, false)]
    [InlineData(null, 0.0320001, true)]
    [InlineData(0.07, 0.04, false)]
    [InlineData(0.05, 0.03, false)]
    [InlineData(0.05, 0.04, true)]
    public void It_holds_for_evidence_that_is_no_stronger(double? p, double? effect, bool holds) =>
        Assert.Equal(holds, Holds(Entry with { Worst = new WorstAccepted(p, effect) }));

    [Fact]
    public void Evidence_that_cannot_be_computed_is_not_shown_to_be_no_stronger()
    {
        var untestable = ExclusionFacts.From(Samples.Untestable, new([], []), Samples.Policy());
        var entry = Entry with { Rule = "exclusion-untestable", Subject = "dealer bonus", Worst = new WorstAccepted(0.05, 0.04) };
        var standing = Match(entry, found: Found with { Rule = "exclusion-untestable", Subject = "dealer bonus" }, facts: untestable).Standings.Single();

        Assert.Equal(
            [
                "there is no p to hold against the accepted one: its columns equal those of the final model",
                "there is no partial R² to hold against the accepted one: no rank, no effect",
            ],
            standing.Reasons);
        Assert.True(Match(entry with { Worst = null }, found: Found with { Rule = "exclusion-untestable", Subject = "dealer bonus" }, facts: untestable).Standings.Single().Holds);
    }

    [Fact]
    public void Every_reason_is_given_and_the_finding_stays_open()
    {
        var entry = Entry with { Severity = Severity.Low, Worst = new WorstAccepted(0.5, 0.001) };
        var matched = Match(entry, version: null, asOf: new DateOnly(2027, 1, 1));

        Assert.Null(matched.Findings.Single().Accepted);
        Assert.Equal(
            [
                "it expired on 2026-12-31, before 2027-01-01",
                "it is for version 2026.2 of the model, and the declaration states no version",
                "it is for a finding of severity low, and this one is medium",
                "p is 0.0600, below the accepted 0.5",
                "partial R² is 0.0320, above the accepted 0.001",
            ],
            matched.Standings.Single().Reasons);
    }

    [Fact]
    public void A_check_has_the_p_on_which_its_rejection_rests()
    {
        var check = CheckFacts.From(new("shapiro_wilk", 0.9, null, null, 0.02, "normality", true, null));
        var entry = Entry with { Rule = "residuals-not-normal", Subject = "shapiro_wilk" };
        var about = Rules.First(rule => rule.About == About.Check);
        entry = entry with { Rule = about.Id, Worst = new WorstAccepted(0.02, null) };
        var found = Found with { Rule = about.Id, Subject = "shapiro_wilk" };

        Assert.True(Match(entry, found: found, facts: check).Standings.Single().Holds);
        Assert.False(Match(entry with { Worst = new WorstAccepted(0.021, null) }, found: found, facts: check).Standings.Single().Holds);
    }

    [Fact]
    public void An_acceptance_that_holds_is_told_in_the_finding_and_changes_nothing_else()
    {
        var matched = Match(Entry);

        Assert.Equal(
            Found with { Accepted = new Acceptance("R. Okafor", new DateOnly(2026, 3, 1), new DateOnly(2026, 12, 31), "More leases run out in autumn.") },
            matched.Findings.Single());
    }

    [Theory]
    [InlineData("exclusion-inconclusive", "engine conditions", "; did you mean 'engine condition'?")]
    [InlineData("exclusion-inconclusive", "dealer region", "")]
    [InlineData("exclusion-too-few-rows", "engine condition", "")]
    public void Without_its_finding_it_is_unmatched(string rule, string subject, string hint)
    {
        var matched = Match(Entry with { Rule = rule, Subject = subject });
        var standing = matched.Standings.Single();

        Assert.Null(matched.Findings.Single().Accepted);
        Assert.Equal((false, false, hint), (standing.Matched, standing.Holds, standing.Hint));
    }

    [Fact]
    public void Acceptances_of_other_models_are_not_this_runs_business() => Assert.Empty(Match(Entry with { Model = "combine-lease-loss" }).Standings);

    private static bool Holds(AcceptanceEntry entry, string? version = "2026.2", DateOnly? asOf = null)
    {
        var matched = Match(entry, version, asOf);
        Assert.Equal(matched.Standings.Single().Holds, matched.Findings.Single().Accepted is not null);
        return matched.Standings.Single().Holds;
    }

    private static MatchedAcceptances Match(AcceptanceEntry entry, string? version = "2026.2", DateOnly? asOf = null, Finding? found = null, FactSet? facts = null) =>
        AcceptanceMatching.Of(
            new AcceptancesOfRun([entry], asOf ?? new DateOnly(2026, 6, 1)), "tractor-lease-loss", version, [found ?? Found], [facts ?? Group], Rules);
}
