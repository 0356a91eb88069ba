using Auditor.Declaration;
using Auditor.Design;

namespace Auditor.Analysis;

/// <summary>
/// Products that stand in the final model or in another group and hold a term of this group: the group's test is then of a value that depends on
/// where its variables' zero lies and on how levels are coded.
/// </summary>
internal static class ProductsElsewhere
{
    public static IReadOnlyList<string> Of(BoundModel model, int group)
    {
        var own = model.Groups[group].Terms.Select(term => term.Term).ToHashSet();
        var others = model.Groups.Where((_, other) => other != group).SelectMany(other => other.Terms);
        return [.. model.FinalTerms.Concat(others)
            .Select(term => term.Term)
            .OfType<ProductTerm>()
            .Where(product => product.Factors.Any(own.Contains))
            .Select(product => product.Label)
            .Distinct(StringComparer.Ordinal)];
    }
}
