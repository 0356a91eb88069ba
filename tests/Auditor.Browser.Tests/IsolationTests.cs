using Microsoft.Playwright;

namespace Auditor.Browser.Tests;

/// <summary>The page asks for nothing, complains about nothing, and is whole without its script.</summary>
public sealed class IsolationTests(Chromium chromium)
{
    [Theory]
    [InlineData(ReportPages.Demo)]
    [InlineData(ReportPages.Hostile)]
    [InlineData(ReportPages.Nulls)]
    public async Task No_request_no_error_no_violation_of_its_policy(string page)
    {
        await using var open = await chromium.Open(ReportPages.Named(page));
        await open.Ask<object>("() => document.querySelectorAll('button').forEach(button => button.click())");
        await open.Page.EmulateMediaAsync(new() { Media = Media.Print });

        Assert.Equal([open.Address], open.Asked);
        Assert.Empty(open.Complaints);
    }

    [Fact]
    public async Task A_script_that_is_not_the_pages_own_is_refused_and_seen_here()
    {
        string page = ReportPages.Named(ReportPages.Demo).Replace("</main>", "<img src=\"https://example.org/x.png\" alt=\"x\"><script>alert(1)</script></main>", StringComparison.Ordinal);
        await using var open = await chromium.Open(page);

        Assert.Contains(open.Complaints, complaint => complaint.StartsWith("policy: img-src", StringComparison.Ordinal));
        Assert.Contains(open.Complaints, complaint => complaint.StartsWith("policy: script-src", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData(ReportPages.Demo)]
    [InlineData(ReportPages.Hostile)]
    public async Task Without_script_every_section_is_readable(string page)
    {
        await using var open = await chromium.Open(ReportPages.Named(page), new() { JavaScriptEnabled = false });

        Assert.Equal(0, await open.Page.Locator("button, select, input").CountAsync());
        Assert.True(await open.Page.Locator("#what-if").IsHiddenAsync());
        var parts = await open.Page.Locator("main > header, main > section:not(#what-if), .exclusion, main table, main h3, main h4, main svg[role=img]").AllAsync();
        Assert.True(parts.Count > 40);
        foreach (var part in parts)
        {
            Assert.True(await part.IsVisibleAsync(), await part.EvaluateAsync<string>("part => part.outerHTML.slice(0, 200)"));
        }

        Assert.All(await open.Page.Locator("main > section:not(#what-if)").AllInnerTextsAsync(), text => Assert.True(text.Length > 30, text));
    }

    [Fact]
    public async Task Hostile_text_stays_text()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Hostile));

        Assert.Equal(0, await open.Page.Locator("img").CountAsync());
        Assert.Equal(Auditor.Tests.Reporting.HostileRecords.Text, await open.Page.Locator("h1").TextContentAsync());
        Assert.Equal(2, await open.Page.Locator("script").CountAsync());
    }
}
