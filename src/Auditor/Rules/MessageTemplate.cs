using System.Text;
using Auditor.Facts;
using Auditor.Policies;

namespace Auditor.Rules;

/// <summary>
/// Text with <c>{fact}</c> and <c>{policy.name}</c> in it; <c>{{</c> and <c>}}</c> stand for the braces. Filled in one go: what a
/// value holds is never read as template again. The result is plain text, to be encoded by whoever writes a page.
/// </summary>
public sealed class MessageTemplate
{
    private readonly IReadOnlyList<(string Text, bool IsName)> _parts;

    private MessageTemplate(string text, IReadOnlyList<(string Text, bool IsName)> parts)
    {
        Text = text;
        _parts = parts;
    }

    /// <summary>As written in the rule file.</summary>
    public string Text { get; }

    public IEnumerable<string> Names => _parts.Where(part => part.IsName).Select(part => part.Text);

    /// <summary>Null when a brace has no partner.</summary>
    public static MessageTemplate? Parse(string text)
    {
        var parts = new List<(string, bool)>();
        var literal = new StringBuilder();
        for (var at = 0; at < text.Length; at++)
        {
            if (text[at] is not ('{' or '}'))
            {
                literal.Append(text[at]);
            }
            else if (at + 1 < text.Length && text[at + 1] == text[at])
            {
                literal.Append(text[at++]);
            }
            else if (text[at] == '{' && text.IndexOf('}', at) is > 0 and var end)
            {
                parts.Add((literal.ToString(), false));
                literal.Clear();
                parts.Add((text[(at + 1)..end], true));
                at = end;
            }
            else
            {
                return null;
            }
        }

        parts.Add((literal.ToString(), false));
        return new MessageTemplate(text, parts);
    }

    public string Fill(FactSet facts, Policy policy) =>
        Joined(_parts.Select(part => part.IsName ? Value(part.Text, facts, policy) : part.Text));

    /// <summary>"p = {p}" of a p that is only known to be smaller than something is "p &lt; 0.0001".</summary>
    private static string Joined(IEnumerable<string> parts)
    {
        var text = new StringBuilder();
        foreach (var part in parts)
        {
            if (part.Length > 0 && part[0] is '<' or '>' && text.Length > 1 && text[^2] == '=' && text[^1] == ' ')
            {
                text.Length -= "= ".Length;
            }

            text.Append(part);
        }

        return text.ToString();
    }

    private static double Level(Policy policy) => policy.TryGet("significance", out var value) && value.AsFact() is FactValue.Number level ? level.Value : 1;

    private static string Value(string name, FactSet facts, Policy policy)
    {
        if (!name.StartsWith(ComparisonWords.PolicyPrefix, StringComparison.Ordinal))
        {
            return FactCatalogue.Find(facts.About, name) is { Words.Count: > 0 } && facts[name] is FactValue.Text word
                ? FactWords.InWords(name, word.Value)
                : Figures.Shown(facts[name], FactCatalogue.Find(facts.About, name)?.Unit ?? FactUnits.None, Level(policy));
        }

        return policy.TryGet(name[ComparisonWords.PolicyPrefix.Length..], out var value)
            ? value.Type == PolicyType.Share ? Figures.SettingAsPercent(value.AsFact()) : Figures.SettingInWords(value.AsFact())
            : throw new InvalidOperationException($"the rules were read against another policy: no '{name}'");
    }
}
