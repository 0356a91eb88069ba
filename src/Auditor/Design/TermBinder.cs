using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>
/// Binds declared terms to a table: settles kinds, levels, means and limits over the kept rows, once, so that the bound term makes the same columns for any
/// subset of rows. Every column that a term mentions must have been read.
/// </summary>
/// <param name="keptRows">0-based rows that the filter left, at least one, rising.</param>
/// <param name="columns">The column declarations (reference, levels).</param>
/// <param name="period">The unit of a trend over dates; days when not declared.</param>
/// <param name="file">The declaration, for messages.</param>
/// <param name="order">The declared order of all rows of the table; null when there is none.</param>
/// <remarks>Not thread-safe: notes gather. The bound terms are immutable and may be used from several threads.</remarks>
public sealed class TermBinder(
    DataTable table, RowSubset keptRows, IReadOnlyDictionary<string, ColumnDeclaration> columns, Period? period, string file, TimeOrder? order = null)
{
    private readonly BindingScope _scope = new(table, keptRows, columns, period, order, file);

    /// <summary>What was noted while binding, in the order it was met, nothing twice.</summary>
    public IReadOnlyList<BindingNote> Notes => _scope.Notes;

    public Reading<BoundTerm> Bind(Term term)
    {
        _scope.Problems.Clear();
        return Any(term) is { } bound && _scope.Problems.Count == 0
            ? Reading<BoundTerm>.Of(bound)
            : Reading<BoundTerm>.Failed([.. _scope.Problems]);
    }

    private BoundTerm? Any(Term term) => term switch
    {
        ColumnTerm column => ColumnBinding.Column(_scope, column),
        IndicatorTerm indicator => ColumnBinding.Indicator(_scope, indicator),
        StepTerm step => TimeBinding.Step(_scope, step),
        PulseTerm pulse => TimeBinding.Pulse(_scope, pulse),
        SeasonTerm season => TimeBinding.Season(_scope, season),
        TrendTerm trend => TimeBinding.Trend(_scope, trend),
        RatioTerm or MinusTerm => Pair(term),
        ProductTerm product => Product(product),
        TimeOrderTerm shifted => OneColumn(shifted.Of, term) is { } of ? TimeOrderBinding.Of(_scope, shifted, of) : null,
        _ => OfOne(term),
    };

    private BoundTerm? OfOne(Term term) => OneColumn(term.Parts[0], term) is { } of
        ? NumberBinding.Of(_scope, term, of)
        : null;

    private BoundPair? Pair(Term term)
    {
        var left = OneColumn(term.Parts[0], term);
        var right = OneColumn(term.Parts[1], term);
        return left is null || right is null ? null
            : new BoundPair(term, left, right, term is RatioTerm ? (a, b) => a / b : (a, b) => a - b);
    }

    /// <summary>All factors are bound before one that failed counts, so that every problem is listed.</summary>
    private BoundProduct? Product(ProductTerm product)
    {
        List<BoundTerm> factors = [.. product.Factors.Select(Any).OfType<BoundTerm>()];
        return factors.Count == product.Factors.Count ? new BoundProduct(product, factors) : null;
    }

    private BoundTerm? OneColumn(Term part, Term whole) => Several(part) is { } why
        ? _scope.Refuse(whole, $"{whole.Label}: {why}, expected a number")
        : Any(part);

    /// <summary>Why a term is not one number by its nature, null when it is; the number of levels that happen to be there does not count.</summary>
    private string? Several(Term term) => term switch
    {
        ColumnTerm column when _scope[column].Kind == ColumnKind.Levels => $"{term.Label} holds levels",
        SeasonTerm or PolynomialTerm or SplineTerm or BinsTerm => $"{term.Label} makes several columns",
        ProductTerm product => product.Factors.Select(Several).FirstOrDefault(why => why is not null),
        _ => null,
    };
}
