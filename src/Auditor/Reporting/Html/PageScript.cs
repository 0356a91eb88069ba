using System.Security.Cryptography;
using System.Text;

namespace Auditor.Reporting.Html;

/// <summary>The page's one script, and the hash by which the page's content security policy allows it and no other.</summary>
internal sealed class PageScript(string text)
{
    private readonly string _text = text.ReplaceLineEndings("\n");

    public Markup Text => new(_text);

    public string Hash => "sha256-" + Convert.ToBase64String(SHA256.HashData(Encoding.UTF8.GetBytes(_text)));
}
