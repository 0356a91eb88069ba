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
    private const int WidestInFull = 100;

    public static CheckOutcome Of(CheckedFit fit)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var columns = fit.Slopes.Length < WidestInFull ? WhiteColumns.Of(fit) : null;
        var inFull = columns?.Count <= WidestInFull;
        var auxiliary = columns is not null && inFull
            ? AuxiliaryRegression.Of(fit.Design, columns.Count - 1, (source, derived) => FillFull(fit, columns, source, derived))
            : AuxiliaryRegression.Of(fit.Design, 2, (source, derived) => FillShort(fit, source, derived));
        if (auxiliary.Df == 0)
        {
            return CheckOutcome.None(CheckImpediment.NothingToRelate);
        }

        var value = auxiliary.N * auxiliary.RSquared;
        return ChiSquaredCheck.Of(value, auxiliary.Df) with { OnFittedValues = !inFull };
    }

    private static void FillFull(CheckedFit fit, WhiteColumns columns, RowBlock source, RowBlock derived)
    {
        var next = 1;
        foreach (var column in columns.Linear)
        {
            source.Column(column).CopyTo(derived.Column(next++));
        }

        foreach (var (a, b) in columns.Products)
        {
            Multiply(source.Column(a), columns.Origins[a], source.Column(b), columns.Origins[b], derived.Column(next++));
        }

        SquaredResiduals.Fill(fit.Store, fit.Fit.Rss / fit.Fit.N, derived);
    }

    private static void Multiply(ReadOnlySpan<double> a, double originA, ReadOnlySpan<double> b, double originB, Span<double> into)
    {
        for (var i = 0; i < into.Length; i++)
        {
            into[i] = (a[i] - originA) * (b[i] - originB);
        }
    }

    private static void FillShort(CheckedFit fit, RowBlock source, RowBlock derived)
    {
        var fitted = derived.Column(1);
        FittedValues.Fill(fit, source, fitted);
        BlockKernels.Multiply(fitted, fitted, derived.Column(2));
        SquaredResiduals.Fill(fit.Store, fit.Fit.Rss / fit.Fit.N, derived);
    }
}
