using System.Text;
using Microsoft.Playwright;

namespace Auditor.Browser.Tests;

/// <summary>A page opened from a temporary file, and what it asked for or complained about while it was open.</summary>
internal sealed class OpenPage : IAsyncDisposable
{
    private const string Listen = "addEventListener('securitypolicyviolation', (event) => console.error('policy: ' + event.violatedDirective + ' ' + event.blockedURI), true);";

    private readonly string _folder = Directory.CreateTempSubdirectory("auditor-page-").FullName;
    private readonly List<string> _asked = [];
    private readonly List<string> _complaints = [];
    private readonly IBrowserContext _context;

    private OpenPage(IBrowserContext context, IPage page)
    {
        _context = context;
        Page = page;
    }

    public IPage Page { get; }

    public string Address => new Uri(Path.Combine(_folder, "audit.html")).AbsoluteUri;

    /// <summary>Addresses asked for, the page's own among them.</summary>
    public IReadOnlyList<string> Asked => _asked;

    /// <summary>Errors and warnings of the console, uncaught errors, violations of the page's own policy.</summary>
    public IReadOnlyList<string> Complaints => _complaints;

    public static async Task<OpenPage> Of(IBrowser browser, string html, BrowserNewContextOptions options, bool axe)
    {
        // The page's own policy would refuse the checker's script.
        options.BypassCSP = axe;
        options.ReducedMotion = ReducedMotion.Reduce;
        options.Permissions = ["clipboard-read", "clipboard-write"];
        var context = await browser.NewContextAsync(options);
        var open = new OpenPage(context, await context.NewPageAsync());
        await open.Load(html);
        return open;
    }

    public async ValueTask DisposeAsync()
    {
        await _context.DisposeAsync();
        Directory.Delete(_folder, recursive: true);
    }

    public Task<T> Ask<T>(string script, object? argument = null) => Page.EvaluateAsync<T>(script, argument);

    private async Task Load(string html)
    {
        await File.WriteAllTextAsync(Path.Combine(_folder, "audit.html"), html, Encoding.UTF8, TestContext.Current.CancellationToken);
        _context.Request += (_, request) => _asked.Add(request.Url);
        Page.PageError += (_, error) => _complaints.Add(error);
        Page.Console += (_, message) => Note(message);
        await Page.AddInitScriptAsync(Listen);
        await Page.GotoAsync(Address);
    }

    private void Note(IConsoleMessage message)
    {
        if (message.Type is "error" or "warning")
        {
            _complaints.Add(message.Text);
        }
    }
}
