using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The key <c>final_model</c>.</summary>
internal static class FinalModelReader
{
    public const string Where = "final_model.terms";

    /// <summary>The terms that could be read are kept, so that they can be held against the groups although others are wrong.</summary>
    public static FinalModelDeclaration? Read(Place place, ColumnNames columns)
    {
        if (Keys.Of(place, "intercept", "terms") is not { } keys)
        {
            return null;
        }

        var intercept = keys.Optional("intercept") is not { } constant || constant.TrueOrFalse() != false;
        var list = keys.Required("terms", "a list of terms, which may be empty when there is an intercept");
        var terms = list?.Items("terms") is { } items ? items.Select(new TermReader(columns, Where).Read).OfType<Term>().ToList() : [];
        if (!intercept && list is { IsNothing: true } or { Node: ListValue { Items.Count: 0 } })
        {
            keys.Add("a model without an intercept needs at least one term");
        }

        return new FinalModelDeclaration(intercept, terms);
    }
}
