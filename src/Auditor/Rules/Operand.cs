using Auditor.Facts;
using Auditor.Policies;

namespace Auditor.Rules;

/// <summary>The right side of a comparison: a value written in the rule, or a value of the policy by name. One of the two is set.</summary>
public sealed record Operand(FactValue? Value, string? PolicyName)
{
    public string Wording => PolicyName is null ? Figures.Setting(Value!) : ComparisonWords.PolicyPrefix + PolicyName;

    public FactValue Resolve(Policy policy) => Value ?? FromPolicy(policy);

    private FactValue FromPolicy(Policy policy) => policy.TryGet(PolicyName!, out var value)
        ? value.AsFact()
        : throw new InvalidOperationException($"the rules were read against another policy: no '{PolicyName}'");
}
