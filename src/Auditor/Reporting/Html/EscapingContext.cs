using System.Net;
using System.Reflection;
using System.Text.Json;
using System.Text.Json.Serialization;
using Scriban;
using Scriban.Parsing;
using Scriban.Runtime;

namespace Auditor.Reporting.Html;

/// <summary>Text that is already HTML. Only the renderer of templates makes it, so nothing from a record can be one.</summary>
internal sealed record Markup(string Html)
{
    public override string ToString() => Html;
}

/// <summary>Evaluates templates so that every value is encoded, every unknown name is an error, and nothing is cut.</summary>
internal sealed class EscapingContext : TemplateContext
{
    public EscapingContext(IScriptCustomFunction include)
    {
        StrictVariables = true;
        EnableRelaxedMemberAccess = false;
        EnableRelaxedTargetAccess = false;
        EnableRelaxedFunctionAccess = false;
        EnableRelaxedIndexerAccess = false;
        // The defaults cut a page at one mebibyte without a word and stop a loop at a thousand.
        LimitToString = 0;
        LoopLimit = 0;
        NewLine = "\n";
        // Names in templates are the names in the record.
        MemberRenamer = RecordName;
        PushCulture(System.Globalization.CultureInfo.InvariantCulture);
        BuiltinObject.Remove("date");
        BuiltinObject.Remove("regex");
        BuiltinObject.Remove("include_join");
        var evaluators = (ScriptObject)BuiltinObject["object"]!;
        evaluators.Remove("eval_template");
        evaluators.Remove("eval");
        BuiltinObject.SetValue("include", include, readOnly: true);
    }

    public override TemplateContext Write(SourceSpan span, object? textAsObject)
    {
        string? text = textAsObject is Markup markup ? markup.Html : WebUtility.HtmlEncode(ObjectToString(textAsObject));
        return Write(text ?? "");
    }

    private static string RecordName(MemberInfo member) =>
        member.GetCustomAttribute<JsonPropertyNameAttribute>()?.Name ?? JsonNamingPolicy.SnakeCaseLower.ConvertName(member.Name);
}
