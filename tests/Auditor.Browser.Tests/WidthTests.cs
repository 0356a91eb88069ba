using System.Diagnostics;
using System.Text;
using System.Text.RegularExpressions;
using Microsoft.Playwright;

namespace Auditor.Browser.Tests;

/// <summary>Nothing is cut off: on paper, and on a narrow screen.</summary>
public sealed partial class WidthTests(Chromium chromium, ITestOutputHelper output)
{
    /// <summary>What sticks out of the page at the right, or has to be scrolled sideways inside it.</summary>
    private const string TooWide = """
        scrolled => {
          const width = document.documentElement.clientWidth;
          const out = document.documentElement.scrollWidth > width ? ['the page: ' + document.documentElement.scrollWidth + ' of ' + width] : [];
          for (const part of document.querySelectorAll(scrolled ? 'main *' : 'main > *, h1, h2, h3, h4, p, dd, figure')) {
            if (!part.checkVisibility() || part.closest('svg svg')) continue;
            const over = part.getBoundingClientRect().right - width;
            const inside = scrolled && getComputedStyle(part).display !== 'inline' && !(part instanceof SVGElement) ? part.scrollWidth - part.clientWidth : 0;
            if (over > 0.5 || inside > 1) out.push(part.tagName + '.' + (part.className.baseVal ?? part.className) + ' ' + Math.max(over, inside) + ': ' + part.textContent.slice(0, 60));
          }
          return out;
        }
        """;

    [Theory]
    [InlineData(ReportPages.Demo)]
    [InlineData(ReportPages.Hostile)]
    [InlineData(ReportPages.Nulls)]
    public async Task A_narrow_screen_never_scrolls_sideways(string page)
    {
        await using var open = await chromium.Open(ReportPages.Named(page), new() { ViewportSize = new() { Width = 360, Height = 740 } });

        Assert.Empty(await open.Ask<string[]>(TooWide, false));
    }

    [Theory]
    [InlineData(ReportPages.Demo, "A4", 210.0)]
    [InlineData(ReportPages.Demo, "Letter", 215.9)]
    [InlineData(ReportPages.Hostile, "A4", 210.0)]
    public async Task On_paper_nothing_is_wider_than_the_page_and_every_heading_is_there(string page, string paper, double millimetres)
    {
        const double margins = 32;
        int width = (int)((millimetres - margins) / 25.4 * 96);
        await using var open = await chromium.Open(ReportPages.Named(page), new() { ViewportSize = new() { Width = width, Height = 900 } });
        await open.Page.EmulateMediaAsync(new() { Media = Media.Print });
        Assert.Empty(await open.Ask<string[]>(TooWide, true));
        await AssertVisible(open.Page.Locator("h1, main h2:not(#what-if-title), h3, h4, caption"));

        byte[] pdf = await open.Page.PdfAsync(new() { Format = paper, PrintBackground = true });

        int pages = PageObject().Count(Encoding.Latin1.GetString(pdf));
        output.WriteLine($"{page} on {paper}: {pages} pages, {pdf.Length} bytes");
        Assert.InRange(pages, 2, 60);
        await AssertPrinted(pdf, await open.Page.Locator(page == ReportPages.Demo ? "h1, main h2:not(#what-if-title), h3, h4, caption" : "main h2:not(#what-if-title)").AllTextContentsAsync());
    }

    [Fact]
    public async Task What_is_folded_prints_all_the_same()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        await open.Page.GetByText("Fold all", new() { Exact = true }).ClickAsync();
        await open.Page.EmulateMediaAsync(new() { Media = Media.Print });

        await AssertPrinted(await open.Page.PdfAsync(new() { Format = "A4" }), await open.Page.Locator("main caption, main h4").AllTextContentsAsync());
    }

    private static async Task AssertVisible(ILocator headings)
    {
        foreach (var heading in await headings.AllAsync())
        {
            Assert.True(await heading.IsVisibleAsync(), await heading.TextContentAsync());
        }
    }

    /// <summary>By pdftotext where it is installed; spaces and line ends do not count.</summary>
    private async Task AssertPrinted(byte[] pdf, IReadOnlyList<string> headings)
    {
        if (await Text(pdf) is not { } text)
        {
            output.WriteLine("pdftotext is not installed: the text of the PDF was not read.");
            return;
        }

        Assert.True(headings.Count > 10);
        Assert.All(headings, heading => Assert.Contains(Space().Replace(heading, ""), text, StringComparison.Ordinal));
    }

    private static async Task<string?> Text(byte[] pdf)
    {
        string file = Path.GetTempFileName();
        try
        {
            await File.WriteAllBytesAsync(file, pdf, TestContext.Current.CancellationToken);
            using var process = Process.Start(new ProcessStartInfo("pdftotext", ["-enc", "UTF-8", file, "-"]) { RedirectStandardOutput = true, StandardOutputEncoding = Encoding.UTF8 })!;
            return Space().Replace(await process.StandardOutput.ReadToEndAsync(TestContext.Current.CancellationToken), "");
        }
        catch (System.ComponentModel.Win32Exception)
        {
            return null;
        }
        finally
        {
            File.Delete(file);
        }
    }

    [GeneratedRegex(@"/Type\s*/Page\b")]
    private static partial Regex PageObject();

    [GeneratedRegex(@"\s+")]
    private static partial Regex Space();
}
