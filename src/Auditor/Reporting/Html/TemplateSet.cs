using Scriban;
using Scriban.Parsing;
using Scriban.Runtime;
using Scriban.Syntax;

namespace Auditor.Reporting.Html;

/// <summary>The templates of one page, each parsed once. A template that includes another gets finished HTML, which is not encoded a second time.</summary>
internal sealed class TemplateSet(Func<string, string> read) : IScriptCustomFunction
{
    private readonly Dictionary<string, Template> _parsed = [];

    public int RequiredParameterCount => 1;

    public int ParameterCount => 1;

    public ScriptVarParamKind VarParamKind => ScriptVarParamKind.Direct;

    public Type ReturnType => typeof(Markup);

    /// <exception cref="InvalidOperationException">A template does not parse or uses what is banned: a fault of the templates.</exception>
    /// <exception cref="ScriptRuntimeException">A template uses an unknown name; the message begins with file(line,column).</exception>
    public string Render(string name, object page)
    {
        var context = new EscapingContext(this);
        context.PushGlobal(new ScriptObject { ["page"] = page });
        return Parsed(name).Render(context);
    }

    public ScriptParameterInfo GetParameterInfo(int index) => new(typeof(object), index == 0 ? "template" : "value");

    public object? Invoke(TemplateContext context, ScriptNode? callerContext, ScriptArray arguments, ScriptBlockStatement? blockStatement) =>
        new Markup(context.RenderTemplate(Parsed((string)arguments[0]!), arguments, callerContext));

    public ValueTask<object?> InvokeAsync(TemplateContext context, ScriptNode? callerContext, ScriptArray arguments, ScriptBlockStatement? blockStatement) =>
        ValueTask.FromResult(Invoke(context, callerContext, arguments, blockStatement));

    private Template Parsed(string name)
    {
        if (!_parsed.TryGetValue(name, out Template? template))
        {
            template = Template.Parse(read(name), name);
            Refuse(template.Messages.Where(message => message.Type == ParserMessageType.Error).Select(message => message.ToString()));
            var captures = new Captures();
            captures.Visit(template.Page);
            Refuse(captures.Found);
            _parsed[name] = template;
        }

        return template;
    }

    private static void Refuse(IEnumerable<string> faults)
    {
        string text = string.Join('\n', faults);
        if (text.Length > 0)
        {
            throw new InvalidOperationException(text);
        }
    }

    /// <summary>What a template captures comes back as text and would be encoded twice.</summary>
    private sealed class Captures : ScriptVisitor
    {
        public List<string> Found { get; } = [];

        public override void Visit(ScriptCaptureStatement node) => Found.Add($"{node.Span.ToStringSimple()}: capture is not allowed, include a template instead");
    }
}
