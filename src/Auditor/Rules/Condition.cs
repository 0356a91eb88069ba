using Auditor.Facts;
using Auditor.Policies;

namespace Auditor.Rules;

/// <summary>How a fact is held against the right side.</summary>
public enum Comparison
{
    EqualTo,
    Not,
    OneOf,
    Below,
    AtMost,
    Above,
    AtLeast,

    /// <summary>Whether the fact could be computed at all.</summary>
    Present,
}

/// <summary>One line of a rule's <c>when</c>. Its answer has three states: it holds, it does not, or a fact it needs could not be computed.</summary>
public abstract record Condition
{
    public abstract Answer Ask(FactSet facts, Policy policy);

    /// <summary>The condition as it stands in a rule file.</summary>
    public abstract string Wording { get; }
}

/// <summary>A simple test on one fact.</summary>
/// <param name="Right">One value; several for <see cref="Comparison.OneOf"/>.</param>
public sealed record FactCondition(FactDefinition Fact, Comparison Comparison, IReadOnlyList<Operand> Right) : Condition
{
    public override string Wording =>
        $"{Fact.Name} {Comparison.Word()} " + string.Join(" or ", Right.Select(operand => operand.Wording));

    public override Answer Ask(FactSet facts, Policy policy)
    {
        var left = facts[Fact.Name];
        var right = Right.Select(operand => operand.Resolve(policy));
        return (Comparison, left) switch
        {
            (Comparison.Present, _) => Answer.Of(right.First() == FactValue.Of(left is not FactValue.NotComputable, "")),
            (_, FactValue.NotComputable missing) => Answer.Undecided($"{Fact.Name} could not be computed: {missing.Why}"),
            (Comparison.Not, _) => Answer.Of(!Same(left, right.First())),
            (Comparison.EqualTo or Comparison.OneOf, _) => Answer.Of(right.Any(value => Same(left, value))),
            _ => Answer.Of(InOrder(Amount(left), Amount(right.First()))),
        };
    }

    private static bool Same(FactValue left, FactValue right) =>
        left is FactValue.Text or FactValue.Flag ? left == right : Amount(left).Equals(Amount(right));

    private static double Amount(FactValue value) => value switch
    {
        FactValue.Number number => number.Value,
        FactValue.Count count => count.Value,
        _ => throw new InvalidOperationException("the reader lets only numbers into a comparison by size"),
    };

    private bool InOrder(double left, double right) => Comparison switch
    {
        Comparison.Below => left < right,
        Comparison.AtMost => left <= right,
        Comparison.Above => left > right,
        _ => left >= right,
    };
}

/// <summary>Alternatives, one of which must hold.</summary>
public sealed record AnyCondition(IReadOnlyList<FactCondition> Alternatives) : Condition
{
    public override string Wording => "any of: " + string.Join("; ", Alternatives.Select(alternative => alternative.Wording));

    public override Answer Ask(FactSet facts, Policy policy) => Answer.Any(Alternatives.Select(alternative => alternative.Ask(facts, policy)));
}
