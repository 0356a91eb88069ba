namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Breusch–Pagan check. Null: the error variance does not depend on the final model's columns. Squared residuals (of weighted fits sqrt(w) e, squared) are regressed on an
/// intercept and the final model's kept columns, unweighted; df = rank - 1. Studentised (Koenker): n R², chi-square, errors of any one distribution.
/// Original: half the explained sum of squares of e² / (RSS/n), chi-square under normal errors.
/// </summary>
/// <remarks>
/// Breusch and Pagan 1979, Econometrica 47; Koenker 1981, Journal of Econometrics 17. Verified against R's lmtest, numpy and published values (tests/reference).
/// </remarks>
public static class BreuschPagan
{
    public static CheckOutcome Studentised(CheckedFit fit) =>
        fit.Impediment is { } impediment ? CheckOutcome.None(impediment) : fit.Linear.Studentised();

    public static CheckOutcome Original(CheckedFit fit) =>
        fit.Impediment is { } impediment ? CheckOutcome.None(impediment) : fit.Linear.Check(fit.Linear.Explained / 2);
}
