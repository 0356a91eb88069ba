using Microsoft.Playwright;

namespace Auditor.Browser.Tests;

/// <summary>Copying a paragraph, folding, and trying another level or bound.</summary>
public sealed class ExclusionToolTests(Chromium chromium)
{
    [Fact]
    public async Task An_exclusion_copies_as_one_paragraph()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        var exclusion = ReportPages.DemoRecord.Exclusions[0];

        string copied = await Memo(open.Page, open.Page.Locator("section.exclusion").First);

        Assert.StartsWith(exclusion.Group + ". ", copied, StringComparison.Ordinal);
        Assert.Contains(exclusion.Reason, copied, StringComparison.Ordinal);
        Assert.DoesNotContain("Copy", copied, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_finding_copies_as_one_paragraph_without_the_buttons_words()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        var finding = ReportPages.DemoRecord.Findings[0];

        string copied = await Memo(open.Page, open.Page.Locator(".findings > li").First);

        Assert.StartsWith($"{finding.Subject}. {finding.Message}", copied, StringComparison.Ordinal);
        Assert.Contains(finding.Rule, copied, StringComparison.Ordinal);
        Assert.DoesNotContain("Copy", copied, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', copied);
    }

    [Fact]
    public async Task All_parts_fold_and_unfold_and_the_verdict_stays()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        int tables = await open.Page.Locator("details table:visible").CountAsync();
        Assert.True(tables >= ReportPages.DemoRecord.Exclusions.Count);

        await open.Page.GetByText("Fold all", new() { Exact = true }).ClickAsync();
        Assert.Equal(0, await open.Page.Locator("details table:visible").CountAsync());
        Assert.Equal(await open.Page.Locator(".standing").CountAsync(), await open.Page.Locator(".standing:visible").CountAsync());
        Assert.Contains(ReportPages.DemoRecord.Exclusions[0].Reason, await Memo(open.Page, open.Page.Locator("section.exclusion").First), StringComparison.Ordinal);

        await open.Page.Keyboard.PressAsync("u");
        Assert.Equal(tables, await open.Page.Locator("details table:visible").CountAsync());
    }

    [Theory]
    [InlineData(0.001, 0.01, "1 of 7 verdicts would change:")]
    [InlineData(0.025, 0.001, "3 of 7 verdicts would change:")]
    [InlineData(0.2, 0.01, "No verdict would change.")]
    [InlineData(0.05, 0.01, "This is the policy in force: the verdicts are the audit’s own.")]
    public async Task What_if_lists_what_an_audit_under_that_policy_changes(double level, double bound, string sentence)
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        var place = open.Page.Locator("#what-if");
        await place.Locator("select").Nth(0).SelectOptionAsync(FormattableString.Invariant($"{level}"));
        await place.Locator("select").Nth(1).SelectOptionAsync(FormattableString.Invariant($"{bound}"));

        var other = ReportPages.Audit(FormattableString.Invariant($"significance: {level}\nnegligible_partial_r_squared: {bound}\n"));
        var expected = ReportPages.DemoRecord.Exclusions.Zip(other.Exclusions)
            .Select(pair => (pair.First.Group, From: Word(pair.First), To: Word(pair.Second)))
            .Where(pair => pair.From != pair.To)
            .Select(pair => $"{pair.Group}: {pair.From} → {pair.To}")
            .ToList();

        Assert.Equal(expected, await place.Locator("li").AllInnerTextsAsync());
        Assert.Equal(sentence, await place.Locator(".what-if-result > p").InnerTextAsync());
    }

    private static string Word(Results.Exclusion exclusion) => Reporting.Html.VerdictWords.Of(exclusion.Verdict, exclusion.Materiality).Word;

    private static async Task<string> Memo(IPage page, ILocator item)
    {
        await page.GetByRole(AriaRole.Status).EvaluateAsync("said => { said.textContent = ''; }");
        await item.GetByText("Copy for a memo").ClickAsync();
        await Assertions.Expect(page.GetByRole(AriaRole.Status)).ToHaveTextAsync("Paragraph copied.");
        return await page.EvaluateAsync<string>("() => navigator.clipboard.readText()");
    }
}
