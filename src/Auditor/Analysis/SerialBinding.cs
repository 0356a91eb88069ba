using Auditor.Declaration;
using Auditor.Design;
using Auditor.Numerics.ResidualChecks;
using Order = Auditor.Numerics.ResidualChecks.SerialOrder;

namespace Auditor.Analysis;

/// <summary>What the checks of order and of a split need, from the declared structure and the final model's terms.</summary>
internal static class SerialBinding
{
    private const string NoPeriods = "time holds dates and no period is declared, so neighbouring rows cannot be told from rows with a gap between them; declare data.period";

    /// <param name="rows">The fit that is shown.</param>
    public static SerialInputs Of(BoundModel model, RowSetFit rows)
    {
        var structure = model.Structure.Among(rows.Rows);
        var (order, noOrder) = OrderOf(model, structure, rows);
        var (second, noSplit) = SecondOf(structure);
        return new SerialInputs(
            order,
            noOrder,
            HasLaggedResponse(model),
            PartOf(model),
            model.FinalTerms.Where(term => !IsFunctionOfTime(term.Term, model)).Sum(term => term.ColumnLabels.Count),
            second,
            noSplit);
    }

    /// <summary>Whether a term is no change: a series that drifts looks related to a drifting residual when it is not, and so do a trend and a step.</summary>
    public static bool MayDrift(Term term) => term is not TimeOrderTerm { Operation: TimeOrderOperation.Change };

    private static (Order? Order, string? Why) OrderOf(BoundModel model, RowStructure structure, RowSetFit rows)
    {
        if (model.Structure.Time is not { } time)
        {
            return (null, SerialInputs.NoOrder);
        }

        if (time.Steps is not { } steps && structure.Order!.TiedRows > 0)
        {
            return (null, SerialInputs.SharedPeriod);
        }

        var units = structure.Units?.Codes ?? new int[rows.Rows.Count];
        long[] periods = time.Steps is { } counted
            ? [.. rows.Rows.Select(row => counted[row])]
            : [.. structure.Periods!.Codes.Select(code => (long)code)];
        return time.Steps is null && time.Column is Data.DateColumn
            ? (null, NoPeriods)
            : Order.Of(units, periods) is { } order ? (order, null) : (null, SerialInputs.SharedPeriod);
    }

    private static (IReadOnlyList<bool>? Second, string? Why) SecondOf(RowStructure structure) => structure.Split switch
    {
        null => (null, SerialInputs.NoSplit),
        { WithoutPlace: > 0 and var rows } => (null, $"{PlainNumber.Count(rows)} rows have no value of the split column and lie in neither part"),
        { First: 0 } or { Second: 0 } => (null, "all rows that are used lie in one part of the split"),
        var split => ([.. split.InFirst.Select(first => !first)], null),
    };

    private static bool HasLaggedResponse(BoundModel model)
    {
        var response = model.Response.Term.Columns.Select(column => column.Column).ToHashSet(StringComparer.Ordinal);
        return model.FinalTerms.Any(term => Walk(term.Term).OfType<TimeOrderTerm>().Any(part =>
            part.Operation != TimeOrderOperation.Change && part.Columns.Any(column => response.Contains(column.Column))));
    }

    private static Deterministic PartOf(BoundModel model)
    {
        if (!model.Intercept)
        {
            return Deterministic.None;
        }

        int degree = model.FinalTerms.Select(term => Degree(term.Term)).DefaultIfEmpty(0).Max();
        return degree >= 2 ? Deterministic.QuadraticTrend : degree == 1 ? Deterministic.Trend : Deterministic.Constant;
    }

    private static int Degree(Term term) => term switch
    {
        TrendTerm => 1,
        PowerTerm { Of: TrendTerm, Exponent: 2 } => 2,
        PolynomialTerm { Of: TrendTerm } polynomial => Math.Min(2, polynomial.Degree),
        _ => 0,
    };

    /// <summary>Trend, season, step and pulse, and what is made of them alone.</summary>
    private static bool IsFunctionOfTime(Term term, BoundModel model) => term switch
    {
        TrendTerm or SeasonTerm or StepTerm or PulseTerm => true,
        ColumnTerm column => model.Structure.Time?.Column?.Name == column.Column,
        _ => term.Parts.Count > 0 && term.Parts.All(part => IsFunctionOfTime(part, model)),
    };

    private static IEnumerable<Term> Walk(Term term) => term.Parts.SelectMany(Walk).Prepend(term);
}
