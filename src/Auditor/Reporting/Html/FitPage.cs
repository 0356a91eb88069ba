using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>A refit of the final model as the page shows it.</summary>
internal sealed record FitPage(FitSummary Fit, ReportTable Coefficients, FactList Facts)
{
    public static FitPage Of(FitSummary fit, double level, string caption) => new(fit, CoefficientTable(fit, level, caption), FactsOf(fit, level));

    private static ReportTable CoefficientTable(FitSummary fit, double level, string caption)
    {
        double? digits = fit.TrustworthyDigits;
        return ReportTable.Of(
            caption,
            fit.Coefficients,
            new("Term", "name", term => Cell.Name(term.Name)),
            new("Estimate", "number", term => Cell.Trusted(term.Estimate, digits, term.Why)),
            new($"{NumberText.Percent(1 - level)} interval", "number", term => Cell.Range(term.Lower, term.Upper, term.Why, limit => NumberText.Trusted(limit, digits))),
            new("Standard error", "number", term => Cell.Trusted(term.StandardError, digits, term.Why)),
            new("In standard errors (t)", "number", term => Cell.Trusted(term.T, digits, term.Why)),
            new("p", "number", term => Cell.Probability(term.P, term.Log10P, level, term.Why)));
    }

    private static FactList FactsOf(FitSummary fit, double level) => FactList.Of(
        new("Rows used", Cell.Count(fit.Rows)),
        new("Coefficients that can be told apart", Cell.Count(fit.Rank), "the rank of the design"),
        new("Residual degrees of freedom", Cell.Count(fit.DfResidual)),
        new("Residual standard deviation", Cell.Number(fit.Sigma, fit.Why), "in units of the response"),
        new("Residual sum of squares", Cell.Number(fit.Rss)),
        new("R²", Cell.Number(fit.RSquared, fit.Why)),
        new("Adjusted R²", Cell.Number(fit.AdjustedRSquared, fit.Why)),
        new("F of all terms together", Cell.Number(fit.F, fit.Why)),
        new("on degrees of freedom", Cell.Df(fit.FDf1, fit.FDf2, fit.Why)),
        new("p of that F", Cell.Probability(fit.FP, fit.FLog10P, level, fit.Why)),
        new("Log-likelihood", Cell.Tenths(fit.LogLikelihood, fit.Why)),
        new("AIC", Cell.Tenths(fit.Aic, fit.Why)),
        new("BIC", Cell.Tenths(fit.Bic, fit.Why)),
        new("Condition number", Cell.Share(fit.ConditionNumber, fit.Why), "largest condition index, columns scaled to equal length"),
        new("Digits that can be trusted", Cell.Tenths(fit.TrustworthyDigits, fit.Why), "of the least certain coefficient; no more are printed"));
}
