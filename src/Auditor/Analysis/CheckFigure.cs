using System.Globalization;
using Auditor.Data;
using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Puts what a check gave into the record's terms: names, words, rows of the source.</summary>
internal sealed class CheckFigure(RowSubset rows, double significance)
{
    private const string OnFittedValues = "on the fitted value and its square, because the full form has more than 100 columns";
    private const string UpperBound = "p is at most the figure given: the published formula for p ends there";
    private const string NormalApproximation = "p by the normal law with the exact mean and variance of d, because there are more than 2,000 rows";
    private const string Predictive = "predictive form, because one part has too few rows for coefficients of its own";
    private const string PerfectWithPowers = "with the powers in, the model fits these rows to rounding, without them it does not: the statistic has no finite value";
    private const string PerfectWithoutRow = "without this row the model fits to rounding, with it it does not: the studentised residual has no finite value";
    private const string PerfectParts = "fitted in its two parts the model fits to rounding, fitted as one it does not: the statistic has no finite value";

    public static CheckResult Missing(string name, string assumption, string why) => new(name, null, null, null, null, assumption, null, why);

    public CheckResult Of(string name, string assumption, CheckOutcome outcome) => outcome switch
    {
        CheckStatistic check => new CheckResult(
            name, check.Statistic, check.Df, check.Df2, TestFigure.ShownP(check.P), assumption, (check.SimulatedP ?? check.P) <= significance, null)
        {
            Log10P = check.LogP is double log ? TestFigure.Log10(log) : null,
            PSimulated = check.SimulatedP,
            Draws = check.Draws,
            Row = Row(check.Position),
            Size = check.Sizes.ToDictionary(size => Measure(size.Measure), size => size.Value),
            Variant = Variant(check),
        },
        UnboundedCheck unbounded => new CheckResult(name, null, unbounded.Df, unbounded.Df2, 0, assumption, true, Unbounded(assumption)) { Row = Row(unbounded.Position) },
        NoCheck none => Missing(name, assumption, Words(none.Why)),
        _ => throw new ArgumentOutOfRangeException(nameof(outcome), outcome, "a check gives a statistic or a reason"),
    };

    private static string Unbounded(string assumption) => assumption switch
    {
        Assumptions.NoOutlier => PerfectWithoutRow,
        Assumptions.StableCoefficients => PerfectParts,
        _ => PerfectWithPowers,
    };

    private static string? Variant(CheckStatistic check)
    {
        string[] parts =
        [
            .. check.OnFittedValues ? [OnFittedValues] : Array.Empty<string>(),
            .. check.WithinUnits is int units ? [$"within {PlainNumber.Count(units)} units"] : Array.Empty<string>(),
            .. check.Lags is int lags ? [string.Create(CultureInfo.InvariantCulture, $"{lags} lagged {(lags == 1 ? "change" : "changes")}, chosen by AIC")] : Array.Empty<string>(),
            .. check.Predictive ? [Predictive] : Array.Empty<string>(),
            .. check.NormalApproximation ? [NormalApproximation] : Array.Empty<string>(),
            .. check.PIsUpperBound ? [UpperBound] : Array.Empty<string>(),
        ];
        return parts.Length == 0 ? null : string.Join("; ", parts);
    }

    private static string Measure(SizeMeasure measure) => measure switch
    {
        SizeMeasure.AuxiliaryRSquared => "auxiliary_r_squared",
        SizeMeasure.PartialRSquared => "partial_r_squared",
        SizeMeasure.Skewness => "skewness",
        SizeMeasure.ExcessKurtosis => "excess_kurtosis",
        SizeMeasure.NormalPlotRSquared => "normal_plot_r_squared",
        SizeMeasure.DistanceFromNormal => "distance_from_normal",
        SizeMeasure.FirstAutocorrelation => "first_autocorrelation",
        SizeMeasure.LargestAutocorrelation => "largest_autocorrelation",
        _ => "persistence",
    };

    private static string Words(CheckImpediment why) => why switch
    {
        CheckImpediment.NoResiduals => "the final model leaves no residuals to check: it fits to rounding, or no degrees of freedom are left",
        CheckImpediment.TooFew => "too few rows, or too few degrees of freedom, for this check",
        CheckImpediment.TooMany => "more rows than this check is defined for",
        CheckImpediment.Saturated => "the check's auxiliary regression has as many columns as there are rows",
        CheckImpediment.EqualSquares => "all residuals have the same size: there is no difference in variance to explain",
        CheckImpediment.EqualResiduals => "all residuals are equal: they have no distribution to look at",
        CheckImpediment.PowersAddNothing => "the powers of the fitted value do not both add something to the final model's columns",
        CheckImpediment.NothingToRelate => "the final model has nothing but a constant to relate the residuals to",
        CheckImpediment.FrequencyWeights => "frequency weights: rows that stand for several have no order among these",
        CheckImpediment.LaggedResponse => "a lag of the response stands among the terms, which this check does not allow; see Breusch–Godfrey",
        CheckImpediment.SeveralSeries => "the check is for one series, and the rows are of several units",
        CheckImpediment.Gaps => "the check is for a series without gaps, and a period is missing among the rows",
        CheckImpediment.NoCriticalValues => "no critical values are published for a model without an intercept, nor for more than 11 columns that may drift",
        CheckImpediment.EmptyPart => "one part of the split has no rows, or no coefficient that could differ",
        _ => "sampling weights: the check's reference distribution does not apply",
    };

    private int? Row(int? position) => position is int place ? rows[place] + 1 : null;
}
