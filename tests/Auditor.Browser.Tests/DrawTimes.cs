using System.Globalization;
using System.Runtime.InteropServices;
using System.Text;
using Auditor.Tests;
using Auditor.Tests.Reporting;

namespace Auditor.Browser.Tests;

/// <summary>
/// Measures how long a page takes from being opened to being drawn, when AUDITOR_DRAW_TIMES is 1 (tests/benchmarks/draw-time.sh), and keeps the figures beside that script.
/// Times are the browser's own, in milliseconds since the navigation began: first text on the screen; the page's own script done; and the second frame after everything is
/// loaded, when nothing is left to lay out. Each opening is in a new context, so nothing is cached.
/// </summary>
public sealed class DrawTimes(Chromium chromium)
{
    private const int Runs = 9;

    private const string Drawn = """
        async () => {
          await new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done)));
          const drawn = performance.now();
          const [page] = performance.getEntriesByType('navigation');
          const text = performance.getEntriesByName('first-contentful-paint')[0];
          return [text ? text.startTime : drawn, page.domContentLoadedEventEnd, drawn];
        }
        """;

    [Fact]
    public async Task Measure()
    {
        Assert.SkipUnless(Environment.GetEnvironmentVariable("AUDITOR_DRAW_TIMES") == "1", "Measures only when AUDITOR_DRAW_TIMES is 1.");
        (string Name, string Html)[] pages =
        [
            ("demo, 3,079 rows, 7 groups", ReportPages.Named(ReportPages.Demo)),
            (string.Create(CultureInfo.InvariantCulture, $"{LargeAudit.Rows:N0} rows, {LargeAudit.Groups} groups"), Pages.Render(LargeAudit.Record())),
        ];
        var text = new StringBuilder();
        foreach (var (name, html) in pages)
        {
            double[][] runs = new double[Runs][];
            for (var run = 0; run < Runs; run++)
            {
                runs[run] = await Once(html);
            }

            text.Append(CultureInfo.InvariantCulture, $"| {name} | {Encoding.UTF8.GetByteCount(html) / 1000:N0} | {Median(runs, 0):F0} | {Median(runs, 1):F0} | {Median(runs, 2):F0} | {runs.Max(run => run[2]):F0} |\n");
            Assert.All(runs, run => Assert.InRange(run[2], 1, 60_000));
        }

        await File.WriteAllTextAsync(Path.Combine(TestFolders.Root, "tests", "benchmarks", "draw-time-results.md"), await Head() + text, TestContext.Current.CancellationToken);
    }

    private async Task<double[]> Once(string html)
    {
        await using var open = await chromium.Open(html, new() { ViewportSize = new() { Width = 1280, Height = 900 } });
        return await open.Ask<double[]>(Drawn);
    }

    private async Task<string> Head()
    {
        await using var open = await chromium.Open("<!DOCTYPE html><title>version</title>");
        string browser = open.Page.Context.Browser!.Version;
        string day = DateTime.UtcNow.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
        return $"""
            # From opening a page to seeing it: figures of `draw-time.sh`

            {day}, headless Chromium {browser} without a graphics processor, {RuntimeInformation.RuntimeIdentifier}, {Environment.ProcessorCount} cores. A file on disk, window 1280 x 900, a new browser context each time. Medians of {Runs}, milliseconds from the start of the navigation.

            | page | kB | first text | own script done | drawn | drawn, slowest |
            |---|---|---|---|---|---|

            """;
    }

    private static double Median(double[][] runs, int which) => runs.Select(run => run[which]).Order().ElementAt(Runs / 2);
}
