using Auditor.Facts;
using Auditor.Policies;
using Auditor.Yaml;

namespace Auditor.Rules;

/// <summary>What to say of a name in a rule that is not known; null when it is.</summary>
internal static class KnownNames
{
    public static string? UnknownFact(About about, string name)
    {
        var known = FactCatalogue.Of(about);
        return known.Any(fact => fact.Name == name) ? null
            : known.Count == 0 ? $"unknown fact '{name}': there are no facts about '{about.Word()}' yet"
            : $"unknown fact '{name}' about '{about.Word()}'" + NearestName.Hint(name, [.. known.Select(fact => fact.Name)]);
    }

    /// <param name="reference">With its prefix, <c>policy.NAME</c>.</param>
    public static string? UnknownPolicy(string reference, Policy policy)
    {
        var name = reference[ComparisonWords.PolicyPrefix.Length..];
        return policy.TryGet(name, out _) ? null : $"unknown policy name '{name}'" + NearestName.Hint(name, policy.Names);
    }
}
