using Auditor.Declaration;
using Auditor.Design;

namespace Auditor.Analysis;

/// <summary>
/// Products that stand in the final model or in another group and contain a term of this group: the group's test is then of a value that depends on
/// where its variables' zero lies and on how levels are coded. A term is contained when its factors are some, not all, of the product's; centring a
/// variable and writing a term in other words change nothing.
/// </summary>
internal static class ProductsElsewhere
{
    public static IReadOnlyList<string> Of(BoundModel model, int group) => Holding(
        model.Groups[group].Terms,
        model.FinalTerms.Concat(model.Groups.Where((_, other) => other != group).SelectMany(other => other.Terms)));

    /// <summary>Of all groups taken as one: products of the final model alone are elsewhere.</summary>
    public static IReadOnlyList<string> OfAll(BoundModel model) => Holding(model.Groups.SelectMany(group => group.Terms), model.FinalTerms);

    private static List<string> Holding(IEnumerable<BoundTerm> own, IEnumerable<BoundTerm> elsewhere)
    {
        var terms = own.Select(term => Factors(term.Term)).ToList();
        return [.. elsewhere
            .Select(term => term.Term)
            .OfType<ProductTerm>()
            .Where(product => terms.Exists(term => IsProperPart(term, Factors(product))))
            .Select(product => product.Label)
            .Distinct(StringComparer.Ordinal)];
    }

    /// <summary>What a term multiplies, in one way of writing, each factor as it is before it is centred; a term that is no product is its own factor.</summary>
    private static List<Term> Factors(Term term) => TermMeaning.Of(term) switch
    {
        ProductTerm product => [.. product.Factors.SelectMany(Factors)],
        TransformTerm { Transform: NumberTransform.Center } centred => Factors(centred.Of),
        var other => [other],
    };

    private static bool IsProperPart(List<Term> part, List<Term> whole) =>
        part.Count < whole.Count && part.GroupBy(factor => factor).All(same => same.Count() <= whole.Count(factor => factor.Equals(same.Key)));
}
