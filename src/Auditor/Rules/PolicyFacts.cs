using Auditor.Facts;
using Auditor.Policies;

namespace Auditor.Rules;

/// <summary>A policy value as the right side of a comparison with a fact.</summary>
internal static class PolicyFacts
{
    public static FactValue AsFact(this PolicyValue value) => value.Type switch
    {
        PolicyType.Count => new FactValue.Count((long)value.Number!.Value),
        PolicyType.Flag => new FactValue.Flag(value.Flag!.Value),
        PolicyType.Text => new FactValue.Text(value.Text!),
        _ => new FactValue.Number(value.Number!.Value),
    };
}
