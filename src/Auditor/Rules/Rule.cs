using Auditor.Facts;
using Auditor.Findings;
using Auditor.Policies;

namespace Auditor.Rules;

/// <summary>One row of a rule file, checked: every fact and policy name in it exists and fits.</summary>
/// <param name="Id">Stable; shown in reports, acceptances and records.</param>
/// <param name="When">Every condition must hold.</param>
/// <param name="Source">A published reference, or that it is common practice.</param>
/// <param name="Line">Where the rule starts in its file.</param>
public sealed record Rule(
    string Id,
    About About,
    IReadOnlyList<Condition> When,
    Severity Severity,
    MessageTemplate Message,
    MessageTemplate Advice,
    string Source,
    string File,
    int Line)
{
    public Answer Ask(FactSet facts, Policy policy) => Answer.All(When.Select(condition => condition.Ask(facts, policy)));
}
