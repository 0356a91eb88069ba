using Auditor.Browser.Tests;
using Microsoft.Playwright;

[assembly: AssemblyFixture(typeof(Chromium))]

namespace Auditor.Browser.Tests;

/// <summary>The machine's own Chromium, started once for all tests; nothing is downloaded. Without one the tests are skipped.</summary>
public sealed class Chromium : IAsyncLifetime
{
    private const string Variable = "AUDITOR_CHROMIUM";
    private static readonly string[] Names = ["chromium", "chromium-browser", "google-chrome", "google-chrome-stable"];
    private static readonly string[] Quiet =
        ["--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync", "--disable-gpu"];

    private IPlaywright? _driver;
    private IBrowser? _browser;

    public async ValueTask InitializeAsync()
    {
        if (Executable() is { } executable)
        {
            Assertions.SetDefaultExpectTimeout(20_000);
            _driver = await Playwright.CreateAsync();
            _browser = await _driver.Chromium.LaunchAsync(new() { ExecutablePath = executable, ChromiumSandbox = false, Args = Quiet });
        }
    }

    public async ValueTask DisposeAsync()
    {
        if (_browser is not null)
        {
            await _browser.DisposeAsync();
        }

        _driver?.Dispose();
    }

    /// <summary>Opens a page from a file, as a reader does, in a context of its own.</summary>
    internal async Task<OpenPage> Open(string html, BrowserNewContextOptions? options = null, bool axe = false)
    {
        Assert.SkipUnless(_browser is not null, $"No Chromium on this machine: none of {string.Join(", ", Names)} is on the PATH and {Variable} names none.");
        return await OpenPage.Of(_browser!, html, options ?? new(), axe);
    }

    private static string? Executable() => Environment.GetEnvironmentVariable(Variable) is { Length: > 0 } named
        ? named
        : (Environment.GetEnvironmentVariable("PATH") ?? "").Split(Path.PathSeparator)
            .SelectMany(folder => Names.Select(name => Path.Combine(folder, name)))
            .FirstOrDefault(File.Exists);
}
