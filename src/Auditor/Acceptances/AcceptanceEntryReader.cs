using System.Globalization;
using Auditor.Facts;
using Auditor.Findings;
using Auditor.Rules;
using Auditor.Yaml;

namespace Auditor.Acceptances;

/// <summary>One accepted finding of an acceptances file.</summary>
internal sealed class AcceptanceEntryReader(IReadOnlyList<Rule> rules)
{
    private readonly Dictionary<string, Rule> _rules = rules.ToDictionary(rule => rule.Id, StringComparer.Ordinal);

    public AcceptanceEntry? Read(Place item)
    {
        if (Keys.Of(item, "rule", "subject", "model", "version", "severity", "worst", "approved_by", "approved_on", "expires", "because") is not { } keys)
        {
            return null;
        }

        var rule = keys.Required("rule", "the id of a rule") is { } named ? ReadRule(named) : null;
        var subject = Text(keys, "subject", "the finding's subject, such as the name of a left-out group");
        var model = Text(keys, "model", "the id of the model");
        var version = Text(keys, "version", "the version of the model that was looked at");
        var severity = keys.Required("severity", "the severity of the finding, " + Words.Or(SeverityWords.All))?.OneOf(SeverityWords.Choices);
        var worst = keys.Optional("worst") is { } limits ? ReadWorst(limits, rule) : null;
        var approvedBy = Text(keys, "approved_by", "the name of the approver");
        var approvedOn = Date(keys, "approved_on");
        var expires = Date(keys, "expires");
        var because = Text(keys, "because", "the reason for accepting the finding");
        return InOrder(keys, approvedOn, expires) && rule is not null && subject is not null && model is not null && version is not null && severity is Severity grave
            && approvedBy is not null && approvedOn is DateOnly from && expires is DateOnly to && because is not null
            ? new AcceptanceEntry(rule.Id, subject, model, version, grave, worst, approvedBy, from, to, because, item.Line)
            : null;
    }

    private Rule? ReadRule(Place named)
    {
        if (named.Text("the id of a rule") is not { } id)
        {
            return null;
        }

        if (!_rules.TryGetValue(id, out var rule))
        {
            named.Add($"no rule has the id '{Words.Short(id)}'" + NearestName.DidYouMean(id, _rules.Keys));
        }
        else if (rule.About == About.Acceptance)
        {
            named.Add($"'{id}' is about acceptances themselves; such a finding cannot be accepted");
        }

        return rule;
    }

    private static WorstAccepted? ReadWorst(Place limits, Rule? rule)
    {
        if (Keys.Of(limits, "p", "partial_r_squared") is not { } keys)
        {
            return null;
        }

        if (keys.Present("p", "partial_r_squared").Count == 0)
        {
            keys.RefuseChoice("p or partial_r_squared or both", ["p", "partial_r_squared"]);
        }

        return new WorstAccepted(
            Limit(keys, "p", rule, Evidence.PFact), Limit(keys, "partial_r_squared", rule, Evidence.EffectFact));
    }

    /// <summary>A limit that could never be compared with anything would be accepted and ignored: it is a problem.</summary>
    private static double? Limit(Keys keys, string key, Rule? rule, Func<About, string?> factOf)
    {
        if (keys.Optional(key) is not { } place)
        {
            return null;
        }

        if (rule is not null && rule.About != About.Acceptance && factOf(rule.About) is null)
        {
            place.Add($"a finding of '{rule.Id}' has no {(key == "p" ? "p" : "partial R²")} to compare this with; leave it out");
        }

        return place.Number("a number from 0 to 1", number => number is >= 0 and <= 1);
    }

    private static string? Text(Keys keys, string key, string expected)
    {
        if (keys.Required(key, expected) is not { } place)
        {
            return null;
        }

        if (place.Text(expected) is { } text && string.IsNullOrWhiteSpace(text))
        {
            place.Refuse(expected);
        }

        return (place.Node as TextValue)?.Text;
    }

    private static DateOnly? Date(Keys keys, string key)
    {
        const string expected = "a date as YYYY-MM-DD";
        if (keys.Required(key, expected) is not { } place)
        {
            return null;
        }

        if (place.Node is TextValue { Text: var text } && DateOnly.TryParseExact(text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out var date))
        {
            return date;
        }

        place.Refuse(expected);
        return null;
    }

    private static bool InOrder(Keys keys, DateOnly? approvedOn, DateOnly? expires)
    {
        if (approvedOn is not DateOnly from || expires is not DateOnly to || from <= to)
        {
            return true;
        }

        keys.Add(string.Create(CultureInfo.InvariantCulture, $"expires {to:yyyy-MM-dd} is before approved_on {from:yyyy-MM-dd}"));
        return false;
    }
}
