using System.Globalization;

namespace Auditor.Reporting.Html;

/// <summary>A name cut to the room there is, by letters as readers see them.</summary>
internal static class ShortName
{
    public static string Of(string name, int longest)
    {
        var text = new StringInfo(name);
        return text.LengthInTextElements <= longest ? name : text.SubstringByTextElements(0, longest - 1).TrimEnd() + "…";
    }
}
