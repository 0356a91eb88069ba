using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// White's check. Null: the error variance does not depend on the final model's columns, their squares and cross products. n R² of the squared residuals on an
/// intercept and all of these; chi-square on rank - 1. Squares of 0/1 columns and products that are zero in every row are
/// no columns. With more than 100 auxiliary columns, on the fitted value and its square instead, and the result says so.
/// </summary>
/// <remarks>White 1980, Econometrica 48; the short form in Wooldridge, Introductory Econometrics (from memory). Verified against numpy and statsmodels (tests/reference).</remarks>
public static class White
{
    public static CheckOutcome Of(CheckedFit fit)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        return WhiteColumns.Of(fit) is { } columns ? InFull(fit, columns) : OnFittedValues(fit);
    }

    private static CheckOutcome InFull(CheckedFit fit, WhiteColumns columns) =>
        AuxiliaryRegression.OfSquares(fit, columns.Count - 1, columns.Fill).Studentised();

    private static CheckOutcome OnFittedValues(CheckedFit fit)
    {
        if (fit.FittedIsConstant)
        {
            return CheckOutcome.None(CheckImpediment.NothingToRelate);
        }

        var outcome = AuxiliaryRegression.OfSquares(fit, 2, (source, derived) => FillFitted(fit, source, derived)).Studentised();
        return outcome is CheckStatistic check ? check with { OnFittedValues = true } : outcome;
    }

    private static void FillFitted(CheckedFit fit, RowBlock source, RowBlock derived)
    {
        var fitted = derived.Column(1);
        FittedValues.FillScaled(fit, source, fitted);
        BlockKernels.Multiply(fitted, fitted, derived.Column(2));
    }
}
