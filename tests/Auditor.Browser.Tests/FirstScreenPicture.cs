using Auditor.Tests;
using Microsoft.Playwright;

namespace Auditor.Browser.Tests;

/// <summary>Makes the README's picture of the demo's first screen, when AUDITOR_PICTURE is 1.</summary>
public sealed class FirstScreenPicture(Chromium chromium)
{
    private const int MostBytes = 150_000;

    private static readonly string Kept = Path.Combine(TestFolders.Demo, "first-screen.png");

    [Fact]
    public async Task Make_the_picture()
    {
        Assert.SkipUnless(Environment.GetEnvironmentVariable("AUDITOR_PICTURE") == "1", "Makes the README's picture only when AUDITOR_PICTURE is 1.");
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo), new() { ColorScheme = ColorScheme.Light, ViewportSize = new() { Width = 1200, Height = 900 } });

        // Down to the line under the fourth exclusion: what a screen shows, without half a line.
        float height = await open.Page.Locator(".ledger li").Nth(3).EvaluateAsync<float>("line => Math.ceil(line.getBoundingClientRect().bottom)");
        await open.Page.ScreenshotAsync(new() { Path = Kept, Clip = new() { X = 0, Y = 0, Width = 1200, Height = height } });

        Assert.InRange(new FileInfo(Kept).Length, 10_000, MostBytes);
    }
}
