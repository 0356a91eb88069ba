using Deque.AxeCore.Commons;
using Deque.AxeCore.Playwright;
using Microsoft.Playwright;

namespace Auditor.Browser.Tests;

/// <summary>axe-core finds no violation of WCAG 2.2 at level AA.</summary>
public sealed class AccessibilityTests(Chromium chromium, ITestOutputHelper output)
{
    private static readonly string[] Criteria = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];

    [Theory]
    [InlineData(ReportPages.Demo, ColorScheme.Light, Media.Screen)]
    [InlineData(ReportPages.Demo, ColorScheme.Dark, Media.Screen)]
    [InlineData(ReportPages.Demo, ColorScheme.Light, Media.Print)]
    [InlineData(ReportPages.Hostile, ColorScheme.Light, Media.Screen)]
    [InlineData(ReportPages.Hostile, ColorScheme.Dark, Media.Screen)]
    [InlineData(ReportPages.Hostile, ColorScheme.Dark, Media.Print)]
    [InlineData(ReportPages.Nulls, ColorScheme.Dark, Media.Screen)]
    public async Task No_violation(string page, ColorScheme scheme, Media media)
    {
        await using var open = await chromium.Open(ReportPages.Named(page), new() { ColorScheme = scheme }, axe: true);
        await open.Page.EmulateMediaAsync(new() { Media = media });

        var result = await open.Page.RunAxe(new AxeRunOptions { RunOnly = RunOnlyOptions.Tags(Criteria) });

        output.WriteLine($"{result.Passes.Length} rules passed, {result.Incomplete.Length} left to judgement: {string.Join(", ", result.Incomplete.Select(rule => rule.Id))}");
        Assert.True(result.Passes.Length > 8);
        Assert.Empty(result.Violations.SelectMany(rule => rule.Nodes.Select(node => $"{rule.Id} {node.Target}: {node.Html}")));
    }

    [Fact]
    public async Task The_checker_sees_text_that_is_too_faint()
    {
        string faint = ReportPages.Named(ReportPages.Demo).Replace("--soft: #5b5f73;", "--soft: #b5b5b5;", StringComparison.Ordinal);
        await using var open = await chromium.Open(faint, new() { ColorScheme = ColorScheme.Light }, axe: true);

        var result = await open.Page.RunAxe(new AxeRunOptions { RunOnly = RunOnlyOptions.Tags(Criteria) });

        Assert.Contains(result.Violations, rule => rule.Id == "color-contrast");
    }
}
