using Auditor.Numerics;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>A fit as the record shows it.</summary>
internal static class FitFigures
{
    private const string Sampling = "sampling weights: classical standard errors and tests do not apply";
    private const string Saturated = "no residual degrees of freedom are left";
    private const string AliasedWords = "aliased: it equals a combination of other columns";

    public static FitSummary Of(RowSetFit rows, double significance, bool sampling)
    {
        var fit = rows.Fit;
        var overall = fit.OverallF;
        var f = sampling ? null : overall as FTest;
        return new FitSummary(
            (int)fit.N,
            fit.Rank,
            fit.ResidualDf,
            fit.Rss,
            fit.Sigma,
            fit.RSquared,
            fit.AdjustedRSquared,
            f?.Statistic,
            f?.Df1,
            f?.Df2,
            f is null ? (sampling ? null : overall.P) : TestFigure.ShownP(f.Probability),
            f is null ? null : TestFigure.Log10(f.LogP),
            sampling ? null : fit.LogLikelihood,
            sampling ? null : fit.Aic,
            sampling ? null : fit.Bic,
            fit.ConditionNumber,
            fit.TrustworthyDigits,
            [.. rows.Final.Aliased.Select(column => AliasedWord.Of(column, rows.Plan.Labels))],
            [.. rows.Final.NearlyAliased.Select(near => new Results.NearlyAliasedColumn(rows.Plan.Labels[near.Column], near.DigitsLost))],
            Coefficients(rows, significance, sampling),
            Why(fit, overall, sampling));
    }

    private static string? Why(Fit fit, TestResult overall, bool sampling)
    {
        if (sampling)
        {
            return Sampling;
        }

        if (fit.Perfect)
        {
            return "the model fits these rows to rounding: figures that need residuals are not given";
        }

        return fit.ResidualDf <= 0 ? Saturated : overall switch
        {
            NotComputable { Why: Impediment.PerfectWithoutGroup } => "the response does not vary, so there is no F",
            NotComputable => "the model has no term beside the intercept, so there is no F",
            _ => null,
        };
    }

    private static List<CoefficientFigures> Coefficients(RowSetFit rows, double significance, bool sampling)
    {
        var errors = sampling ? null : rows.Fit.StandardErrors;
        var halfWidth = rows.Fit.IntervalHalfWidth(significance);
        var why = sampling ? Sampling : errors is null ? Saturated : null;
        var byColumn = rows.Fit.Columns.Select((column, k) => (column, k)).ToDictionary(pair => pair.column, pair => pair.k);
        return [.. Enumerable.Range(0, rows.Plan.Layout.FinalColumns).Select(column => byColumn.TryGetValue(column, out var k)
            ? Coefficient(rows.Plan.Labels[column], rows.Fit.Coefficients[k], errors?[k], halfWidth, rows.Fit.ResidualDf, why)
            : new CoefficientFigures(rows.Plan.Labels[column], null, null, null, null, null, null, null, AliasedWords))];
    }

    private static CoefficientFigures Coefficient(
        string name, double estimate, double? error, double? halfWidth, double df, string? why)
    {
        if (error is not double se || halfWidth is not double width)
        {
            return new CoefficientFigures(name, estimate, error, null, null, null, null, null, why);
        }

        if (se == 0)
        {
            return new CoefficientFigures(name, estimate, se, null, null, null, estimate, estimate, "the standard error is 0");
        }

        var t = CoefficientTest.Of(estimate, se, df);
        return new CoefficientFigures(
            name, estimate, se, t.T, TestFigure.ShownP(t.P), TestFigure.Log10(t.LogP), estimate - (width * se), estimate + (width * se), null);
    }
}
